import type { Case } from "../../core/case/index.ts";

/** The unit concentrations are shown in on the bench; inside the core they are always mg/L. */
export type ShownUnit = "mg/L" | "umol/L";

/** The factor from mg/L to the unit shown, by the record's molar mass. */
export function unitFactor(value: Case, unit: ShownUnit): number {
  return unit === "mg/L" ? 1 : 1000 / value.medicine.molarMass.value;
}
