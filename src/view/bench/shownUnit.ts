import type { Case } from "../../core/case/index.ts";
import { concentrationUnit, type DisplayUnit } from "../../core/medicine/index.ts";
import { quantityConvert, unitSpoken } from "../../core/units/index.ts";

/** The unit concentrations are shown in on the bench; inside the core they are always mg/L. */
export type ShownUnit = DisplayUnit;

/** The same size of number by mass and by mole: milligrams beside micromoles, micrograms beside nanomoles. */
const OTHER: Readonly<Record<DisplayUnit, DisplayUnit>> = {
  "mg/L": "umol/L",
  "ug/L": "nmol/L",
  "umol/L": "mg/L",
  "nmol/L": "ug/L",
  // Lithium: 1 mmol is 6.94 mg.
  "mmol/L": "mg/L",
};

/** The unit the record is read in, and the one by mole or by mass it can be changed to. */
export function shownUnits(value: Case): { readonly first: ShownUnit; readonly other: ShownUnit } {
  const first = concentrationUnit(value.medicine);
  return { first, other: OTHER[first] };
}

/** The factor from mg/L to the unit shown, by the record's molar mass. */
export function unitFactor(value: Case, unit: ShownUnit): number {
  return quantityConvert({ value: 1, unit: "mg/L" }, unit, value.medicine.molarMass.value);
}

/** The unit of an area under the curve beside a unit of concentration: "mg·h/L". */
export function exposureSpoken(unit: ShownUnit): string {
  return unitSpoken(unit, "screen").replace("/", "·h/");
}
