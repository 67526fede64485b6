import { quantityConvert } from "../units/index.ts";
import type { MedicineRecord } from "./medicineRecord.ts";

/** How many of the unit this medicine's concentrations are shown in make 1 mg/L. Example: 1000 for ug/L. */
export function concentrationFactor({
  displayUnit,
  molarMass,
}: Pick<MedicineRecord, "displayUnit" | "molarMass">): number {
  return quantityConvert({ value: 1, unit: "mg/L" }, displayUnit, molarMass.value);
}
