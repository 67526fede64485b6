import { type MedicineRecord, recordById } from "../../../src/core/medicine/index.ts";

/** A built-in record that has to be there. */
export function recordOf(id: string): MedicineRecord {
  const record = recordById(id);
  if (!record) throw new RangeError(`id: no built-in record "${id}"`);
  return record;
}
