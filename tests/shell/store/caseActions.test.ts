import { readFileSync } from "node:fs";
import { describe, expect, test, vi } from "vitest";
import { caseParse, casePrint } from "../../../src/core/case/index.ts";
import { BUILT_IN_RECORDS } from "../../../src/core/medicine/index.ts";
import { caseOf } from "../storage/fakeBrowser.ts";
import { startOpen, startWorkbench, turns } from "./workbenchSupport.ts";

const fields = {
  label: "n",
  medicine: BUILT_IN_RECORDS[0]!.id,
  timeZone: "Europe/Lisbon",
  now: "2026-03-04T09:00:00+00:00",
};
const quota = { ok: false, reason: "quota", detail: "" } as const;

describe("a new case", () => {
  test("is opened, claimed, stored and listed", async () => {
    const { state, open, repository } = await startWorkbench();
    await state().newCase(fields);
    expect(open()).toMatchObject({ value: { id: "new-1", label: "n" }, role: "writer", saving: { status: "saved" } });
    expect(open().value.medicine).toEqual(BUILT_IN_RECORDS[0]);
    expect(repository.cases.get("new-1")).toEqual(open().value);
    expect(state()).toMatchObject({ screen: "bench", entries: [{ id: "new-1", label: "n" }] });
    expect([...repository.claimed.keys()]).toEqual(["new-1"]);
  });

  test("that a case may not be is not made, and the faults are said", async () => {
    const { state, repository } = await startWorkbench();
    await state().newCase({ ...fields, timeZone: "Europe/Nowhere" });
    expect(state()).toMatchObject({ open: null, notices: [{ gravity: "stop" }] });
    expect(state().notices[0]?.issues[0]?.path).toEqual(["timeZone"]);
    expect(repository.saves).toEqual([]);
  });

  test("of a medicine that is not there is a programmer's mistake, and the next action works", async () => {
    const { state } = await startWorkbench();
    await expect(state().newCase({ ...fields, medicine: "none" })).rejects.toThrow(RangeError);
    await state().newCase(fields);
    expect(state().open).not.toBeNull();
  });

  test("its label follows into the list with the save", async () => {
    const { state } = await startWorkbench();
    await state().newCase(fields);
    state().edit("caseRename", { label: "renamed" });
    await turns();
    expect(state().entries).toMatchObject([{ label: "renamed", savedAt: 2 }]);
  });
});

describe("opening and closing", () => {
  test("one case at a time: the one before is on disk and released", async () => {
    const { state, open, repository } = await startOpen();
    repository.store(caseOf("b", "second"));
    state().edit("caseRename", { label: "last word" });
    await state().openCase("b");
    expect(open().value.label).toBe("second");
    expect(repository.cases.get("a")?.label).toBe("last word");
    expect(repository.released).toEqual(["a"]);
    expect([...repository.claimed.keys()]).toEqual(["b"]);
  });

  test("twice in a row opens it once", async () => {
    const { state, repository } = await startWorkbench();
    repository.store(caseOf("a"));
    await Promise.all([state().openCase("a"), state().openCase("a")]);
    expect([...repository.claimed.keys()]).toEqual(["a"]);
    state().show("cases");
    await state().openCase("a");
    expect(state().screen).toBe("bench");
  });

  test("a case that can't be read is said and given back", async () => {
    const { state, repository } = await startWorkbench();
    await state().openCase("none");
    expect(state()).toMatchObject({
      open: null,
      screen: "cases",
      notices: [{ issues: [{ code: "storage-case-gone" }] }],
    });
    expect(repository.claimed.size).toBe(0);
  });

  test("leaving waits for the write under way", async () => {
    const { state, repository } = await startOpen();
    repository.hold = true;
    state().edit("caseRename", { label: "x" });
    const closed = state().closeCase();
    await turns();
    expect(state().open).not.toBeNull();
    repository.settleSave();
    await closed;
    expect(state()).toMatchObject({ open: null, screen: "cases" });
  });

  test("a case with unsaved changes is not left for another", async () => {
    const { state, open, repository } = await startOpen();
    repository.store(caseOf("b"));
    repository.refusal = quota;
    state().edit("caseRename", { label: "unsaved" });
    await turns();
    await state().openCase("b");
    await state().newCase(fields);
    expect(open().value.label).toBe("unsaved");
  });

  test("a drag in progress ends with the case", async () => {
    const { state, repository } = await startOpen();
    state().previewEdit("caseRename", { label: "half way" });
    await state().closeCase();
    expect(repository.cases.get("a")?.label).toBe("Harbour ward");
  });
});

