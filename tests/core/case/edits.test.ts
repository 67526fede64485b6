import { describe, expect, it } from "vitest";
import { type Case, caseEdit, caseEditTry, caseNew, EDIT_NAMES, optionNextId } from "../../../src/core/case/index.ts";
import { editLabel } from "../../../src/core/messages/index.ts";
import { recordOf } from "../medicine/recordOf.ts";
import { sampleCase } from "./sampleCase.ts";

const before: Case = sampleCase();
const mg = (value: number) => ({ value, unit: "mg" as const });

describe("every edit", () => {
  it("has a label of its own", () => {
    const labels = EDIT_NAMES.map(editLabel);
    expect(new Set(labels).size).toBe(EDIT_NAMES.length);
    for (const label of labels) expect(label).toMatch(/^[a-z][a-z ]+$/);
  });

  it("leaves the case it was given alone and shares what it does not touch", () => {
    const after = caseEdit(before, "levelExclude", { id: "l1", reason: "late" });
    expect(before).toEqual(sampleCase());
    expect(after.medicine).toBe(before.medicine);
    expect(after.given).toBe(before.given);
    expect(after.levels[1]).toBe(before.levels[1]);
  });
});

describe("case and patient", () => {
  it.each([
    ["caseRename", { label: "new" }, { label: "new" }],
    ["notesSet", { notes: "n" }, { notes: "n" }],
    ["nowSet", { at: "2026-03-05T00:00:00+00:00" }, { now: "2026-03-05T00:00:00+00:00" }],
    ["timeZoneSet", { timeZone: "Europe/Paris" }, { timeZone: "Europe/Paris" }],
    [
      "fitSet",
      { fit: { use: "individual", residualModel: "robust" } },
      { fit: { use: "individual", residualModel: "robust" } },
    ],
    ["sexSet", { sex: "male" }, { patient: { ...before.patient, sex: "male" } }],
    ["ageSet", { age: { value: 70, unit: "a" } }, { patient: { ...before.patient, age: { value: 70, unit: "a" } } }],
    [
      "heightSet",
      { height: { value: 1.7, unit: "m" } },
      { patient: { ...before.patient, height: { value: 1.7, unit: "m" } } },
    ],
  ] as const)("%s", (name, args, change) => {
    expect(caseEdit(before, name, args as never)).toEqual({ ...before, ...change });
  });

  it("null takes a trait away", () => {
    const after = (["sexSet", "ageSet", "heightSet"] as const).reduce<Case>(
      (value, name) => caseEdit(value, name, { sex: null, age: null, height: null } as never),
      before,
    );
    expect(Object.keys(after.patient).sort()).toEqual(["factors", "observations"]);
  });
});

describe("observations and levels", () => {
  const weight = (id: string, at: string) => ({
    id,
    at,
    kind: "weight" as const,
    quantity: { value: 60, unit: "kg" as const },
  });

  it("stay in time order, equal times in order of arrival", () => {
    const ids = (value: Case) => value.patient.observations.map((each) => each.id);
    const added = caseEdit(before, "observationAdd", { observation: weight("w", "2026-03-02T07:00:00+00:00") });
    expect(ids(added)).toEqual(["o1", "o2", "o3", "w"]);
    // The same instant in another zone's offset sorts by the instant, not by its text.
    const moved = caseEdit(added, "observationChange", { observation: weight("w", "2026-03-01T09:30:00+02:00") });
    expect(ids(moved)).toEqual(["w", "o1", "o2", "o3"]);
    expect(ids(caseEdit(moved, "observationRemove", { id: "o2" }))).toEqual(["w", "o1", "o3"]);
  });

  it("levels: add, change, leave out, take back in, remove", () => {
    const level = {
      id: "l0",
      at: "2026-03-02T10:00:00+00:00",
      quantity: { value: 5, unit: "mg/L" as const },
      kind: "measured" as const,
    };
    const added = caseEdit(before, "levelAdd", { level });
    expect(added.levels.map((each) => each.id)).toEqual(["l0", "l1", "l2"]);
    const late = caseEdit(added, "levelChange", { level: { ...level, at: "2026-03-05T10:00:00+00:00" } });
    expect(late.levels.map((each) => each.id)).toEqual(["l1", "l2", "l0"]);
    const out = caseEdit(late, "levelExclude", { id: "l1", reason: "haemolysed" });
    expect(out.levels[0]).toEqual({ ...before.levels[0], excluded: "haemolysed" });
    expect(caseEdit(out, "levelExclude", { id: "l1", reason: null })).toEqual(late);
    expect(caseEdit(caseEdit(late, "levelRemove", { id: "l0" }), "levelRemove", { id: "l2" }).levels).toEqual([
      before.levels[0],
    ]);
  });
});

