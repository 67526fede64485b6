import type { MedicineRecord } from "../medicine/index.ts";
import { CASE_FORMAT, CASE_VERSION, type Case } from "./caseSchema.ts";

/** A case with nothing entered yet. The target window is left open: which one applies is the user's to say. */
export function caseNew(fields: {
  readonly id: string;
  readonly label: string;
  readonly timeZone: string;
  readonly now: string;
  readonly medicine: MedicineRecord;
}): Case {
  const { id, label, timeZone, now, medicine } = fields;
  return {
    format: CASE_FORMAT,
    version: CASE_VERSION,
    id,
    label,
    timeZone,
    now,
    patient: { observations: [], factors: [] },
    medicine,
    given: [],
    levels: [],
    options: [],
    // Without a level both are the same; the first level is to count.
    fit: { use: "individual", residualModel: "normal" },
    notes: "",
  };
}
