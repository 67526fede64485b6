import { describe, expect, test } from "vitest";
import { BUILT_IN_RECORDS, historyChange } from "../../../src/core/medicine/index.ts";
import { DRAFTS_KEY } from "../../../src/shell/store/medicineActions.ts";
import type { RecordEdit } from "../../../src/shell/store/medicineState.ts";
import { recordEditOf } from "../../../src/shell/store/recordEditOf.ts";
import { MemoryRepository } from "./memoryRepository.ts";
import { startWorkbench, turns } from "./workbenchSupport.ts";

const builtIn = BUILT_IN_RECORDS[0]!;
const own = { ...builtIn, id: "own", name: "Own medicine" };
const quota = { ok: false, reason: "quota", detail: "" } as const;
const changed = (edit: RecordEdit, molarMass: string): RecordEdit => ({
  ...edit,
  history: historyChange(edit.history, ["molarMass", "value"], molarMass),
});
const window = {
  quantity: "trough",
  low: { value: 5, unit: "mg/L" },
  high: { value: 10, unit: "mg/L" },
  basis: "ward policy",
} as const;

describe("the ward's own records", () => {
  test("are stored, listed after the built-in ones, replaced and removed", async () => {
    const { state, repository } = await startWorkbench();
    expect(await state().importMedicine("own.json", JSON.stringify(own))).toEqual({ ok: true, value: own });
    expect(state().medicines).toEqual([...BUILT_IN_RECORDS, own]);
    expect(state().ownMedicines).toEqual(["own"]);
    const second = { ...own, recordVersion: own.recordVersion + 1 };
    await state().importMedicine("own.json", JSON.stringify(second));
    expect(state().medicines).toEqual([...BUILT_IN_RECORDS, second]);
    expect(await state().removeMedicine("own")).toEqual({ ok: true, value: null });
    expect(state()).toMatchObject({ medicines: BUILT_IN_RECORDS, ownMedicines: [] });
    expect(repository.medicines.size).toBe(0);
  });

  test.each<[string, string, string]>([
    ["cut off", "{", "file-truncated"],
    ["with a field given twice", `{"id": "own", ${JSON.stringify(own).slice(1)}`, "file-field-twice"],
    [
      "without a source",
      JSON.stringify({ ...own, molarMass: { ...own.molarMass, source: undefined } }),
      "record-figure-without-source",
    ],
    ["of a built-in id", JSON.stringify(builtIn), "medicine-built-in"],
  ])("%s is refused, nothing is stored", async (_, text, code) => {
    const { state, repository } = await startWorkbench();
    expect(await state().importMedicine("f.json", text)).toMatchObject({ ok: false, issues: [{ code }] });
    expect([state().medicines, repository.medicines.size]).toEqual([BUILT_IN_RECORDS, 0]);
  });

  test("that can't be stored or removed leave what is shown as it is stored", async () => {
    const { state, repository } = await startWorkbench();
    await state().importMedicine("own.json", JSON.stringify(own));
    repository.refusal = quota;
    expect(await state().removeMedicine("own")).toMatchObject({ ok: false, issues: [{ code: "save-quota" }] });
    expect(await state().importMedicine("f", JSON.stringify({ ...own, id: "more" }))).toMatchObject({ ok: false });
    expect(state().ownMedicines).toEqual(["own"]);
  });

  test("removed: the way back is offered, brings record and unsaved edits, and is done once", async () => {
    const { state, repository } = await startWorkbench();
    await state().importMedicine("own.json", JSON.stringify(own));
    const edit = changed(recordEditOf(own), "182");
    state().keepRecordEdit("own", edit);
    await state().removeMedicine("own");
    expect(state()).toMatchObject({ ownMedicines: [], recordEdits: {} });
    const [notice] = state().notices;
    expect(notice).toMatchObject({ gravity: "note", issues: [{ code: "medicine-removed", data: { name: own.name } }] });
    await Promise.all([state().undoNotice(notice!.id), state().undoNotice(notice!.id)]);
    expect(state()).toMatchObject({ ownMedicines: ["own"], recordEdits: { own: edit }, notices: [] });
    expect(repository.medicines.get("own")).toEqual(own);
  });

  test("removed and not to be put back: said, with the reason", async () => {
    const { state, repository } = await startWorkbench();
    await state().importMedicine("own.json", JSON.stringify(own));
    await state().removeMedicine("own");
    repository.refusal = quota;
    await state().undoNotice(state().notices[0]!.id);
    expect(state().ownMedicines).toEqual([]);
    expect(state().notices).toMatchObject([{ issues: [{ code: "medicine-not-back" }, { code: "save-quota" }] }]);
  });

  test("an import in place of other figures says so and can be taken back; the same figures again say nothing", async () => {
    const { state } = await startWorkbench();
    await state().importMedicine("own.json", JSON.stringify(own));
    await state().importMedicine("own.json", JSON.stringify(own));
    expect(state().notices).toEqual([]);
    const other = { ...own, matrix: "whole blood" };
    await state().importMedicine("own.json", JSON.stringify(other));
    expect(state().notices).toMatchObject([{ gravity: "check", issues: [{ code: "medicine-replaced" }] }]);
    await state().undoNotice(state().notices[0]!.id);
    expect(state().medicines.at(-1)).toEqual(own);
  });

  test("copied from one that comes with the program, exported and imported again as it is", async () => {
    const { state } = await startWorkbench();
    const copied = await state().copyMedicine(builtIn.id);
    if (!copied.ok) throw new Error("not copied");
    expect(copied.value).toMatchObject({
      id: "new-1",
      recordVersion: 1,
      copyOf: { id: builtIn.id, recordVersion: builtIn.recordVersion },
    });
    expect(state().ownMedicines).toEqual(["new-1"]);
    const file = state().exportMedicine("new-1");
    expect(file.name).toBe("theophylline-copy.ebbline-medicine.json");
    await state().removeMedicine("new-1");
    expect(await state().importMedicine(file.name, file.text)).toEqual(copied);
  });

  test("edited: kept through a restart as typed, refused while wrong, one version further when saved", async () => {
    const repository = new MemoryRepository();
    const { state } = await startWorkbench({}, repository);
    await state().importMedicine("own.json", JSON.stringify(own));
    state().keepRecordEdit("own", changed(recordEditOf(own), "18,2"));
    await turns();

    const again = (await startWorkbench({}, repository)).state;
    const kept = again().recordEdits.own!;
    expect(kept.history.draft).toEqual(changed(recordEditOf(own), "18,2").history.draft);
    const refused = await again().saveRecordEdit("own");
    expect(refused).toMatchObject({ ok: false, issues: [{ code: "number-comma" }, {}, {}] });
    expect(repository.medicines.get("own")).toEqual(own);

    let history = changed(kept, "182").history;
    history = historyChange(history, ["molarMass", "source"], own.molarMass.source);
    history = historyChange(history, ["molarMass", "basis"], "memory");
    again().keepRecordEdit("own", { ...kept, history });
    const saved = await again().saveRecordEdit("own");
    expect(saved).toMatchObject({
      ok: true,
      value: { recordVersion: own.recordVersion + 1, molarMass: { value: 182, basis: "memory" } },
    });
    await turns();
    expect(again().recordEdits).toEqual({});
    expect(repository.settings.get(DRAFTS_KEY)).toEqual({});
  });

  test("edited where nothing can be stored: kept while the page is open, and said once", async () => {
    const { state, repository } = await startWorkbench();
    await state().importMedicine("own.json", JSON.stringify(own));
    repository.refusal = quota;
    state().keepRecordEdit("own", changed(recordEditOf(own), "1"));
    await turns();
    state().keepRecordEdit("own", changed(recordEditOf(own), "18"));
    await turns();
    expect(Object.keys(state().recordEdits)).toEqual(["own"]);
    expect(state().notices).toMatchObject([{ issues: [{ code: "record-draft-not-kept" }, { code: "save-quota" }] }]);
  });

  test("drafts that were stored as something else altogether take nothing with them", async () => {
    const repository = new MemoryRepository();
    repository.settings.set(DRAFTS_KEY, { a: 5, b: null, c: { recordVersion: 1, draft: [] } });
    const { state } = await startWorkbench({}, repository);
    expect(state()).toMatchObject({ recordEdits: {}, notices: [] });
  });

  test("a built-in record can't be removed", async () => {
    const { state } = await startWorkbench();
    await expect(state().removeMedicine(builtIn.id)).rejects.toThrow(RangeError);
  });

  test("hidden by a record that now comes with the program is said", async () => {
    const repository = new MemoryRepository();
    repository.medicines.set(builtIn.id, { ...builtIn, name: "ours" });
    const { state } = await startWorkbench({}, repository);
    expect(state()).toMatchObject({ medicines: BUILT_IN_RECORDS, ownMedicines: [] });
    expect(state().notices).toMatchObject([{ issues: [{ code: "medicine-hidden", data: { id: builtIn.id } }] }]);
  });
});

