import { z } from "zod";
import { quantityIn, UNIT_CODES } from "../units/index.ts";

/**
 * A medicine record: kinetics, products, windows and cautions of one medicine, each figure with its source and basis.
 * The schema refuses a figure without one.
 */

/** How a figure is known. `invented` is allowed only in a record marked `invented`. */
export const BASES = ["seen", "memory", "common practice", "invented"] as const;
export type Basis = (typeof BASES)[number];

/** Every figure and every statement names an entry of the record's `sources` and the basis on which it is known. */
const provenance = { source: z.string().min(1), basis: z.enum(BASES), note: z.string().optional() };

export const sourceSchema = z.strictObject({
  title: z.string().min(1),
  authors: z.string().optional(),
  year: z.string().optional(),
  place: z.string().optional(),
});

const figureSchema = z.strictObject({ value: z.number(), unit: z.enum(UNIT_CODES), ...provenance });
/** A formula over the patient's covariates; names allowed in it are listed in core/medicine/covariates.ts. */
const formulaSchema = z.strictObject({
  formula: z.string().min(1).max(400),
  unit: z.enum(["L/h", "L"]),
  ...provenance,
});
const statementSchema = z.strictObject({ text: z.string().min(1), ...provenance });
const cautionSchema = z.strictObject({ text: z.string().min(1), category: z.string().min(1), ...provenance });

/** One member a model kind; a new kind adds one member here. */
const oneCompartmentOralSchema = z.strictObject({
  kind: z.literal("one-compartment-oral"),
  clearance: formulaSchema,
  volume: formulaSchema,
  /** true: the figures are CL/F and V/F, so bioavailability is already inside them and products state 1. */
  apparent: z.boolean(),
});
export const kineticsSchema = z.discriminatedUnion("kind", [oneCompartmentOralSchema]);

export const productSchema = z.strictObject({
  id: z.string().min(1).max(64),
  /** As printed after the medicine's name and strength: "12-hour modified-release tablet". */
  name: z.string().min(1),
  form: z.enum(["tablet", "capsule", "liquid"]),
  release: z.enum(["immediate", "modified"]),
  /** Content of one tablet or capsule, mg; empty for a liquid. */
  strengths: z.array(figureSchema),
  /** Of a liquid. */
  concentration: figureSchema.optional(),
  divisible: z.enum(["whole", "half", "unknown"]),
  swallowWhole: z.boolean(),
  absorptionRate: figureSchema, // ka, /h
  lag: figureSchema, // h
  bioavailability: figureSchema, // 1
});

export const recordWindowSchema = z.strictObject({
  id: z.string().min(1).max(64),
  label: z.string().min(1),
  quantity: z.enum(["trough", "peak", "average", "auc24", "lowest-and-highest"]),
  low: quantityIn("mg/L", "mg.h/L"),
  high: quantityIn("mg/L", "mg.h/L"),
  ...provenance,
});

/** The shape alone; medicineRecordSchema adds the checks across fields. */
export const recordShapeSchema = z.strictObject({
  format: z.literal("ebbline-medicine"),
  version: z.literal(1),
  id: z.string().min(1).max(64),
  /** Counts up with every change of the record's content; printed on the summary. */
  recordVersion: z.int().min(1),
  name: z.string().min(1).max(80),
  invented: z.boolean(),
  review: z.strictObject({
    status: z.enum(["not-reviewed", "reviewed"]),
    by: z.string().optional(),
    on: z.string().optional(),
  }),
  matrix: z.string().min(1),
  molarMass: figureSchema,
  sources: z.record(z.string(), sourceSchema),
  kinetics: kineticsSchema,
  /** Between-patient and residual variability, as published; shown, and used once levels adjust the prediction. */
  variability: z.strictObject({
    clearance: figureSchema.optional(),
    volume: figureSchema.optional(),
    absorptionRate: figureSchema.optional(),
    residualProportional: figureSchema.optional(),
    residualAdditive: figureSchema.optional(),
  }),
  population: z.strictObject({
    text: z.string().min(1),
    ageMin: z.number().optional(),
    ageMax: z.number().optional(),
    ...provenance,
  }),
  products: z.array(productSchema).min(1),
  windows: z.array(recordWindowSchema),
  toxicFrom: figureSchema.optional(),
  doseLimits: z.array(statementSchema),
  sampling: z.array(statementSchema),
  cautions: z.array(cautionSchema),
});

export type MedicineRecord = z.infer<typeof recordShapeSchema>;
export type Product = z.infer<typeof productSchema>;
export type Figure = z.infer<typeof figureSchema>;
export type Source = z.infer<typeof sourceSchema>;
export type Formula = z.infer<typeof formulaSchema>;
export type RecordWindow = z.infer<typeof recordWindowSchema>;
