import { z } from "zod";

/**
 * The closed list of units Ebbline knows, written as UCUM codes (The Unified Code for Units of Measure).
 * A unit that is not in this list is refused; there is no unit expression language.
 */
export const UNIT_CODES = [
  // mass
  "kg",
  "g",
  "mg",
  "ug",
  "[lb_av]",
  // length
  "m",
  "cm",
  "[in_i]",
  // area, and weight for it
  "m2",
  "kg/m2",
  // volume
  "L",
  "mL",
  // time
  "a",
  "mo",
  "d",
  "h",
  "min",
  // mass concentration
  "mg/L",
  "ug/mL",
  "ug/L",
  "ng/mL",
  "mg/dL",
  "g/L",
  "g/dL",
  "mg/mL",
  // molar concentration
  "mmol/L",
  "umol/L",
  "nmol/L",
  // amount of substance
  "mmol",
  // flow
  "L/h",
  "mg/h",
  "mL/min",
  // flow for a standard body surface: no flow until it is de-indexed (core/patient)
  "mL/min/{1.73_m2}",
  "L/h/kg",
  "L/kg",
  // rate
  "/h",
  // molar mass
  "g/mol",
  // exposure
  "mg.h/L",
  // pure number
  "1",
  "%",
] as const;

export type UnitCode = (typeof UNIT_CODES)[number];

/** A number with its unit: how every value stands in a saved case and crosses a folder's door. */
export interface Quantity<U extends UnitCode = UnitCode> {
  readonly value: number;
  readonly unit: U;
}

export const quantitySchema = z.strictObject({ value: z.number(), unit: z.enum(UNIT_CODES) });

/** A quantity whose unit must be one of those named. */
export function quantityIn<const U extends readonly UnitCode[]>(...units: U) {
  return z.strictObject({ value: z.number(), unit: z.enum(units) });
}
