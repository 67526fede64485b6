import { derive } from "../../../src/core/analysis/index.ts";
import type { Case, Factor } from "../../../src/core/case/index.ts";
import type { Figure, MedicineRecord, RecordWindow } from "../../../src/core/medicine/index.ts";
import { caseFixture } from "./caseFixture.ts";

/** Cases that differ from a quiet one by what a rule about the record looks at. */

export const known = { source: "invented-for-tests", basis: "seen" } as const;
export const figure = (value: number, unit: Figure["unit"], basis: Figure["basis"] = "seen"): Figure => ({
  value,
  unit,
  source: known.source,
  basis,
});
export const fixture = caseFixture();
/** As if every figure had been read in its source. */
export const asSeen = (record: MedicineRecord): MedicineRecord =>
  JSON.parse(JSON.stringify(record).replaceAll('"basis":"memory"', '"basis":"seen"'));
export const plain: Case = { ...fixture, medicine: asSeen(fixture.medicine) };
export const [tablet12h] = plain.medicine.products.filter((each) => each.id === "tablet-12h");
/** Theophylline's record with nothing that a rule below would point out. */
export const quiet: MedicineRecord = {
  ...plain.medicine,
  sources: { ...plain.medicine.sources, "invented-for-tests": { title: "Invented for tests" } },
  estimates: { from: "one-model", text: "One model.", ...known },
  population: { text: "Adults.", ...known, ranges: [{ covariate: "age", low: 18, high: 90, unit: "a", ...known }] },
  limits: {},
  interactions: [],
  cautions: [],
};
delete quiet.steadyStateAfter;
delete quiet.earliestSample;
delete quiet.autoinduction;

export const value = (record: Partial<MedicineRecord> = {}, change: Partial<Case> = {}): Case => ({
  ...plain,
  medicine: { ...quiet, ...record },
  ...change,
});
export const level = (at: string, change: Partial<Case["levels"][number]> = {}): Case["levels"][number] => ({
  id: "l",
  at,
  quantity: { value: 6, unit: "mg/L" },
  kind: "measured",
  ...change,
});
/** Doses at 08:00 and 20:00 from 1 March; the last at 08:00 on 4 March, now is 12:00. */
export const TROUGH = "2026-03-04T07:30:00+00:00";
export const withLevel = (record: Partial<MedicineRecord> = {}, at = TROUGH, change: Partial<Case> = {}): Case =>
  value(record, { levels: [level(at)], ...change });
export const event = (detail: string, change: Partial<Factor> = {}): Partial<Case> => ({
  patient: { ...plain.patient, factors: [{ kind: "interacting-medicine", from: plain.now, detail, ...change }] },
});
export const interactions: MedicineRecord["interactions"] = [
  {
    id: "i",
    medicine: "valproate",
    parameter: "clearance",
    factor: figure(0.49, "1"),
    text: "Valproate slows elimination.",
  },
];
export const trough: RecordWindow = {
  id: "w",
  label: "Trough",
  use: "invented",
  sampling: "just before a dose",
  quantity: "trough",
  low: { value: 8, unit: "mg/L" },
  high: { value: 15, unit: "mg/L" },
  ...known,
};
export const troughWindow: NonNullable<Case["window"]> = {
  quantity: "trough",
  low: trough.low,
  high: trough.high,
  basis: "invented",
};
export const troughOf = (low: number, high: number): NonNullable<Case["window"]> => ({
  ...troughWindow,
  low: { value: low, unit: "mg/L" },
  high: { value: high, unit: "mg/L" },
});
export const otherProduct = (change: Partial<MedicineRecord["products"][number]>): Partial<MedicineRecord> => ({
  products: [...quiet.products, { ...tablet12h!, id: "other", name: "other tablet", ...change }],
});
export const optionOf = (product: string, mg: number): Case["options"] => [
  {
    ...plain.options[0]!,
    lines: [{ ...plain.options[0]!.lines[0]!, product, amount: { value: mg, unit: "mg" } }],
  },
];
/** With another formula of the clearance. */
export const clearanceOf = (formula: string): Partial<MedicineRecord> => {
  const { kinetics } = quiet;
  if (kinetics.kind !== "one-compartment-oral") throw new RangeError("theophylline: one compartment expected");
  return { kinetics: { ...kinetics, clearance: { ...kinetics.clearance, formula } } };
};
export const kineticsFromMemory = (): MedicineRecord => {
  const { kinetics } = quiet;
  if (kinetics.kind !== "one-compartment-oral") throw new RangeError("theophylline: one compartment expected");
  return { ...quiet, kinetics: { ...kinetics, clearance: { ...kinetics.clearance, basis: "memory" } } };
};

export const found = (one: Case, code: string) => derive(one).concerns.filter((each) => each.code === code);
