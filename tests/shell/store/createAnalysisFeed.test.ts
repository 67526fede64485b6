import { describe, expect, test } from "vitest";
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
