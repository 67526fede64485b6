import { describe, expect, test } from "vitest";
import { BUILT_IN_RECORDS } from "../../../src/core/medicine/index.ts";
import { issue } from "../../../src/core/result/index.ts";
import type { StorageState } from "../../../src/shell/store/ports.ts";
import { caseOf } from "../storage/fakeBrowser.ts";
import { MemoryRepository } from "./memoryRepository.ts";
import { startOpen, startWorkbench, turns } from "./workbenchSupport.ts";

async function startWith(state: StorageState) {
  const repository = new MemoryRepository();
  repository.store(caseOf("a"));
  repository.state = state;
  return startWorkbench({}, repository);
}
const lost = { kind: "lost", extent: "all", cases: 2, lastSavedAt: 9, recoverable: 0, detail: "gone" } as const;
const fields = {
  label: "n",
  medicine: BUILT_IN_RECORDS[0]!.id,
  timeZone: "Europe/Lisbon",
  now: "2026-03-04T09:00:00+00:00",
};

describe("starting", () => {
  test("reads what is stored", async () => {
    const repository = new MemoryRepository();
    repository.store(caseOf("a"));
    repository.settings.set("settings", { pageSize: "Letter", microgram: 7 });
    const own = { ...BUILT_IN_RECORDS[0]!, id: "own", name: "Own" };
    repository.medicines.set("own", own);
    const { state } = await startWorkbench({}, repository);
    expect(state()).toMatchObject({
      boot: { kind: "ready" },
      entries: [{ id: "a" }],
      settings: { pageSize: "Letter", microgram: "microgram", preparedBy: "" },
      ownMedicines: ["own"],
      notices: [],
    });
    expect(state().medicines).toEqual([...BUILT_IN_RECORDS, own]);
  });

  test("a storage that can't be read is said, and the program is there", async () => {
    const repository = new MemoryRepository();
    repository.list = () => Promise.reject(new Error("broken"));
    repository.listMedicines = () => Promise.reject(new Error("broken"));
    const { state } = await startWorkbench({}, repository);
    expect(state()).toMatchObject({ boot: { kind: "ready" }, medicines: BUILT_IN_RECORDS });
    expect(state().notices).toMatchObject([{ gravity: "stop", issues: [{ code: "storage-read-failed" }] }]);
  });

  test("an opening that throws is no storage", async () => {
    const repository = new MemoryRepository();
    repository.open = () => Promise.reject(new Error("boom"));
    const { state } = await startWorkbench({}, repository);
    expect(state().boot).toEqual({ kind: "unavailable", detail: "Error: boom" });
  });
});

describe("a lost storage", () => {
  test("is never shown as a first run: nothing is listed, nothing can be made until it is accepted", async () => {
    const { state, repository } = await startWith(lost);
    expect(state()).toMatchObject({ boot: lost, entries: [] });
    await state().newCase(fields);
    await state().openCase("a");
    expect(await state().importFile("f", "{}")).toMatchObject({ ok: false, issues: [{ code: "storage-not-open" }] });
    expect(state().open).toBeNull();
    expect(repository.saves).toEqual([]);
    expect(state().notices).toMatchObject([{ issues: [{ code: "storage-not-open" }] }]);
    await state().acceptLoss();
    expect(state()).toMatchObject({ boot: { kind: "ready" }, entries: [{ id: "a" }] });
    expect(repository.lossAccepted).toBe(1);
  });

  test("that can't be put right is said", async () => {
    const { state, repository } = await startWith(lost);
    repository.acceptLoss = () => Promise.reject(new Error("full"));
    await state().acceptLoss();
    expect(state().boot).toEqual(lost);
    expect(state().notices).toMatchObject([{ gravity: "stop", issues: [{ code: "storage-read-failed" }] }]);
  });
});

describe("a newer storage", () => {
  test("can be read and exported, not changed", async () => {
    const { state, open, repository } = await startWith({ kind: "newer", found: 2, known: 1, readable: true });
    await state().openCase("a");
    expect(open()).toMatchObject({ role: "reader", saving: { status: "read-only", reason: "newer" } });
    state().edit("caseRename", { label: "x" });
    expect(open().value.label).toBe("Harbour ward");
    expect(state().exportFile()?.text).toContain("Harbour ward");
    await state().newCase(fields);
    expect(open().value.id).toBe("a");
    expect(state().notices.map(({ issues }) => issues[0]?.code)).toEqual(["edit-read-only", "storage-newer"]);
    expect([repository.saves, repository.claimed.size]).toEqual([[], 0]);
  });

  test("that can't be read is only named", async () => {
    const { state } = await startWith({ kind: "newer", found: 3, known: 1, readable: false });
    await state().openCase("a");
    expect(state()).toMatchObject({ entries: [], open: null, notices: [{ issues: [{ code: "storage-newer" }] }] });
  });
});

