import { expect, test } from "vitest";
import { type Analysis, deriveSteps } from "../../../src/core/analysis/index.ts";
import { analysisAnswer, arrayBuffers, type DeriveSteps } from "../../../src/shell/workers/analysisAnswer.ts";
import type { AnalysisReply } from "../../../src/shell/workers/analysisMessages.ts";
import { pauseForMessages } from "../../../src/shell/workers/pauseForMessages.ts";
import { demoCase } from "../../fixtures/demoCase.ts";
import { caseOf } from "../storage/fakeBrowser.ts";

test("each buffer is named once, wherever it stands and however often", () => {
  const shared = new Float64Array([1, 2]);
  const other = new Float64Array([3]);
  expect(arrayBuffers({ a: shared, b: [{ c: shared }, null, "text", other] })).toEqual([shared.buffer, other.buffer]);
});

/** Every step takes `stepMs` on the clock; `abandonAfter` pauses the question is no longer wanted. */
async function answered(steps: DeriveSteps, { stepMs = 0, abandonAfter = Infinity } = {}) {
  const said: { readonly reply: AnalysisReply; readonly transfer: readonly ArrayBuffer[] }[] = [];
  let now = 0;
  let pauses = 0;
  await analysisAnswer(
    { sequence: 7, case: caseOf("a"), options: {} },
    {
      deriveSteps: function* (value, options) {
        for (const inner = steps(value, options); ; ) {
          now += stepMs;
          const step = inner.next();
          if (step.done) return step.value;
          yield step.value;
        }
      },
      say: (reply, transfer) => said.push({ reply: structuredClone(reply, { transfer }), transfer }),
      isAbandoned: () => pauses > abandonAfter,
      pause: async () => {
        pauses++;
      },
      clock: () => now,
    },
  );
  return { replies: said.map(({ reply }) => reply), pauses: () => pauses };
}

const marked = { fingerprint: "a" } as unknown as Analysis;
function* tenSteps(): Generator<number, Analysis> {
  for (let i = 0; i < 10; i++) yield i / 10;
  return marked;
}

test("short work is done in one go, without a pause or a word of progress", async () => {
  const { replies, pauses } = await answered(tenSteps);
  expect([replies, pauses()]).toEqual([[{ sequence: 7, analysis: marked }], 0]);
});

test("long work listens every slice, and tells how far it is", async () => {
  const { replies, pauses } = await answered(tenSteps, { stepMs: 60 });
  expect(pauses()).toBe(10);
  expect(replies.map((each) => ("progress" in each ? each.progress : "analysis" in each ? "done" : each))).toEqual([
    0.1,
    0.3,
    0.5,
    0.7,
    0.9,
    "done",
  ]);
});

test("overtaken, it stops at the end of a slice", async () => {
  const { replies, pauses } = await answered(tenSteps, { stepMs: 20, abandonAfter: 2 });
  expect([replies, pauses()]).toEqual([[{ sequence: 7, abandoned: true }], 3]);
});

test("a failure in the middle is an answer", async () => {
  const { replies } = await answered(function* () {
    yield 0.5;
    throw new RangeError("volume: 0 L");
  });
  expect(replies).toEqual([{ sequence: 7, failure: "RangeError: volume: 0 L" }]);
});

test("a pause lets a message in that was sent before it", async () => {
  const order: string[] = [];
  const { port1, port2 } = new MessageChannel();
  port1.onmessage = () => order.push("message");
  port2.postMessage(null);
  await pauseForMessages();
  order.push("on");
  port1.close();
  expect(order).toEqual(["message", "on"]);
});

test("arrays are handed over, not copied, and nothing kept by the analysis is taken away with them", async () => {
  const value = demoCase("adjustment");
  const answers: (Analysis | null)[] = [];
  for (const sequence of [0, 1]) {
    await analysisAnswer(
      { sequence, case: value, options: { isFitted: true } },
      {
        deriveSteps,
        say: (reply, transfer) => {
          if (!("analysis" in reply)) return;
          expect(transfer.length).toBeGreaterThan(1);
          const received = structuredClone(reply, { transfer });
          expect(transfer.every((buffer) => buffer.byteLength === 0)).toBe(true);
          answers.push(received.analysis);
        },
        isAbandoned: () => false,
        pause: async () => {},
        clock: () => 0,
      },
    );
  }
  // The second analysis, made after the first's arrays were handed over, is the same: none of them was shared.
  expect(answers).toHaveLength(2);
  expect(answers[1]).toEqual(answers[0]);
  expect(answers[1]?.givenCurve?.values.length).toBeGreaterThan(10);
});
