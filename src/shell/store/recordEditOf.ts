import { type MedicineRecord, recordDraft, recordDraftHistory } from "../../core/medicine/index.ts";
import type { RecordEdit } from "./medicineState.ts";

/** The editing of a record from its beginning. */
export function recordEditOf(record: MedicineRecord): RecordEdit {
  return { recordVersion: record.recordVersion, history: recordDraftHistory(recordDraft(record)) };
}
