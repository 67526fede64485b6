import { z } from "zod";
import { quantityIn } from "../units/index.ts";
import { figureSchema, provenance } from "./figureSchema.ts";
import { kineticsSchema } from "./kineticsKinds.ts";

/**
 * A medicine record: kinetics, products, windows and cautions of one medicine, each figure with its source and basis.
 * The schema refuses a figure without one.
 */

export const sourceSchema = z.strictObject({
  title: z.string().min(1),
  authors: z.string().optional(),
  year: z.string().optional(),
  place: z.string().optional(),
});

const statementSchema = z.strictObject({ text: z.string().min(1), ...provenance });
const cautionSchema = z.strictObject({ text: z.string().min(1), category: z.string().min(1), ...provenance });

/** One member a model kind; a new kind adds one member here. */
/** How a product is taken up where a single first-order rate does not say it. */
const productInputSchema = z.discriminatedUnion("kind", [
  z.strictObject({ kind: z.literal("zero-order"), duration: figureSchema }),
  /** A fast part (by `absorptionRate`) and a slow one, by a rate or over a duration: exactly one of the two. */
  z.strictObject({
    kind: z.literal("mixed"),
    fastFraction: figureSchema,
    slowRate: figureSchema.optional(),
    slowDuration: figureSchema.optional(),
    slowLag: figureSchema,
  }),
]);

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
  /** ka, /h; of the fast part where the input is mixed. Absent only where the input is zero-order. */
  absorptionRate: figureSchema.optional(),
  input: productInputSchema.optional(),
  /** mg of the active moiety in 1 mg as the product is labelled; 1 when absent. */
  saltFactor: figureSchema.optional(),
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
    maximumRate: figureSchema.optional(),
    halfMaximum: figureSchema.optional(),
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
  /** Hours after a dose before which a level is not to be drawn, where a source says so. */
  earliestSample: figureSchema.optional(),
  doseLimits: z.array(statementSchema),
  sampling: z.array(statementSchema),
  cautions: z.array(cautionSchema),
});

export type MedicineRecord = z.infer<typeof recordShapeSchema>;
export type Product = z.infer<typeof productSchema>;
export type Source = z.infer<typeof sourceSchema>;
export type RecordWindow = z.infer<typeof recordWindowSchema>;
