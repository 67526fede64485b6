import type { DisplayUnit, MedicineRecord } from "./medicineRecord.ts";

/** The unit in which this medicine's concentrations are shown and printed; the core always counts in mg/L. */
export function concentrationUnit(record: Pick<MedicineRecord, "displayUnit">): DisplayUnit {
  return record.displayUnit;
}
