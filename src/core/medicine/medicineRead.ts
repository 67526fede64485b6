import { jsonRead, type Result } from "../result/index.ts";
import { medicineParse } from "./medicineParse.ts";
import type { MedicineRecord } from "./medicineRecord.ts";

/** Reads the text of a record's file: the record, or every fault with its path. Nothing is guessed, mended or dropped. */
export function medicineRead(text: string): Result<MedicineRecord> {
  const read = jsonRead(text);
  return read.ok ? medicineParse(read.value) : read;
}
