import type { MedicineRecord } from "../medicineRecord.ts";
import { isRecordSame } from "./isRecordSame.ts";

/** The longest name a record may have. */
const NAME_MOST = 80;

/**
 * A user's own record made from another: the same figures under a new id and name, counted from 1, reviewed by nobody, and naming what
 * it was made from.
 */
export function recordCopy(
  record: MedicineRecord,
  { id, name }: { readonly id: string; readonly name: string },
): MedicineRecord {
  return {
    ...record,
    id,
    name,
    recordVersion: 1,
    review: { status: "not-reviewed" },
    copyOf: { id: record.id, recordVersion: record.recordVersion },
  };
}

/** "theophylline, copy", or the first number after it that no record has yet. */
export function recordCopyName(record: MedicineRecord, taken: readonly string[]): string {
  for (let count = 1; ; count += 1) {
    const ending = count === 1 ? ", copy" : `, copy ${count}`;
    const name = `${record.name.slice(0, NAME_MOST - ending.length)}${ending}`;
    if (!taken.includes(name)) return name;
  }
}

/**
 * An edited record as it is stored: one version further. A review speaks for what was reviewed, so one that was not entered anew is
 * gone with the first change.
 */
export function recordNextVersion(edited: MedicineRecord, before: MedicineRecord): MedicineRecord {
  const isReviewNew = !isRecordSame(edited.review, before.review);
  return {
    ...edited,
    recordVersion: before.recordVersion + 1,
    review: isReviewNew ? edited.review : { status: "not-reviewed" },
  };
}
