import type { Case } from "../caseSchema.ts";

/** Edits of the case as a whole. */
export const caseEdits = {
  caseRename: (value: Case, { label }: { label: string }): Case => ({ ...value, label }),
  notesSet: (value: Case, { notes }: { notes: string }): Case => ({ ...value, notes }),
  nowSet: (value: Case, { at }: { at: string }): Case => ({ ...value, now: at }),
  /** Instants stay the instants they are; clock times of repeats are read in the new zone. */
  timeZoneSet: (value: Case, { timeZone }: { timeZone: string }): Case => ({ ...value, timeZone }),
  fitSet: (value: Case, { fit }: { fit: Case["fit"] }): Case => ({ ...value, fit }),
};
