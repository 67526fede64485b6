import { afterEach, beforeEach, describe, expect, test, vi } from "vitest";
import { type Analysis, derive, deriveSteps } from "../../../src/core/analysis/index.ts";
import type { Case } from "../../../src/core/case/index.ts";
import type { DeriveSteps } from "../../../src/shell/workers/analysisAnswer.ts";
import {
  ABANDON_AFTER,
  ANALYSIS_DEADLINE,
  createAnalysisClient,
} from "../../../src/shell/workers/createAnalysisClient.ts";
import { demoCase } from "../../fixtures/demoCase.ts";
import { caseOf } from "../storage/fakeBrowser.ts";
import { FakeWorker } from "./fakeWorker.ts";

let workers: FakeWorker[];
beforeEach(() => {
  workers = [];
  vi.useFakeTimers();
});
afterEach(() => vi.useRealTimers());

const last = () => workers.at(-1)!;
const marked = (value: Case) => ({ fingerprint: value.id }) as unknown as Analysis;
// biome-ignore lint/correctness/useYield: done in one step
function* markedSteps(value: Case): Generator<number, Analysis> {
  return marked(value);
}
function client(loadDeriveSteps = async (): Promise<DeriveSteps> => markedSteps) {
  return createAnalysisClient({
    startWorker: () => {
      workers.push(new FakeWorker());
      return last();
    },
    loadDeriveSteps,
  });
}

describe("latest wins", () => {
  test("one runs, one waits, those between are overtaken", async () => {
    const { run } = client();
    const answers = ["a", "b", "c", "d"].map((id) => run(caseOf(id)));
    expect(await answers[1]).toBeNull();
    expect(await answers[2]).toBeNull();
    last().answer(marked);
    expect(await answers[0]).toMatchObject({ ok: true, analysis: { fingerprint: "a" } });
    expect(last().asked.map((each) => each.case.id)).toEqual(["a", "d"]);
    last().answer(marked);
    expect(await answers[3]).toMatchObject({ ok: true, analysis: { fingerprint: "d" } });
    expect(workers).toHaveLength(1);
  });

  test("an answer to another question is not taken for this one's", async () => {
    const { run } = client();
    const answer = run(caseOf("a"));
    last().say({ sequence: 99, analysis: marked(caseOf("x")) });
    last().answer(marked);
    expect(await answer).toMatchObject({ analysis: { fingerprint: "a" } });
  });
});

describe("long work", () => {
  test("tells how far it is, and is given as long as it does", async () => {
    const parts: number[] = [];
    const made = client();
    const answer = made.run(caseOf("a"), { isFitted: true, onProgress: (part) => parts.push(part) });
    expect(last().asked[0]!.options).toEqual({ isFitted: true });
    last().say({ sequence: 1, progress: 0.2 });
    await vi.advanceTimersByTimeAsync(ANALYSIS_DEADLINE - 1);
    last().say({ sequence: 1, progress: 0.6 });
    await vi.advanceTimersByTimeAsync(ANALYSIS_DEADLINE - 1);
    last().answer(marked);
    expect(await answer).toMatchObject({ ok: true });
    expect(parts).toEqual([0.2, 0.6]);
  });

  test("overtaken, it may end in good time; after that it is told to stop, once", async () => {
    const made = client();
    const first = made.run(caseOf("a"));
    const second = made.run(caseOf("b"));
    last().say({ sequence: 1, progress: 0.1 });
    expect(last().abandoned).toEqual([]);
    await vi.advanceTimersByTimeAsync(ABANDON_AFTER);
    last().say({ sequence: 1, progress: 0.2 });
    last().say({ sequence: 1, progress: 0.3 });
    expect(last().abandoned).toEqual([1]);
    last().say({ sequence: 1, abandoned: true });
    expect(await first).toBeNull();
    last().answer(marked);
    expect(await second).toMatchObject({ ok: true, analysis: { fingerprint: "b" } });
    expect(workers).toHaveLength(1);
  });

  test("long at work already, it is told to stop by the question that overtakes it", async () => {
    const made = client();
    void made.run(caseOf("a"));
    await vi.advanceTimersByTimeAsync(ABANDON_AFTER);
    expect(last().abandoned).toEqual([]);
    void made.run(caseOf("b"));
    expect(last().abandoned).toEqual([1]);
  });
});

