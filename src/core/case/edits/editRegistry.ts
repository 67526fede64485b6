import { type Result, succeed } from "../../result/index.ts";
import { caseValidate } from "../caseParse.ts";
import type { Case } from "../caseSchema.ts";
import { caseEdits } from "./caseEdits.ts";
import { doseEdits } from "./doseEdits.ts";
import { factorEdits } from "./factorEdits.ts";
import { levelEdits } from "./levelEdits.ts";
import { lineEdits } from "./lineEdits.ts";
import { medicineEdits } from "./medicineEdits.ts";
import { observationEdits } from "./observationEdits.ts";
import { optionEdits } from "./optionEdits.ts";
import { patientEdits } from "./patientEdits.ts";

/** Every change that can be made to a case. A new family is one line here. */
const edits = {
  ...caseEdits,
  ...patientEdits,
  ...observationEdits,
  ...factorEdits,
  ...medicineEdits,
  ...lineEdits,
  ...doseEdits,
  ...levelEdits,
  ...optionEdits,
};

export type EditName = keyof typeof edits;
export type EditArguments<N extends EditName> = Parameters<(typeof edits)[N]>[1];

export const EDIT_NAMES = Object.keys(edits) as readonly EditName[];

/**
 * The one door to every edit: buttons, keys, drags, import and tests call it. Parts that don't change are shared with the case before.
 * Arguments that name something that isn't there, or that would make a case that could not be opened again, are the caller's mistake:
 * RangeError. Where a user can cause that, caseEditTry tells why.
 */
export function caseEdit<N extends EditName>(value: Case, name: N, args: EditArguments<N>): Case {
  const tried = caseEditTry(value, name, args);
  if (tried.ok) return tried.value;
  const faults = tried.issues.map(({ code, path }) => `${code} at ${path.join(".") || "the top"}`);
  throw new RangeError(`${name}: the case could not be opened again: ${faults.join("; ")}`);
}

/** The edited case, or what would be wrong with it. An id that isn't there throws all the same. */
export function caseEditTry<N extends EditName>(value: Case, name: N, args: EditArguments<N>): Result<Case> {
  const edit = edits[name] as (value: Case, args: EditArguments<N>) => Case;
  const edited = edit(value, args);
  const validated = caseValidate(edited);
  return validated.ok ? succeed(edited) : validated;
}
