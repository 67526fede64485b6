import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type Case, caseValidate, type EditArguments, type EditName } from "../../../src/core/case/index.ts";
import { HISTORY_MOST } from "../../../src/shell/store/history.ts";
import { caseOf } from "../storage/fakeBrowser.ts";
import { MemoryRepository } from "./memoryRepository.ts";
import { startOpen, startWorkbench, turns } from "./workbenchSupport.ts";

type Edit = { [N in EditName]: readonly [N, EditArguments<N>] }[EditName];

const level = (id: string, value: number) =>
  ({ id, at: "2026-03-03T08:00:00+00:00", quantity: { value, unit: "mg/L" }, kind: "measured" }) as const;

/** Edits that are good in any state of the case: each names only what it makes itself or what is always there. */
const anyEdit: fc.Arbitrary<Edit> = fc.oneof(
  fc.string({ maxLength: 5 }).map((label): Edit => ["caseRename", { label }]),
  fc.string({ maxLength: 5 }).map((notes): Edit => ["notesSet", { notes }]),
  fc.constantFrom("female" as const, "male" as const, null).map((sex): Edit => ["sexSet", { sex }]),
  fc
    .constantFrom(30, 64, null)
    .map((age): Edit => ["ageSet", { age: age === null ? null : { value: age, unit: "a" } }]),
  fc
    .constantFrom("typical" as const, "individual" as const)
    .map((use): Edit => ["fitSet", { fit: { use, residualModel: "robust" } }]),
  fc.nat(9).map((n): Edit => ["nowSet", { at: `2026-03-04T0${n}:00:00+00:00` }]),
);

describe("history", () => {
  test("undo after do is as if nothing was done, over any edits; redo does it again", async () => {
    const { state, open } = await startOpen();
    await fc.assert(
      fc.asyncProperty(fc.array(anyEdit, { minLength: 1, maxLength: 20 }), async (edits) => {
        const start = open().value;
        const states: Case[] = [start];
        for (const [name, args] of edits) {
          state().edit(name, args as never);
          if (open().value !== states.at(-1)) states.push(open().value);
        }
        for (const value of states.slice(0, -1).reverse()) {
          state().undo();
          expect(open().value).toEqual(value);
        }
        expect(open().value).toEqual(start);
        for (const value of states.slice(1)) {
          state().redo();
          expect(open().value).toEqual(value);
        }
        expect(caseValidate(open().value).ok).toBe(true);
        for (const _ of states.slice(1)) state().undo();
        await turns();
      }),
      { seed: 20_261_201, numRuns: 60 },
    );
  }, 60_000);

  test("names each step, newest last; an edit after an undo drops what was undone", async () => {
    const { state, open } = await startOpen();
    state().edit("caseRename", { label: "one" });
    state().edit("levelAdd", { level: level("l", 8) });
    expect(open()).toMatchObject({ revision: 3, undo: [{ name: "caseRename" }, { name: "levelAdd" }], redo: [] });
    state().undo();
    expect(open()).toMatchObject({ revision: 4, undo: [{ name: "caseRename" }], redo: [{ name: "levelAdd" }] });
    state().edit("notesSet", { notes: "n" });
    expect(open()).toMatchObject({ undo: [{ name: "caseRename" }, { name: "notesSet" }], redo: [] });
  });

  test("an edit that changes nothing is no step", async () => {
    const { state, open, repository } = await startOpen("same");
    state().edit("caseRename", { label: "same" });
    expect(open()).toMatchObject({ revision: 1, undo: [] });
    expect(repository.saves).toEqual([]);
  });

  test("with nothing to take back nothing happens", async () => {
    const { state, open, repository } = await startOpen();
    state().undo();
    state().redo();
    expect(open()).toMatchObject({ revision: 1, undo: [], redo: [] });
    expect(repository.saves).toEqual([]);
  });

  test("keeps the newest steps up to its length", async () => {
    const { state, open } = await startOpen();
    for (let n = 0; n <= HISTORY_MOST; n++) state().edit("notesSet", { notes: `${n}` });
    expect(open().undo).toHaveLength(HISTORY_MOST);
    for (let n = 0; n < HISTORY_MOST + 5; n++) state().undo();
    expect(open().value.notes).toBe("0");
  }, 60_000);

  test("begins anew with another case", async () => {
    const { state, open, repository } = await startOpen();
    state().edit("notesSet", { notes: "n" });
    await turns();
    repository.store(caseOf("b"));
    await state().openCase("b");
    expect(open()).toMatchObject({ undo: [], redo: [], revision: 1 });
  });
});

