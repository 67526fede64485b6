import { describe, expect, test, vi } from "vitest";
import type { Analysis, FitState } from "../../../src/core/analysis/index.ts";
import { SETTLE_MS } from "../../../src/shell/store/createAnalysisFeed.ts";
import { startOpen, turns } from "./workbenchSupport.ts";

async function started() {
  const made = await startOpen("zero");
  return {
    ...made,
    rename: (label: string) => made.state().edit("caseRename", { label }),
    shown: () => {
      const { result, revision, status, ofPreview } = made.open().analysis;
      return [result?.fingerprint ?? null, revision, status, ofPreview];
    },
  };
}

describe("the analysis shown", () => {
  test("is asked for when a case opens, and fresh when it is there", async () => {
    const { runner, shown } = await started();
    expect(shown()).toEqual([null, 0, "running", false]);
    runner.answer(0);
    await turns();
    expect(shown()).toEqual(["zero", 1, "fresh", false]);
  });

  test("stays, marked as older, while the next runs", async () => {
    const { runner, rename, shown, open } = await started();
    runner.answer(0);
    await turns();
    rename("one");
    expect([...shown(), open().revision]).toEqual(["zero", 1, "running", false, 2]);
    runner.answer(1);
    await turns();
    expect([...shown(), open().revision]).toEqual(["one", 2, "fresh", false, 2]);
  });

  test("of an earlier state, come while a later runs, is shown as such and is not fresh", async () => {
    const { runner, rename, shown } = await started();
    rename("one");
    runner.answer(0);
    await turns();
    expect(shown()).toEqual(["zero", 1, "running", false]);
  });

  test("late is dropped: a result never takes the place of a later one", async () => {
    const { runner, rename, shown } = await started();
    rename("one");
    rename("two");
    runner.answer(2);
    await turns();
    expect(shown()).toEqual(["two", 3, "fresh", false]);
    runner.answer(1);
    runner.answer(0);
    await turns();
    expect(shown()).toEqual(["two", 3, "fresh", false]);
  });

  test("is that of the case open now, not of the one before", async () => {
    const { runner, state, shown, repository } = await started();
    repository.store({ ...state().open!.value, id: "b", label: "other" });
    await state().openCase("b");
    runner.answer(0);
    await turns();
    expect(shown()).toEqual([null, 0, "running", false]);
    runner.answer(1);
    await turns();
    expect(shown()).toEqual(["other", 1, "fresh", false]);
  });

  test("after a failure is the last good one, with the reason in a sentence", async () => {
    const { runner, rename, shown, open } = await started();
    runner.answer(0);
    await turns();
    rename("one");
    runner.asked[1]!.answer.resolve({ ok: false, reason: "failed", detail: "RangeError: volume" });
    await turns();
    expect(shown()).toEqual(["zero", 1, "failed", false]);
    expect(open().analysis.failure).toContain("RangeError: volume");
    rename("two");
    expect(open().analysis).toMatchObject({ status: "running", failure: null });
    runner.asked[2]!.answer.resolve({ ok: false, reason: "deadline", detail: "" });
    await turns();
    expect(open().analysis.failure).toContain("too long");
    rename("three");
    runner.asked[3]!.answer.reject(new Error("runner broke"));
    await turns();
    expect(shown()).toEqual(["zero", 1, "failed", false]);
  });

  test("an earlier state's failure says nothing of the later one", async () => {
    const { runner, rename, shown } = await started();
    rename("one");
    runner.asked[0]!.answer.resolve({ ok: false, reason: "failed", detail: "" });
    await turns();
    expect(shown()).toEqual([null, 0, "running", false]);
    runner.answer(1);
    await turns();
    expect(shown()).toEqual(["one", 2, "fresh", false]);
  });

  test("an overtaken question is no answer", async () => {
    const { runner, rename, shown } = await started();
    rename("one");
    runner.asked[0]!.answer.resolve(null);
    await turns();
    expect(shown()).toEqual([null, 0, "running", false]);
  });
});