test("the ward's own windows are kept by medicine and id", async () => {
  const { state, repository } = await startWorkbench();
  await state().saveWindow("m", "a", window);
  await state().saveWindow("n", "a", window);
  await state().saveWindow("m", "a", { ...window, basis: "new policy" });
  expect(state().wardWindows).toEqual([
    { medicine: "n", id: "a", window },
    { medicine: "m", id: "a", window: { ...window, basis: "new policy" } },
  ]);
  await state().removeWindow("n", "a");
  expect(state().wardWindows).toHaveLength(1);
  expect([...repository.windows.keys()]).toEqual(["m/a"]);
  repository.refusal = quota;
  expect(await state().saveWindow("m", "b", window)).toMatchObject({ ok: false });
  expect(await state().removeWindow("m", "a")).toMatchObject({ ok: false });
  expect(state().wardWindows).toHaveLength(1);
});

test("settings hold at once, are stored, and one that could not be is said", async () => {
  const { state, repository } = await startWorkbench();
  await state().changeSettings({ pageSize: "Letter" });
  await state().changeSettings({ preparedBy: "K. Example" });
  expect(repository.settings.get("settings")).toEqual({
    pageSize: "Letter",
    microgram: "microgram",
    preparedBy: "K. Example",
  });
  repository.refusal = quota;
  await state().changeSettings({ microgram: "mcg" });
  expect(state().settings.microgram).toBe("mcg");
  expect(state().notices).toMatchObject([{ issues: [{ code: "setting-not-saved" }, { code: "save-quota" }] }]);
});