describe("an edit that can't be", () => {
  test("for a value the case may not hold: nothing changes, and the faults are said", async () => {
    const { state, open, repository } = await startOpen();
    state().edit("levelAdd", { level: level("l", -1) });
    expect(open()).toMatchObject({ revision: 1, undo: [] });
    expect(repository.saves).toEqual([]);
    expect(state().notices).toMatchObject([{ gravity: "check", issues: [{ code: "level-not-positive" }] }]);
  });

  test("for an id that is not there: a programmer's mistake, and nothing changes", async () => {
    const { state, open } = await startOpen();
    expect(() => state().edit("levelRemove", { id: "none" })).toThrow(RangeError);
    expect(open()).toMatchObject({ revision: 1, undo: [] });
  });

  test("without an open case is said", async () => {
    const { state } = await startWorkbench();
    state().edit("caseRename", { label: "x" });
    state().undo();
    expect(state().notices).toMatchObject([{ issues: [{ code: "edit-no-case" }] }]);
  });
});

describe("a reader", () => {
  async function reader() {
    const made = await startWorkbench();
    made.repository.store(caseOf("a", "theirs"));
    made.repository.elsewhere.add("a");
    await made.state().openCase("a");
    return made;
  }

  test("is told who writes, and every change is refused, said once", async () => {
    const { state, open, repository, runner } = await reader();
    expect(open()).toMatchObject({ role: "reader", saving: { status: "read-only", reason: "other-tab" } });
    const asked = runner.asked.length;
    state().edit("caseRename", { label: "mine" });
    state().previewEdit("caseRename", { label: "mine" });
    state().undo();
    state().redo();
    expect(open()).toMatchObject({ revision: 1, value: { label: "theirs" }, preview: null });
    expect([repository.saves, runner.asked.length]).toEqual([[], asked]);
    expect(state().notices).toMatchObject([{ issues: [{ code: "edit-read-only" }] }]);
  });

  test("is shown what the other tab saves", async () => {
    const { state, open, repository, runner } = await reader();
    repository.store(caseOf("a", "their second"));
    repository.emit({ kind: "saved", id: "a" });
    await expect.poll(() => open().value.label).toBe("their second");
    expect(open()).toMatchObject({ role: "reader", revision: 2, saving: { status: "read-only" } });
    expect(runner.asked.at(-1)?.value.label).toBe("their second");
    expect(state().entries[0]?.label).toBe("their second");
  });

  test("becomes the writer when its turn comes, of what was stored last", async () => {
    const { state, open, repository } = await reader();
    repository.store(caseOf("a", "their last"));
    repository.elsewhere.delete("a");
    repository.claimed.get("a")?.();
    await expect.poll(() => open().role).toBe("writer");
    expect(open()).toMatchObject({
      value: { label: "their last" },
      undo: [],
      saving: { status: "saved", reason: null },
    });
    expect(state().notices).toMatchObject([{ gravity: "note", issues: [{ code: "case-writer-now" }] }]);
    state().edit("caseRename", { label: "mine" });
    await turns();
    expect(repository.cases.get("a")?.label).toBe("mine");
    state().undo();
    expect(open().value.label).toBe("their last");
  });

  test("whose case was removed meanwhile is told, and the case is closed", async () => {
    const { state, repository } = await reader();
    repository.cases.delete("a");
    repository.emit({ kind: "removed", id: "a" });
    await expect.poll(() => state().open).toBeNull();
    expect(state()).toMatchObject({
      screen: "cases",
      entries: [],
      notices: [{ issues: [{ code: "storage-case-gone" }] }],
    });
    expect(repository.released).toEqual(["a"]);
  });

  test("may print, export and leave: it holds nothing of its own", async () => {
    const { state } = await reader();
    expect(state().exportFile()?.text).toContain("theirs");
    await state().closeCase();
    expect(state().open).toBeNull();
  });
});