describe("a drag", () => {
  async function dragged() {
    const made = await started();
    made.runner.answer(0);
    await turns();
    const { saves } = made.repository;
    const before = saves.length;
    made.state().previewEdit("caseRename", { label: "p1" });
    return {
      ...made,
      saved: () => saves.length - before,
      preview: (label: string) => made.state().previewEdit("caseRename", { label }),
    };
  }

  test("is shown and analysed, but neither saved nor in history nor a new revision", async () => {
    const { runner, shown, open, saved } = await dragged();
    expect(open()).toMatchObject({ revision: 1, value: { label: "zero" }, preview: { label: "p1" }, undo: [] });
    expect(open().saving.status).toBe("saved");
    runner.answer(1);
    await turns();
    expect([...shown(), saved()]).toEqual(["p1", 1, "fresh", true, 0]);
  });

  test("redraws while it goes on, though every result is already overtaken", async () => {
    const { runner, shown, preview } = await dragged();
    preview("p2");
    runner.answer(1);
    await turns();
    expect(shown()).toEqual(["p1", 1, "running", true]);
    preview("p3");
    runner.asked[2]!.answer.resolve(null);
    runner.answer(3);
    await turns();
    expect(shown()).toEqual(["p3", 1, "fresh", true]);
  });

  test("cancelled leaves everything as it was, and what of it comes late is dropped", async () => {
    const { runner, shown, open, state, saved } = await dragged();
    state().cancelPreview();
    expect([open().preview, ...shown()]).toEqual([null, "zero", 1, "fresh", false]);
    runner.answer(1);
    await turns();
    expect([...shown(), saved(), open().undo.length]).toEqual(["zero", 1, "fresh", false, 0, 0]);
  });

  test("cancelled before the case itself was analysed asks for it again", async () => {
    const { runner, state, shown } = await started();
    state().previewEdit("caseRename", { label: "p1" });
    runner.asked[0]!.answer.resolve(null);
    runner.answer(1);
    await turns();
    state().previewEdit("caseRename", { label: "p2" });
    state().cancelPreview();
    runner.answer(2);
    await turns();
    expect(shown()).toEqual(["p1", 1, "running", true]);
    runner.answer(3);
    await turns();
    expect(shown()).toEqual(["zero", 1, "fresh", false]);
  });

  test.each([
    ["the edit alone", false],
    ["the edit after cancelling", true],
  ])("dropped by %s is one entry, saved and analysed", async (_, cancelFirst) => {
    const { runner, shown, open, state, saved, preview } = await dragged();
    preview("p2");
    if (cancelFirst) state().cancelPreview();
    state().edit("caseRename", { label: "p2" });
    state().cancelPreview();
    await turns();
    expect(open()).toMatchObject({
      revision: 2,
      value: { label: "p2" },
      preview: null,
      undo: [{ name: "caseRename" }],
    });
    expect(saved()).toBe(1);
    runner.answer(1);
    runner.answer(2);
    await turns();
    runner.answer(3, "dropped");
    await turns();
    expect(shown()).toEqual(["dropped", 2, "fresh", false]);
    state().undo();
    expect(open().value.label).toBe("zero");
  });

  test("over a place where it can't be dropped stays at the last good one; the drop says why", async () => {
    const { open, state, preview } = await dragged();
    preview("x".repeat(500));
    expect([open().preview?.label, state().notices]).toEqual(["p1", []]);
    state().edit("caseRename", { label: "x".repeat(500) });
    expect(open()).toMatchObject({ value: { label: "zero" }, preview: null, undo: [] });
    expect(state().notices).toMatchObject([{ gravity: "check", issues: [{ path: ["label"] }] }]);
  });
});