describe("factors", () => {
  const verapamil = {
    kind: "interacting-medicine",
    from: "2026-02-20T08:00:00+00:00",
    detail: "invented",
    effect: { clearance: 0.784, onset: { value: 4, unit: "d" } },
  } as const;

  it("are added at the end, changed in place, removed: an index stays that of the same factor", () => {
    const [meal] = before.patient.factors;
    const added = caseEdit(before, "factorAdd", { factor: verapamil });
    expect(added).toEqual({ ...before, patient: { ...before.patient, factors: [meal, verapamil] } });
    const stopped = { ...verapamil, to: "2026-03-03T08:00:00+00:00" };
    const changed = caseEdit(added, "factorChange", { index: 1, factor: stopped });
    expect(changed.patient.factors).toEqual([meal, stopped]);
    expect(changed.patient.factors[0]).toBe(meal);
    expect(caseEdit(changed, "factorRemove", { index: 0 }).patient.factors).toEqual([stopped]);
    expect(caseEdit(changed, "factorRemove", { index: 1 })).toEqual(before);
    expect(added.patient.observations).toBe(before.patient.observations);
  });

  it.each([-1, 1, 0.5, Number.NaN])("index %d is no factor's", (index) => {
    expect(() => caseEdit(before, "factorRemove", { index })).toThrow(RangeError);
    expect(() => caseEdit(before, "factorChange", { index, factor: verapamil })).toThrow(RangeError);
  });

  it("one that could not be opened again is refused with the reason", () => {
    const factor = { ...verapamil, effect: { clearance: 0.5, onset: { value: 0, unit: "d" as const } } };
    expect(caseEditTry(before, "factorAdd", { factor })).toMatchObject({
      ok: false,
      issues: [{ code: "factor-onset", path: ["patient", "factors", 1, "effect", "onset", "value"] }],
    });
  });
});

describe("medicine and window", () => {
  const products = { "tablet-12h": "capsule-slow", solution: "liquid" };

  it("another medicine maps the products and lets go of the old window", () => {
    const after = caseEdit(before, "medicineSet", { record: recordOf("demoxiline"), products });
    expect(after.medicine.id).toBe("demoxiline");
    expect("window" in after).toBe(false);
    expect(after.given.map((each) => each.product)).toEqual(["capsule-slow", "liquid"]);
    expect(after.options.flatMap((each) => each.lines.map((line) => line.product))).toEqual(
      Array(3).fill("capsule-slow"),
    );
  });

  it("another version of the same record keeps the window and the lines", () => {
    const record = { ...before.medicine, recordVersion: 2 };
    expect(caseEdit(before, "medicineSet", { record })).toEqual({ ...before, medicine: record });
  });

  it("a line whose product has no place is the caller's mistake", () => {
    expect(() => caseEdit(before, "medicineSet", { record: recordOf("demoxiline") })).toThrow(/g1.*tablet-12h/);
    expect(() =>
      caseEdit(before, "medicineSet", {
        record: recordOf("demoxiline"),
        products: { ...products, solution: "tablet" },
      }),
    ).toThrow(/dose-unit-mismatch/);
  });

  it("a window is set and taken away", () => {
    const { window: _, ...without } = before;
    expect(caseEdit(before, "windowSet", { window: null })).toEqual(without);
    const window = {
      quantity: "trough",
      low: { value: 5, unit: "mg/L" },
      high: { value: 9, unit: "mg/L" },
      basis: "",
    } as const;
    expect(caseEdit(before, "windowSet", { window })).toEqual({ ...before, window });
  });
});

describe("lines", () => {
  const line = (id: string) => ({ id, product: "tablet", amount: mg(125), start: "2026-03-04T20:00:00+00:00" });
  const ids = (value: Case, lane: string) =>
    (lane === "given" ? value.given : value.options.find((each) => each.id === lane)!.lines).map((each) => each.id);

  it.each(["given", "B"])("in lane %s are added at the end, replaced in place, removed", (lane) => {
    const [first, second] = ids(before, lane) as [string, string];
    const added = caseEdit(before, "linesAdd", { lane, lines: [line("x"), line("y")] });
    expect(ids(added, lane)).toEqual([first, second, "x", "y"]);
    const replaced = caseEdit(added, "lineReplace", { lane, id: first, lines: [line(first), line("z")] });
    expect(ids(replaced, lane)).toEqual([first, "z", second, "x", "y"]);
    expect(ids(caseEdit(replaced, "lineRemove", { lane, id: "x" }), lane)).toEqual([first, "z", second, "y"]);
    const changed = caseEdit(before, "lineChange", { lane, line: line(second) });
    expect((lane === "given" ? changed.given : changed.options[1]!.lines)[1]).toEqual(line(second));
    expect(lane === "given" ? changed.options : changed.given).toBe(lane === "given" ? before.options : before.given);
  });
});

