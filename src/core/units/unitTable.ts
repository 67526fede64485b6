import type { UnitCode } from "./quantity.ts";

export type UnitDimension =
  | "mass"
  | "length"
  | "area"
  | "mass per area"
  | "volume"
  | "time"
  | "mass concentration"
  | "molar concentration"
  | "amount of substance"
  | "flow"
  | "flow per standard surface"
  | "mass rate"
  | "flow per mass"
  | "volume per mass"
  | "rate"
  | "molar mass"
  | "exposure"
  | "number";

interface UnitEntry {
  readonly dimension: UnitDimension;
  /** How many of the dimension's smallest step make one of this unit: an exact integer. */
  readonly factor: bigint;
}

/**
 * The closed table. Steps: mass 1 ug, length 0.1 mm, volume 1 mL, time 1 min, mass concentration 1 ug/L,
 * molar concentration 1 nmol/L, flow 1 mL/h, number 0.01. So every factor is a whole number and no conversion starts from a rounded one.
 * Pound and inch: international avoirdupois pound 0.45359237 kg and inch 2.54 cm, exact by definition.
 * Year and month: UCUM's `a` (365.25 d) and `mo` (a twelfth of it).
 * `mL/min/{1.73_m2}`: UCUM's braces hold a remark, so that by UCUM it is a mL/min. Here it is a dimension of its own:
 * a clearance per 1.73 m2 read as a clearance is wrong by the patient's body surface.
 */
export const UNIT_TABLE: Readonly<Record<UnitCode, UnitEntry>> = {
  kg: { dimension: "mass", factor: 1_000_000_000n },
  g: { dimension: "mass", factor: 1_000_000n },
  mg: { dimension: "mass", factor: 1_000n },
  ug: { dimension: "mass", factor: 1n },
  "[lb_av]": { dimension: "mass", factor: 453_592_370n },
  m: { dimension: "length", factor: 10_000n },
  cm: { dimension: "length", factor: 100n },
  "[in_i]": { dimension: "length", factor: 254n },
  m2: { dimension: "area", factor: 1n },
  "kg/m2": { dimension: "mass per area", factor: 1n },
  L: { dimension: "volume", factor: 1_000n },
  mL: { dimension: "volume", factor: 1n },
  a: { dimension: "time", factor: 525_960n },
  mo: { dimension: "time", factor: 43_830n },
  d: { dimension: "time", factor: 1_440n },
  h: { dimension: "time", factor: 60n },
  min: { dimension: "time", factor: 1n },
  "mg/L": { dimension: "mass concentration", factor: 1_000n },
  "ug/mL": { dimension: "mass concentration", factor: 1_000n },
  "ug/L": { dimension: "mass concentration", factor: 1n },
  "ng/mL": { dimension: "mass concentration", factor: 1n },
  "mg/dL": { dimension: "mass concentration", factor: 10_000n },
  "g/L": { dimension: "mass concentration", factor: 1_000_000n },
  "g/dL": { dimension: "mass concentration", factor: 10_000_000n },
  "mg/mL": { dimension: "mass concentration", factor: 1_000_000n },
  "mmol/L": { dimension: "molar concentration", factor: 1_000_000n },
  "umol/L": { dimension: "molar concentration", factor: 1_000n },
  "nmol/L": { dimension: "molar concentration", factor: 1n },
  mmol: { dimension: "amount of substance", factor: 1n },
  "L/h": { dimension: "flow", factor: 1_000n },
  "mL/min": { dimension: "flow", factor: 60n },
  "mL/min/{1.73_m2}": { dimension: "flow per standard surface", factor: 1n },
  "mg/h": { dimension: "mass rate", factor: 1n },
  "L/h/kg": { dimension: "flow per mass", factor: 1n },
  "L/kg": { dimension: "volume per mass", factor: 1n },
  "/h": { dimension: "rate", factor: 1n },
  "g/mol": { dimension: "molar mass", factor: 1n },
  "mg.h/L": { dimension: "exposure", factor: 1n },
  "1": { dimension: "number", factor: 100n },
  "%": { dimension: "number", factor: 1n },
};

/** The dimension of a unit: two units convert into each other exactly when theirs are the same (see also `unitsCompatible`). */
export function unitDimension(unit: UnitCode): UnitDimension {
  return UNIT_TABLE[unit].dimension;
}
