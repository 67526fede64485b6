import type { MedicineRecord } from "../../../core/medicine/index.ts";
import { quantityConvert, type UnitCode } from "../../../core/units/index.ts";

/** The unit concentrations are shown in, and how many of it make 1 mg/L. */
export interface TrialUnit {
  readonly unit: UnitCode;
  readonly factor: number;
}

export function trialUnit({ displayUnit, molarMass }: Pick<MedicineRecord, "displayUnit" | "molarMass">): TrialUnit {
  return {
    unit: displayUnit,
    factor: quantityConvert({ value: 1, unit: "mg/L" }, displayUnit, molarMass.value),
  };
}
