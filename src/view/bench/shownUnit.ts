import type { Case } from "../../core/case/index.ts";
import { concentrationUnit } from "../../core/medicine/index.ts";
import { quantityConvert, unitSpoken } from "../../core/units/index.ts";

/** The unit concentrations are shown in on the bench; inside the core they are always mg/L. */
export type ShownUnit = "mg/L" | "ug/L" | "umol/L" | "nmol/L";

/** By mass and by mole: milligrams and micromoles, or a thousandth of each where the medicine's windows lie that low. */
export function shownUnits(value: Case): { readonly mass: ShownUnit; readonly molar: ShownUnit } {
  return concentrationUnit(value.medicine) === "ug/L"
    ? { mass: "ug/L", molar: "nmol/L" }
    : { mass: "mg/L", molar: "umol/L" };
}

/** The factor from mg/L to the unit shown, by the record's molar mass. */
export function unitFactor(value: Case, unit: ShownUnit): number {
  return quantityConvert({ value: 1, unit: "mg/L" }, unit, value.medicine.molarMass.value);
}

/** The unit of an area under the curve beside a unit of concentration: "mg·h/L". */
export function exposureSpoken(unit: ShownUnit): string {
  return unitSpoken(unit, "screen").replace("/", "·h/");
}
