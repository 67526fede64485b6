/** The medicine record: its schema, its formulas over the patient, the built-in records, and amounts of its products in mg. */
export {
  BASES,
  type Basis,
  type Figure,
  kineticsSchema,
  type MedicineRecord,
  medicineRecordSchema,
  type Product,
  productSchema,
  recordWindowSchema,
  type Source,
  sourceSchema,
} from "./medicineRecord.ts";