describe("this patient", () => {
  const CLOCK = { originMs: 0 } as Analysis["clock"];
  const PENDING: Partial<Analysis> = { fit: { kind: "pending" }, clock: CLOCK, levels: [], options: [] };
  const fitOf = (seed: number): Partial<Analysis> => ({
    ...PENDING,
    fit: { kind: "fitted", fit: { seed } } as unknown as FitState,
  });
  async function fitting() {
    const made = await started();
    const { runner, fitter, open } = made;
    runner.answer(0, "typical 0", PENDING);
    await turns();
    const fitShown = () => {
      const { result, isFitStale, fitProgress } = open().analysis;
      const state = result?.fit;
      return [state?.kind === "fitted" ? state.fit.seed : (state?.kind ?? null), isFitStale, fitProgress];
    };
    return { ...made, fitShown, fitter };
  }

  test("follows the typical patient, with progress, and is then fresh", async () => {
    const { fitter, shown, fitShown } = await fitting();
    expect([...shown(), ...fitShown()]).toEqual(["typical 0", 1, "fresh", false, "pending", false, null]);
    expect(fitter.asked.map(({ options }) => options.isFitted)).toEqual([true]);
    fitter.asked[0]!.options.onProgress?.(0.4);
    expect(fitShown()).toEqual(["pending", false, 0.4]);
    fitter.answer(0, "fitted 0", fitOf(1));
    await turns();
    expect([...shown(), ...fitShown()]).toEqual(["fitted 0", 1, "fresh", false, 1, false, null]);
  });

  test("is cross-checked once the edit has settled, without being worked out a second time", async () => {
    vi.useFakeTimers();
    try {
      const { fitter, open, shown, fitShown } = await fitting();
      fitter.answer(0, "fitted 0", { ...fitOf(1), concerns: [] });
      await turns();
      await vi.advanceTimersByTimeAsync(SETTLE_MS + 1);
      expect(fitter.asked.map(({ options }) => options)).toMatchObject([{ isFitted: true }, { isCrossChecked: true }]);
      expect(fitter.asked[1]!.options.isFitted).not.toBe(true);
      const crossCheck = { worst: 1e-9, where: "given", isAgreed: true };
      fitter.answer(1, "typical 0", { ...PENDING, concerns: [], crossCheck });
      await turns();
      expect([...shown(), ...fitShown()]).toEqual(["fitted 0", 1, "fresh", false, 1, false, null]);
      expect(open().analysis.result!.crossCheck).toEqual(crossCheck);
    } finally {
      vi.useRealTimers();
    }
  });

  test("of the state before stays in sight, marked stale, until its own is there", async () => {
    const { runner, fitter, rename, shown, fitShown } = await fitting();
    fitter.answer(0, "fitted 0", fitOf(1));
    await turns();
    rename("one");
    runner.answer(1, "typical 1", PENDING);
    await turns();
    expect([...shown(), ...fitShown()]).toEqual(["typical 1", 2, "fresh", false, 1, true, null]);
    fitter.answer(1, "fitted 1", fitOf(2));
    await turns();
    expect([...shown(), ...fitShown()]).toEqual(["fitted 1", 2, "fresh", false, 2, false, null]);
  });

  test("come late renews what stands in its place, and never an older one a newer", async () => {
    const { runner, fitter, rename, shown, fitShown } = await fitting();
    rename("one");
    runner.answer(1, "typical 1", PENDING);
    await turns();
    rename("two");
    runner.answer(2, "typical 2", PENDING);
    await turns();
    fitter.answer(1, "fitted 1", fitOf(2));
    await turns();
    expect([...shown(), ...fitShown()]).toEqual(["typical 2", 3, "fresh", false, 2, true, null]);
    fitter.answer(0, "fitted 0", fitOf(1));
    await turns();
    expect(fitShown()).toEqual([2, true, null]);
  });

  test("is not carried over to another clock", async () => {
    const { runner, fitter, rename, fitShown } = await fitting();
    fitter.answer(0, "fitted 0", fitOf(1));
    await turns();
    rename("one");
    runner.answer(1, "typical 1", { ...PENDING, clock: { originMs: 5 } as Analysis["clock"] });
    await turns();
    expect(fitShown()).toEqual(["pending", false, null]);
  });

  test("that fails leaves the typical patient, and says why", async () => {
    const { fitter, shown, open } = await fitting();
    fitter.asked[0]!.answer.resolve({ ok: false, reason: "failed", detail: "RangeError: omega" });
    await turns();
    expect(shown()).toEqual(["typical 0", 1, "failed", false]);
    expect(open().analysis.failure).toContain("RangeError: omega");
  });

  test("of a cancelled drag is dropped, and that of the case is asked for if it was not there yet", async () => {
    const { runner, fitter, state, shown, fitShown } = await fitting();
    state().previewEdit("caseRename", { label: "p1" });
    runner.answer(1, "typical p1", PENDING);
    await turns();
    state().cancelPreview();
    fitter.answer(1, "fitted p1", fitOf(9));
    await turns();
    expect([...shown(), ...fitShown()]).toEqual(["typical 0", 1, "fresh", false, "pending", false, null]);
    fitter.answer(2, "fitted 0", fitOf(1));
    await turns();
    expect([...shown(), ...fitShown()]).toEqual(["fitted 0", 1, "fresh", false, 1, false, null]);
  });
});