test("without storage a case is worked on in memory and said to be unsaved; a file can still be brought in", async () => {
  const repository = new MemoryRepository();
  repository.state = { kind: "unavailable", detail: "denied" };
  repository.refusal = { ok: false, reason: "closed", detail: "unavailable" };
  const { state, open } = await startWorkbench({}, repository);
  await state().newCase(fields);
  expect(open()).toMatchObject({ role: "writer", saving: { status: "failed", reason: "closed" } });
  const file = state().exportFile();
  await state().closeCase();
  expect(state().open).toBeNull();
  expect(await state().importFile(file!.name, file!.text)).toMatchObject({ ok: true, value: { label: "n" } });
  await turns();
  expect(open()).toMatchObject({ value: { label: "n" }, saving: { status: "failed" } });
});

test("blocked goes on by itself when the other tab is closed", async () => {
  const { state, repository } = await startWith({ kind: "blocked" });
  expect(state()).toMatchObject({ boot: { kind: "blocked" }, entries: [] });
  repository.state = { kind: "ready" };
  repository.emit({ kind: "unblocked" });
  await expect.poll(() => state().boot.kind).toBe("ready");
  expect(state().entries).toHaveLength(1);
});

describe("a newer version that takes the storage over", () => {
  test("makes this tab a reader of what is on disk, and says so", async () => {
    const { state, open, repository } = await startOpen();
    repository.emit({ kind: "superseded" });
    await turns();
    expect(open()).toMatchObject({ role: "reader", saving: { status: "read-only", reason: "newer" } });
    expect(state().notices).toMatchObject([{ gravity: "stop", issues: [{ code: "storage-superseded" }] }]);
    state().edit("caseRename", { label: "x" });
    expect(open().value.label).toBe("Harbour ward");
    await state().openCase("b");
    expect(state().notices.at(-1)?.issues).toMatchObject([{ code: "edit-read-only" }]);
    expect(open().value.id).toBe("a");
  });

  test("what is not on disk is kept and said to be so, until it is exported", async () => {
    const { state, open, repository } = await startOpen();
    repository.refusal = { ok: false, reason: "newer", detail: "" };
    state().edit("caseRename", { label: "mine" });
    await turns();
    repository.emit({ kind: "superseded" });
    await turns();
    expect(open()).toMatchObject({
      role: "reader",
      value: { label: "mine" },
      saving: { status: "failed", reason: "newer" },
    });
    await state().closeCase();
    expect(open().value.label).toBe("mine");
    expect(state().exportFile()?.text).toContain("mine");
    await state().closeCase();
    expect(state().open).toBeNull();
  });

  test("while a write is under way: what it says in the end is what is shown", async () => {
    const { state, open, repository } = await startOpen();
    repository.hold = true;
    state().edit("caseRename", { label: "mine" });
    repository.emit({ kind: "superseded" });
    expect(open().saving.status).toBe("failed");
    repository.settleSave();
    await turns();
    expect(open().saving).toMatchObject({ status: "read-only", reason: "newer" });
  });
});

test("a storage that went away under an open case is written to again", async () => {
  const { open, repository } = await startOpen();
  repository.hold = true;
  repository.emit({ kind: "gone" });
  expect(open().saving.status).toBe("saving");
  repository.settleSave({ ok: false, reason: "closed", detail: "" });
  await turns();
  expect(open().saving).toMatchObject({ status: "failed", reason: "closed" });
});

test("what the storage has to say is shown, each thing once", async () => {
  const { state, repository } = await startWorkbench();
  for (let n = 0; n < 2; n++) repository.emit({ kind: "fault", issues: [issue("storage-no-copies")] });
  expect(state().notices).toMatchObject([{ gravity: "note", issues: [{ code: "storage-no-copies" }] }]);
  state().dismiss(state().notices[0]!.id);
  expect(state().notices).toEqual([]);
});
