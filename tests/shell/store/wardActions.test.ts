import { describe, expect, test } from "vitest";
import { BUILT_IN_RECORDS } from "../../../src/core/medicine/index.ts";
import { MemoryRepository } from "./memoryRepository.ts";
import { startWorkbench } from "./workbenchSupport.ts";

const builtIn = BUILT_IN_RECORDS[0]!;
const own = { ...builtIn, id: "own", name: "Own medicine" };
const quota = { ok: false, reason: "quota", detail: "" } as const;
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
    ["no JSON", "{", "medicine-file-unreadable"],
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