describe("removing", () => {
  test("takes it from storage and list, open or not", async () => {
    const { state, repository } = await startOpen();
    repository.store(caseOf("b"));
    repository.emit({ kind: "saved", id: "b" });
    await turns();
    await state().removeCase("b");
    expect(state().entries.map(({ id }) => id)).toEqual(["a"]);
    expect(state().open).not.toBeNull();
    await state().removeCase("a");
    expect(state()).toMatchObject({ open: null, screen: "cases", entries: [] });
    expect([repository.cases.size, repository.claimed.size]).toEqual([0, 0]);
  });

  test("a write under way does not bring it back", async () => {
    const { state, repository } = await startOpen();
    repository.hold = true;
    state().edit("caseRename", { label: "x" });
    const removed = state().removeCase("a");
    await turns();
    expect(repository.cases.has("a")).toBe(true);
    repository.settleSave();
    await removed;
    await turns();
    expect(repository.cases.size).toBe(0);
    expect(state().entries).toEqual([]);
  });

  test("one open in another tab is refused", async () => {
    const { state, repository } = await startWorkbench();
    repository.store(caseOf("a"));
    repository.elsewhere.add("a");
    await state().removeCase("a");
    expect(state().notices).toMatchObject([{ gravity: "stop", issues: [{ code: "remove-other-tab" }] }]);
    expect(repository.cases.size).toBe(1);
  });
});

describe("importing", () => {
  test("stores the file under its own id; the case can be opened then", async () => {
    const { state, open } = await startWorkbench();
    const value = caseOf("from-file", "imported");
    expect(await state().importFile("x.ebbline.json", casePrint(value))).toEqual({ ok: true, value });
    expect(state()).toMatchObject({ open: null, entries: [{ id: "from-file" }], notices: [] });
    await state().openCase("from-file");
    expect(open().value).toEqual(value);
  });

  test("beside a stored case of the same id, under a new one, and says so", async () => {
    const { state, repository } = await startWorkbench();
    repository.store(caseOf("a", "stored by another tab"));
    const outcome = await state().importFile("x", casePrint(caseOf("a", "imported")));
    expect(outcome).toMatchObject({ ok: true, value: { id: "new-1", label: "imported" } });
    expect(repository.cases.get("a")?.label).toBe("stored by another tab");
    expect(repository.cases.get("new-1")?.label).toBe("imported");
    expect(state().notices).toMatchObject([{ gravity: "note", issues: [{ code: "import-beside" }] }]);
  });

  test.each([
    ["no JSON", "not json"],
    ["cut short", casePrint(caseOf("a")).slice(0, 500)],
    ["of a newer version", casePrint(caseOf("a")).replace('"version": 2', '"version": 3')],
  ])("a file that is %s is refused, nothing is stored", async (_, text) => {
    const { state, repository } = await startWorkbench();
    const outcome = await state().importFile("x", text);
    expect(outcome.ok).toBe(false);
    expect([repository.saves, state().entries, state().notices]).toEqual([[], [], []]);
  });

  test("with no room is refused with the reason", async () => {
    const { state, repository } = await startWorkbench();
    repository.refusal = quota;
    const outcome = await state().importFile("x", casePrint(caseOf("a")));
    expect(outcome).toMatchObject({ ok: false, issues: [{ code: "import-not-stored" }] });
    expect(state().entries).toEqual([]);
  });
});