describe("a failure", () => {
  test("of the analysis is its answer; the worker goes on", async () => {
    const { run } = client();
    const first = run(caseOf("a"));
    last().answer(() => {
      throw new RangeError("volume: 0 L");
    });
    expect(await first).toEqual({ ok: false, reason: "failed", detail: "RangeError: volume: 0 L" });
    const second = run(caseOf("b"));
    last().answer(marked);
    expect(await second).toMatchObject({ ok: true });
    expect(workers).toHaveLength(1);
  });

  test("of the worker that had started ends it; the next question gets a new one", async () => {
    const made = client();
    const first = made.run(caseOf("a"));
    last().start();
    last().break("out of memory");
    expect(await first).toEqual({ ok: false, reason: "failed", detail: "out of memory" });
    expect(last().isTerminated).toBe(true);
    const second = made.run(caseOf("b"));
    last().answer(marked);
    expect(await second).toMatchObject({ ok: true });
    expect([workers.length, made.where]).toEqual([2, "worker"]);
  });

  test("to answer in time stops the worker, and the one waiting runs in a new one", async () => {
    const { run } = client();
    const slow = run(caseOf("a"));
    last().start();
    const waiting = run(caseOf("b"));
    await vi.advanceTimersByTimeAsync(ANALYSIS_DEADLINE - 1);
    expect(last().isTerminated).toBe(false);
    await vi.advanceTimersByTimeAsync(1);
    expect(await slow).toMatchObject({ ok: false, reason: "deadline" });
    expect(workers[0]!.isTerminated).toBe(true);
    workers[0]!.answer(marked); // too late: nobody listens
    last().answer(marked);
    expect(await waiting).toMatchObject({ ok: true, analysis: { fingerprint: "b" } });
    await vi.advanceTimersByTimeAsync(2 * ANALYSIS_DEADLINE);
    expect(workers).toHaveLength(2);
  });
});

describe("a worker that can't start", () => {
  test.each<[string, (made: ReturnType<typeof client>) => void]>([
    ["breaks before its first word", () => last().break("blocked by policy")],
    ["never says a word", () => vi.advanceTimersByTime(ANALYSIS_DEADLINE)],
  ])("%s: the page does the work, now and later", async (_, fail) => {
    const made = client();
    const first = made.run(caseOf("a"));
    expect(made.where).toBe("worker");
    fail(made);
    expect(await first).toMatchObject({ ok: true, analysis: { fingerprint: "a" } });
    expect(made.where).toBe("page");
    const [second, third] = [made.run(caseOf("b")), made.run(caseOf("c"))];
    expect(await Promise.all([second, third])).toMatchObject([{ ok: true }, { ok: true }]);
    expect(workers).toHaveLength(1);
  });

  test("can't be made: the page does the work", async () => {
    const made = createAnalysisClient({
      startWorker: () => {
        throw new DOMException("no workers", "SecurityError");
      },
      loadDeriveSteps: async () => markedSteps,
    });
    expect(await made.run(caseOf("a"))).toMatchObject({ ok: true, analysis: { fingerprint: "a" } });
    expect(made.where).toBe("page");
  });

  test("and code that can't be loaded either is a failure said", async () => {
    const made = client(() => Promise.reject(new TypeError("offline")));
    const first = made.run(caseOf("a"));
    last().break();
    expect(await first).toEqual({ ok: false, reason: "failed", detail: "TypeError: offline" });
  });
});

test("stopped, it answers what is open", async () => {
  const made = client();
  const answers = [made.run(caseOf("a")), made.run(caseOf("b"))];
  made.stop();
  expect(await Promise.all(answers)).toEqual([null, null]);
  expect(last().isTerminated).toBe(true);
});

test.each(["start", "adjustment"])("worker, page and direct call give the same analysis: demo %s", async (name) => {
  const value = demoCase(name);
  const inWorker = client();
  const answered = inWorker.run(value);
  last().answer(derive);
  const onPage = client(async () => deriveSteps);
  const fallback = onPage.run(value);
  last().break();
  const direct = { ok: true, analysis: derive(value) };
  expect(await answered).toEqual(direct);
  expect(await fallback).toEqual(direct);
  expect(direct.analysis.options.some((option) => (option.curve?.values.length ?? 0) > 10)).toBe(true);
});
