import type { MedicineRecord, RecordDraftHistory } from "../../core/medicine/index.ts";
import type { Result } from "../../core/result/index.ts";

/** A record of the user's own being edited: kept until it is saved or given up, whatever is left or closed meanwhile. */
export interface RecordEdit {
  /** Version of the record the editing began from. */
  readonly recordVersion: number;
  readonly history: RecordDraftHistory;
}

/** What can be done with medicine records. The records themselves stand in WorkbenchState. */
export interface MedicineState {
  /** Unsaved edits, by the id of the record. */
  readonly recordEdits: Readonly<Record<string, RecordEdit>>;

  /** A user's own record from the text of a JSON file; stored only if the whole file is good. A built-in id is refused. */
  importMedicine(name: string, text: string): Promise<Result<MedicineRecord>>;
  /** Any record as a file. */
  exportMedicine(id: string): { readonly name: string; readonly text: string };
  /** A user's own copy of any record, stored at once. */
  copyMedicine(id: string): Promise<Result<MedicineRecord>>;
  /** Removes one of the user's own and says so, with the way back. */
  removeMedicine(id: string): Promise<Result<null>>;
  /** Begins to edit one of the user's own; where edits are kept already, nothing changes. */
  startRecordEdit(id: string): void;
  /** Keeps unsaved edits; null gives them up. */
  keepRecordEdit(id: string, edit: RecordEdit | null): void;
  /** Stores the edited record, one version further; refused while anything in it is wrong. */
  saveRecordEdit(id: string): Promise<Result<MedicineRecord>>;
}
