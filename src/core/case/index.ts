/** The saved case: its shape, reading and printing it, and every change that can be made to it. */
export {
  CASE_FORMAT,
  CASE_VERSION,
  type Case,
  caseSchema,
  factorSchema,
  LEVEL_UNITS,
  type Level,
  levelSchema,
  type Observation,
  observationSchema,
  type Option,
  optionSchema,
  type Patient,
  patientSchema,
  type TargetWindow,
  windowSchema,
} from "./caseSchema.ts";
export { caseEdit, type EditArguments, EDIT_NAMES, type EditName } from "./edits/editRegistry.ts";
export type { Lane } from "./edits/lane.ts";
export { optionNextId } from "./edits/optionEdits.ts";
