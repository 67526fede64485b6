/** The medicine record: its schema, its formulas over the patient, the built-in records, and amounts of its products in mg. */

export { concentrationFactor } from "./concentrationFactor.ts";
export { type ConcentrationSense, type ConcentrationUnit, concentrationSense } from "./concentrationSense.ts";
export { concentrationUnit } from "./concentrationUnit.ts";
export { concentrationUnits } from "./concentrationUnits.ts";
export { type FormulaInput, type FormulaTrace, formulaEvaluate, formulaTrace } from "./covariateFormula.ts";
export { COVARIATE_NAMES, COVARIATES, type CovariateName, type Covariates } from "./covariates.ts";
export { covariatesOf } from "./covariatesOf.ts";
export { doseLabelledMg, doseMg, productDoseUnits } from "./doseMg.ts";
export { DOSE_FAR, type DoseSense, doseSense } from "./doseSense.ts";
export { doseStepped } from "./doseStepped.ts";
export * from "./edits/recordEdits.ts";
export { BASES, type Basis, type Figure, type Formula, type Statement } from "./figureSchema.ts";
export { FORMULA_FUNCTIONS } from "./formulaOperations.ts";
export { formulaCovariates, formulaDimension, formulaFaults } from "./formulaRead.ts";
export { UNIT_WORDS } from "./formulaUnits.ts";
export {
  type Kinetics,
  type KineticsFormula,
  type KineticsFormulaName,
  kineticsFormulas,
  kineticsSchema,
} from "./kineticsKinds.ts";
export { medicineParse, recordIssues } from "./medicineParse.ts";
export { medicineRead } from "./medicineRead.ts";
export {
  DISPLAY_UNITS,
  type DisplayUnit,
  type Interaction,
  type MedicineRecord,
  type PopulationRange,
  type Product,
  productSchema,
  RECORD_FORMAT,
  RECORD_VERSION,
  type RecordWindow,
  recordWindowSchema,
  type Source,
  sourceSchema,
  TOXIC_AT,
  VARIED,
  type VariedName,
  WINDOW_UNITS,
} from "./medicineRecord.ts";
export { medicineRecordSchema } from "./medicineRecordSchema.ts";
export { record0001 } from "./migrations/0001.ts";
export { productAbsorption } from "./productAbsorption.ts";
export { productOf } from "./productOf.ts";
export { type RecordFigure, recordFigures, unverifiedFigures } from "./recordFigures.ts";
export { RECORD_MIGRATIONS, recordMigrate } from "./recordMigrate.ts";
export { BUILT_IN_RECORDS, recordById } from "./records/index.ts";
export { pathText, schemaIssues } from "./schemaIssues.ts";
export { LATEST_DRAW_H, windowChecks, windowDrawChecks } from "./windowChecks.ts";