test("what another tab saves of the case this tab writes is not read over its work", async () => {
  const { state, open, repository } = await startOpen("mine");
  repository.store(caseOf("a", "theirs"));
  repository.emit({ kind: "saved", id: "a" });
  await turns();
  expect(open()).toMatchObject({ role: "writer", value: { label: "mine" }, revision: 1 });
  expect(state().notices).toEqual([]);
});

describe("nudges", () => {
  const open = async () => {
    let now = 0;
    const repository = new MemoryRepository();
    repository.store(caseOf("a", "Harbour ward"));
    const started = await startWorkbench({ clock: () => now }, repository);
    const { state } = started;
    await state().openCase("a");
    state().edit("levelAdd", { level: level("l", 8) });
    state().edit("levelAdd", { level: level("m", 9) });
    const nudge = (id: string, number: number, atMs: number) => {
      now = atMs;
      state().edit("levelRevalue", { id, number }, id);
    };
    const names = () => started.open().undo.map(({ name }) => name);
    return { ...started, nudge, names, wait: (ms: number) => (now = ms) };
  };

  test("presses within a second of each other on one thing are one step; undo takes all of them, redo brings all back", async () => {
    const { state, open: shown, nudge, names } = await open();
    const before = shown().value;
    nudge("l", 8.1, 0);
    nudge("l", 8.2, 1_000);
    nudge("l", 8.3, 2_000);
    expect(names()).toEqual(["levelAdd", "levelAdd", "levelRevalue"]);
    expect(shown().revision).toBe(6);
    const after = shown().value;
    state().undo();
    expect(shown().value).toEqual(before);
    state().redo();
    expect(shown().value).toEqual(after);
  });

  test.each([
    ["later than a second", (each: Awaited<ReturnType<typeof open>>) => each.nudge("l", 8.2, 1_001), 4],
    ["on another level", (each: Awaited<ReturnType<typeof open>>) => each.nudge("m", 9.1, 10), 4],
    [
      "no nudge",
      ({ state }: Awaited<ReturnType<typeof open>>) => state().edit("levelRevalue", { id: "l", number: 9 }),
      4,
    ],
  ] as const)("%s: a step of its own", async (_, act, steps) => {
    const shown = await open();
    shown.nudge("l", 8.1, 0);
    act(shown);
    expect(shown.names()).toHaveLength(steps);
  });

  test("undone and done again, or with something between: a step of its own", async () => {
    const { state, nudge, names } = await open();
    nudge("l", 8.1, 0);
    state().undo();
    state().redo();
    nudge("l", 8.2, 1);
    expect(names()).toHaveLength(4);
    state().edit("notesSet", { notes: "n" });
    nudge("l", 8.3, 2);
    expect(names()).toHaveLength(6);
  });

  test("presses that cancel out leave no step, and the next joins none that was there before", async () => {
    const { state, open: shown, nudge, names } = await open();
    state().edit("levelRevalue", { id: "l", number: 7 });
    nudge("l", 7.1, 0);
    nudge("l", 7, 1);
    expect(names()).toEqual(["levelAdd", "levelAdd", "levelRevalue"]);
    nudge("l", 7.1, 2);
    expect(names()).toHaveLength(4);
    state().undo();
    expect(shown().value.levels[0]!.quantity.value).toBe(7);
  });
});

test("a drag within a step asks for nothing new", async () => {
  const { state, runner } = await startOpen();
  const asked = runner.asked.length;
  state().previewEdit("caseRename", { label: "moved" });
  state().previewEdit("caseRename", { label: "moved" });
  expect(runner.asked.length).toBe(asked + 1);
});
