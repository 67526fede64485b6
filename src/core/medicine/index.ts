/** The medicine record: its schema, its formulas over the patient, the built-in records, and amounts of its products in mg. */

export { concentrationUnit } from "./concentrationUnit.ts";
export { type FormulaInput, formulaEvaluate } from "./covariateFormula.ts";
export { COVARIATES, type CovariateName, type Covariates } from "./covariates.ts";
export { covariatesOf } from "./covariatesOf.ts";
export { doseLabelledMg, doseMg, productDoseUnits } from "./doseMg.ts";
export { BASES, type Basis, type Figure, type Formula } from "./figureSchema.ts";
export { FORMULA_FUNCTIONS, formulaFaults } from "./formulaRead.ts";
export {
  type Kinetics,
  type KineticsFormula,
  type KineticsFormulaName,
  kineticsFormulas,
  kineticsSchema,
} from "./kineticsKinds.ts";
export * from "./edits/recordEdits.ts";
export { medicineParse, recordIssues } from "./medicineParse.ts";
export { medicineRead } from "./medicineRead.ts";
export {
  type MedicineRecord,
  type Product,
  productSchema,
  type RecordWindow,
  recordWindowSchema,
  type Source,
  sourceSchema,
} from "./medicineRecord.ts";
export { medicineRecordSchema } from "./medicineRecordSchema.ts";
export { productAbsorption } from "./productAbsorption.ts";
export { productOf } from "./productOf.ts";
export { windowChecks } from "./recordChecks.ts";
export { type RecordFigure, recordFigures, unverifiedFigures } from "./recordFigures.ts";
export { BUILT_IN_RECORDS, recordById } from "./records/index.ts";
export { pathText, schemaIssues } from "./schemaIssues.ts";