describe("options", () => {
  it("are added, duplicated beside the original, renamed, removed", () => {
    const added = caseEdit(before, "optionAdd", { id: "C", label: "c" });
    expect(added.options[2]).toEqual({ id: "C", label: "c", lines: [], chosen: false });
    const copied = caseEdit(added, "optionDuplicate", { id: "A", newId: "D", label: "copy" });
    expect(copied.options.map((each) => each.id)).toEqual(["A", "D", "B", "C"]);
    expect(copied.options[1]).toEqual({ ...before.options[0], id: "D", label: "copy", chosen: false });
    const renamed = caseEdit(copied, "optionRename", { id: "D", label: "else" });
    expect(renamed.options[1]!.label).toBe("else");
    expect(caseEdit(renamed, "optionRemove", { id: "D" })).toEqual(added);
  });

  it("at most one is chosen", () => {
    const chosen = (value: Case) => value.options.filter((each) => each.chosen).map((each) => each.id);
    const b = caseEdit(before, "optionChoose", { id: "B" });
    expect(chosen(b)).toEqual(["B"]);
    expect(chosen(caseEdit(b, "optionChoose", { id: null }))).toEqual([]);
  });

  it("are named A, B, C … Z, AA, the first that is free", () => {
    let value = caseNew({
      id: "x",
      label: "",
      timeZone: "UTC",
      now: "2026-03-04T00:00:00Z",
      medicine: recordOf("demoxiline"),
    });
    expect(optionNextId(value)).toBe("A");
    expect(optionNextId(before)).toBe("C");
    expect(optionNextId(caseEdit(before, "optionRemove", { id: "A" }))).toBe("A");
    const letters = Array.from({ length: 26 }, (_, i) => String.fromCharCode(65 + i));
    value = { ...value, options: letters.map((id) => ({ id, label: "", lines: [], chosen: false })) };
    expect(optionNextId(value)).toBe("AA");
  });
});

describe("a programmer's mistake throws", () => {
  it.each<[string, () => unknown]>([
    ["unknown level", () => caseEdit(before, "levelRemove", { id: "nothing" })],
    ["unknown level to leave out", () => caseEdit(before, "levelExclude", { id: "nothing", reason: "x" })],
    ["unknown observation", () => caseEdit(before, "observationRemove", { id: "nothing" })],
    ["level twice", () => caseEdit(before, "levelAdd", { level: before.levels[0]! })],
    ["unknown lane", () => caseEdit(before, "linesAdd", { lane: "Z", lines: [] })],
    ["unknown line", () => caseEdit(before, "lineRemove", { lane: "A", id: "b1" })],
    ["line twice", () => caseEdit(before, "linesAdd", { lane: "given", lines: [before.given[0]!] })],
    ["unknown option", () => caseEdit(before, "optionChoose", { id: "Z" })],
    ["option twice", () => caseEdit(before, "optionAdd", { id: "A", label: "" })],
    ["option named as the lane", () => caseEdit(before, "optionAdd", { id: "given", label: "" })],
    [
      "dose past the end",
      () => caseEdit(before, "doseMark", { lane: "given", lineId: "g1", index: 7, status: "missed" }),
    ],
    [
      "amount of a missed dose",
      () => caseEdit(before, "doseScale", { lane: "given", lineId: "g1", index: 3, amount: mg(100) }),
    ],
    ["length of a single dose", () => caseEdit(before, "lineStretch", { lane: "given", lineId: "g2", count: 2 })],
    ["days of an hourly repeat", () => caseEdit(before, "lineStretch", { lane: "given", lineId: "g1", days: 2 })],
    ["count of a clock repeat", () => caseEdit(before, "lineStretch", { lane: "B", lineId: "b1", count: 2 })],
    [
      "an instant that is none",
      () => caseEdit(before, "doseMove", { lane: "given", lineId: "g1", index: 0, at: "tomorrow" }),
    ],
  ])("%s", (_, act) => {
    expect(act).toThrow(RangeError);
  });

  it("so does an outcome that could not be opened again; caseEditTry says why", () => {
    const args = {
      window: { quantity: "trough", low: { value: 9, unit: "mg/L" }, high: { value: 5, unit: "mg/L" }, basis: "" },
    } as const;
    expect(() => caseEdit(before, "windowSet", args)).toThrow(/windowSet.*window-order at window/);
    expect(caseEditTry(before, "windowSet", args)).toMatchObject({ ok: false, issues: [{ code: "window-order" }] });
    expect(caseEditTry(before, "notesSet", { notes: "x".repeat(10_001) })).toMatchObject({
      ok: false,
      issues: [{ code: "value-too-big" }],
    });
  });
});
