import { type Case, casePrint } from "../../core/case/index.ts";

export interface CaseFile {
  readonly name: string;
  readonly text: string;
}

/** The name carries the day of the now line and the start of the id, nothing of the patient: file names are seen by others. */
export function caseFile(value: Case): CaseFile {
  const id = value.id.replaceAll(/[^A-Za-z0-9]/g, "").slice(0, 8) || "case";
  return { name: `ebbline-${value.now.slice(0, 10)}-${id}.ebbline.json`, text: casePrint(value) };
}
