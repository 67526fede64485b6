/** The saved case: its shape, reading and printing it, and every change that can be made to it. */
export { type CaseDiff, caseDiff, diffApply, diffInvert } from "./caseDiff.ts";
export { caseFingerprint } from "./caseFingerprint.ts";
export { type CaseHead, caseHeadRead } from "./caseHeadRead.ts";
export { caseNew } from "./caseNew.ts";
export { caseParse, caseValidate } from "./caseParse.ts";
export { casePrint } from "./casePrint.ts";
export {
  CASE_FORMAT,
  CASE_VERSION,
  type Case,
  caseSchema,
  type Factor,
  factorSchema,
  LEVEL_UNITS,
  type Level,
  levelSchema,
  type Observation,
  type Option,
  observationSchema,
  optionSchema,
  type Patient,
  patientSchema,
  type TargetWindow,
  windowSchema,
} from "./caseSchema.ts";
export { caseEdit, caseEditTry, EDIT_NAMES, type EditArguments, type EditName } from "./edits/editRegistry.ts";
export type { Lane } from "./edits/lane.ts";
export { optionNextId } from "./edits/optionEdits.ts";
export { levelValueNear, levelValueStep } from "./levelSteps.ts";
