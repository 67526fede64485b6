import {
  isDraftGroup,
  isRecordSame,
  type MedicineRecord,
  medicineRead,
  recordCopy,
  recordCopyName,
  recordDraftHistory,
  recordDraftRead,
  recordNextVersion,
} from "../../core/medicine/index.ts";
import { fail, type Issue, issue, type Result, succeed } from "../../core/result/index.ts";
import type { MedicineState, RecordEdit } from "./medicineState.ts";
import { recordEditOf } from "./recordEditOf.ts";
import { failureIssue } from "./storageSentences.ts";
import type { StoreContext } from "./storeContext.ts";

/** Under which the drafts of all records are stored. */
export const DRAFTS_KEY = "record-drafts";

export interface MedicineActions extends Omit<MedicineState, "recordEdits"> {
  /** Reads records and unsaved edits from the storage. */
  readMedicines(): Promise<void>;
}

/** The user's own medicine records: imported, copied, edited, removed. Records that come with the program are never changed. */
export function medicineActions(context: StoreContext): MedicineActions {
  const { repository, builtInRecords, newId, get, set, say } = context;
  const isBuiltIn = (id: string): boolean => builtInRecords.some((record) => record.id === id);
  const own = (): readonly MedicineRecord[] => get().medicines.filter(({ id }) => !isBuiltIn(id));
  const recordOf = (id: string, caller: string): MedicineRecord => {
    const record = get().medicines.find((each) => each.id === id);
    if (!record) throw new RangeError(`${caller}: there is no record "${id}"`);
    return record;
  };

  function putOwn(records: readonly MedicineRecord[]): void {
    const shown = records.filter(({ id }) => !isBuiltIn(id)).sort((a, b) => (a.name < b.name ? -1 : 1));
    set({ medicines: [...builtInRecords, ...shown], ownMedicines: shown.map(({ id }) => id) });
  }

  async function store(record: MedicineRecord): Promise<Result<MedicineRecord>> {
    const outcome = await repository.saveMedicine(record);
    if (!outcome.ok) return fail(failureIssue(outcome));
    putOwn([...own().filter(({ id }) => id !== record.id), record]);
    return succeed(record);
  }

  let isWriting = false;
  let isWritten = true;
  /** One write at a time, always of the latest: typing is faster than a disk. */
  async function writeEdits(): Promise<void> {
    isWritten = false;
    if (isWriting) return;
    isWriting = true;
    while (!isWritten) {
      isWritten = true;
      const drafts = Object.entries(get().recordEdits).map(([id, { recordVersion, history }]) => [
        id,
        { recordVersion, draft: history.draft },
      ]);
      const outcome = await repository.writeSetting(DRAFTS_KEY, Object.fromEntries(drafts));
      if (!outcome.ok) say("check", issue("record-draft-not-kept"), failureIssue(outcome));
    }
    isWriting = false;
  }

  function keepRecordEdit(id: string, edit: RecordEdit | null): void {
    const { [id]: _, ...others } = get().recordEdits;
    set({ recordEdits: edit ? { ...others, [id]: edit } : others });
    void writeEdits();
  }

  /** The way back after a removal or a replacement. */
  async function putBack(record: MedicineRecord, edit: RecordEdit | undefined): Promise<void> {
    const stored = await store(record);
    if (!stored.ok) return say("stop", issue("medicine-not-back", { name: record.name }), ...stored.issues);
    if (edit && !get().recordEdits[record.id]) keepRecordEdit(record.id, edit);
  }

  return {
    keepRecordEdit,

    startRecordEdit(id) {
      if (!get().recordEdits[id]) keepRecordEdit(id, recordEditOf(recordOf(id, "startRecordEdit")));
    },

    async readMedicines() {
      const records = await repository.listMedicines();
      putOwn(records);
      set({ recordEdits: editsRead(await repository.readSetting(DRAFTS_KEY)) });
      const hidden = records.filter(({ id }) => isBuiltIn(id)).map(({ id }): Issue => issue("medicine-hidden", { id }));
      if (hidden.length > 0) say("check", ...hidden);
    },

    async importMedicine(_name, text) {
      const read = medicineRead(text);
      if (!read.ok) return read;
      const { id, name } = read.value;
      if (isBuiltIn(id)) return fail(issue("medicine-built-in", { id }, ["id"]));
      const before = own().find((record) => record.id === id);
      const stored = await store(read.value);
      const isOther = before && !isRecordSame(before, read.value);
      if (stored.ok && isOther)
        context.offer("check", [issue("medicine-replaced", { name, recordVersion: before.recordVersion })], () =>
          putBack(before, undefined),
        );
      return stored;
    },

    exportMedicine(id) {
      const record = recordOf(id, "exportMedicine");
      // What a person looks for in a folder: the medicine. A copy's id is a row of random signs.
      const name =
        record.name
          .toLowerCase()
          .replaceAll(/[^a-z0-9]+/g, "-")
          .replaceAll(/^-|-$/g, "") || "record";
      return { name: `${name}.ebbline-medicine.json`, text: `${JSON.stringify(record, null, 2)}\n` };
    },

    async copyMedicine(id) {
      const record = recordOf(id, "copyMedicine");
      const taken = get().medicines.map(({ name }) => name);
      return store(recordCopy(record, { id: newId(), name: recordCopyName(record, taken) }));
    },

    async removeMedicine(id) {
      if (isBuiltIn(id)) throw new RangeError(`removeMedicine: "${id}" comes with the program`);
      const record = recordOf(id, "removeMedicine");
      const edit = get().recordEdits[id];
      const outcome = await repository.removeMedicine(id);
      if (!outcome.ok) return fail(failureIssue(outcome));
      putOwn(own().filter((each) => each.id !== id));
      if (edit) keepRecordEdit(id, null);
      context.offer("note", [issue("medicine-removed", { name: record.name })], () => putBack(record, edit));
      return succeed(null);
    },

    async saveRecordEdit(id) {
      const edit = get().recordEdits[id];
      if (isBuiltIn(id) || !edit) throw new RangeError(`saveRecordEdit: there is nothing to save for "${id}"`);
      const read = recordDraftRead(edit.history.draft);
      if (!read.ok) return read;
      const stored = await store(recordNextVersion(read.value, recordOf(id, "saveRecordEdit")));
      // What was typed while it was being stored is not part of it, and stays.
      if (stored.ok && get().recordEdits[id] === edit) keepRecordEdit(id, null);
      return stored;
    },
  };
}

/** Drafts as they were stored; one that is no draft at all is left out, as nothing could be shown of it. */
function editsRead(stored: unknown): Readonly<Record<string, RecordEdit>> {
  if (typeof stored !== "object" || stored === null) return {};
  const edits = Object.entries(stored as Record<string, unknown>).flatMap(([id, value]) => {
    const { recordVersion, draft } = (value ?? {}) as { recordVersion?: unknown; draft?: never };
    if (typeof recordVersion !== "number" || !isDraftGroup(draft)) return [];
    return [[id, { recordVersion, history: recordDraftHistory(draft) }] as const];
  });
  return Object.fromEntries(edits);
}