describe("exporting", () => {
  test("the open case as it stands, saved or not; the name tells nothing of the patient", async () => {
    const { state, open, repository } = await startOpen("Mrs Example, bed 12");
    repository.hold = true;
    state().edit("notesSet", { notes: "unsaved" });
    const file = state().exportFile()!;
    expect(caseParse(file.text)).toEqual({ ok: true, value: open().value });
    expect(file.name).toBe("ebbline-2026-03-04-a.ebbline.json");
    expect(await state().exportStored("a")).toEqual({ ok: true, value: file });
  });

  test("a stored case without opening it", async () => {
    const { state, repository } = await startWorkbench();
    repository.store(caseOf("0b1d7c3e-1111-4222-8333-abcdefabcdef"));
    expect(state().exportFile()).toBeNull();
    const file = await state().exportStored("0b1d7c3e-1111-4222-8333-abcdefabcdef");
    expect(file).toMatchObject({ ok: true, value: { name: "ebbline-2026-03-04-0b1d7c3e.ebbline.json" } });
    expect(await state().exportStored("none")).toMatchObject({ ok: false, issues: [{ code: "storage-case-gone" }] });
  });

  test("and importing it again gives the same case", async () => {
    const one = await startOpen();
    const two = await startWorkbench();
    const file = one.state().exportFile()!;
    expect(await two.state().importFile(file.name, file.text)).toEqual({ ok: true, value: one.open().value });
  });
});

describe("demonstrations", () => {
  const read = (name: string): unknown => JSON.parse(readFileSync(`demo-data/${name}.ebbline.json`, "utf8"));
  const demos = {
    start: read("start"),
    adjustment: read("adjustment"),
    broken: { format: "ebbline-case", version: 1 },
  };

  test("the good ones are offered, with what they say of themselves; a faulty one is named", async () => {
    const { state } = await startWorkbench({ demos });
    expect(state().demos.map(({ name }) => name)).toEqual(["start", "adjustment"]);
    for (const { label, medicine, about } of state().demos) expect([label, medicine, about]).not.toContain("");
    expect(state().notices).toMatchObject([
      { gravity: "stop", issues: [{ code: "demo-unreadable", data: { name: "broken" } }] },
    ]);
  });

  test("one that turns out faulty when it is opened is refused with the reasons, and nothing is stored", async () => {
    const { state } = await startWorkbench({ demos: { spoilt: { ...(read("start") as object), options: "none" } } });
    expect(state().demos.map(({ name }) => name)).toEqual(["spoilt"]);
    await state().openDemo("spoilt");
    expect([state().open, state().entries]).toEqual([null, []]);
    expect(state().notices).toMatchObject([{ gravity: "stop", issues: [{ path: ["options"] }] }]);
  });

  test("each opening is a fresh copy, marked as a demonstration", async () => {
    const { state, open } = await startWorkbench({ demos });
    await state().openDemo("start");
    expect(open().value).toMatchObject({ id: "new-1", demo: true });
    state().edit("caseRename", { label: "changed" });
    await state().openDemo("start");
    expect(open().value).toMatchObject({ id: "new-2", demo: true });
    expect(open().value.label).not.toBe("changed");
    expect(state().entries).toHaveLength(2);
    expect(state().entries.every(({ demo }) => demo)).toBe(true);
  });

  test("a name that is not there is a programmer's mistake", async () => {
    const { state } = await startWorkbench({ demos });
    await expect(state().openDemo("toString")).rejects.toThrow(RangeError);
  });
});

describe("a new version of the program", () => {
  test("is offered, and taken when everything is on disk", async () => {
    const { state, repository } = await startOpen();
    repository.hold = true;
    const apply = vi.fn();
    state().offerUpdate(apply);
    expect(state().update).toBe("waiting");
    state().edit("caseRename", { label: "x" });
    const applied = state().applyUpdate();
    await turns();
    expect(apply).not.toHaveBeenCalled();
    repository.settleSave();
    await applied;
    expect(apply).toHaveBeenCalledOnce();
  });

  test("is not taken over work that could not be saved, unless it was exported", async () => {
    const { state, repository } = await startOpen();
    repository.refusal = quota;
    const apply = vi.fn();
    state().offerUpdate(apply);
    state().edit("caseRename", { label: "x" });
    await state().applyUpdate();
    expect(apply).not.toHaveBeenCalled();
    expect(state().notices).toMatchObject([{ gravity: "stop", issues: [{ code: "update-unsaved" }] }]);
    state().exportFile();
    await state().applyUpdate();
    expect(apply).toHaveBeenCalledOnce();
  });
});
