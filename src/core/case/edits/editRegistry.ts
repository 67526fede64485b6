import type { Case } from "../caseSchema.ts";
import { caseEdits } from "./caseEdits.ts";
import { doseEdits } from "./doseEdits.ts";
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
  ...medicineEdits,
  ...lineEdits,
  ...doseEdits,
  ...levelEdits,
  ...optionEdits,
};

export type EditName = keyof typeof edits;
export type EditArguments<N extends EditName> = Parameters<(typeof edits)[N]>[1];

export const EDIT_NAMES = Object.keys(edits) as readonly EditName[];

/** The one door to every edit: buttons, keys, drags, import and tests call it. Parts that don't change are shared with the case before. */
export function caseEdit<N extends EditName>(value: Case, name: N, args: EditArguments<N>): Case {
  const edit = edits[name] as (value: Case, args: EditArguments<N>) => Case;
  return edit(value, args);
}
