import { z } from "zod";
import { quantityIn, UNIT_CODES } from "../units/index.ts";
import { COVARIATE_NAMES } from "./covariates.ts";
import { figureSchema, provenance, statementSchema } from "./figureSchema.ts";
import { kineticsSchema } from "./kineticsKinds.ts";

/**
 * A medicine record: kinetics, products, windows and cautions of one medicine, each figure with its source and basis.
 * The schema refuses a figure without one. Version 2: docs/medicine-record.md.
 */
export const RECORD_FORMAT = "ebbline-medicine";
export const RECORD_VERSION = 2;

/** Units in which the concentrations of a medicine may be shown first. */
export const DISPLAY_UNITS = ["mg/L", "ug/L", "umol/L", "nmol/L", "mmol/L"] as const;
export type DisplayUnit = (typeof DISPLAY_UNITS)[number];
export const TOXIC_AT = ["any", "trough"] as const;
/** Units a target window may be in: a concentration by mass or by amount, or an exposure. */
export const WINDOW_UNITS = [...DISPLAY_UNITS, "mg.h/L"] as const;

export const sourceSchema = z.strictObject({
  title: z.string().min(1),
  authors: z.string().optional(),
  year: z.string().optional(),
  place: z.string().optional(),
});

const cautionSchema = z.strictObject({ text: z.string().min(1), category: z.string().min(1), ...provenance });

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
  /** What the label's mass is of: "sodium", "carbonate"; absent where it is the active moiety itself. */
  salt: z.string().min(1).max(64).optional(),
  lag: figureSchema, // h
  bioavailability: figureSchema, // 1
});

export const recordWindowSchema = z.strictObject({
  id: z.string().min(1).max(64),
  label: z.string().min(1),
  /** "epilepsy", "heart failure in sinus rhythm" */
  use: z.string().min(1),
  /** "just before a dose", "8 to 12 h after a dose" */
  sampling: z.string().min(1),
  quantity: z.enum(["trough", "peak", "average", "auc24", "lowest-and-highest"]),
  low: quantityIn(...WINDOW_UNITS),
  high: quantityIn(...WINDOW_UNITS),
  /** Hours after the dose between which the level is drawn; a trough needs none. */
  drawFrom: figureSchema.optional(),
  drawTo: figureSchema.optional(),
  ...provenance,
});

/** Between-patient variability as coefficients of variation, %; the parameters they may stand for. */
export const VARIED = [
  "clearance",
  "maximumRate",
  "halfMaximum",
  "volume",
  "exchange",
  "peripheralVolume",
  "absorptionRate",
  "bioavailability",
] as const;
export type VariedName = (typeof VARIED)[number];

const variabilitySchema = z.strictObject({
  clearance: figureSchema.optional(),
  maximumRate: figureSchema.optional(),
  halfMaximum: figureSchema.optional(),
  volume: figureSchema.optional(),
  exchange: figureSchema.optional(),
  peripheralVolume: figureSchema.optional(),
  absorptionRate: figureSchema.optional(),
  bioavailability: figureSchema.optional(),
  residualProportional: figureSchema.optional(),
  residualAdditive: figureSchema.optional(), // mg/L
  /** Of the logs of two parameters. */
  correlations: z
    .array(z.strictObject({ between: z.tuple([z.enum(VARIED), z.enum(VARIED)]), ...figureSchema.shape }))
    .optional(),
});

/** Where a covariate of the patients lay; at least one end, in the covariate's own unit. */
const populationRangeSchema = z.strictObject({
  covariate: z.enum(COVARIATE_NAMES),
  low: z.number().optional(),
  high: z.number().optional(),
  unit: z.enum(UNIT_CODES),
  ...provenance,
});

const interactionSchema = z.strictObject({
  id: z.string().min(1).max(64),
  /** The other medicine: "phenytoin", "valproate". */
  medicine: z.string().min(1).max(80),
  /** On the clearance of a saturable record it acts on Vmax. */
  parameter: z.enum(["clearance", "volume"]),
  /** Its source and basis are those of the interaction. */
  factor: figureSchema, // 1
  onset: figureSchema.optional(), // d
  text: z.string().min(1),
});

/** The shape alone; medicineRecordSchema adds the checks across fields. */
export const recordShapeSchema = z.strictObject({
  format: z.literal(RECORD_FORMAT),
  version: z.literal(RECORD_VERSION),
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
  /** A user's copy names the record it was made from. */
  copyOf: z.strictObject({ id: z.string().min(1).max(64), recordVersion: z.int().min(1) }).optional(),
  matrix: z.string().min(1),
  /** Of what the laboratory reports. */
  molarMass: figureSchema,
  /** The unit concentrations are shown in first. */
  displayUnit: z.enum(DISPLAY_UNITS),
  sources: z.record(z.string(), sourceSchema),
  /** Whether the kinetics and their variability were estimated together, or taken from several studies. */
  estimates: z.strictObject({ from: z.enum(["one-model", "pieced-together"]), ...statementSchema.shape }),
  kinetics: kineticsSchema,
  /** Between-patient and residual variability, as published; shown, and used once levels adjust the prediction. */
  variability: variabilitySchema,
  population: z.strictObject({
    ...statementSchema.shape,
    setting: z.string().min(1).optional(),
    /** How many patients. */
    number: figureSchema.optional(),
    ranges: z.array(populationRangeSchema),
  }),
  products: z.array(productSchema).min(1),
  windows: z.array(recordWindowSchema),
  toxicFrom: figureSchema.optional(),
  /** Which levels the toxic limit is for: any (absent), or only those just before a dose. */
  toxicAt: z.enum(TOXIC_AT).optional(),
  /** mg as labelled. */
  limits: z.strictObject({ maximumSingleDose: figureSchema.optional(), maximumDailyDose: figureSchema.optional() }),
  /** Hours after a dose before which a level is not to be drawn, where a source says so. */
  earliestSample: figureSchema.optional(),
  /** h or d after the start of a regimen or a change of it. */
  steadyStateAfter: figureSchema.optional(),
  doseLimits: z.array(statementSchema),
  sampling: z.array(statementSchema),
  interactions: z.array(interactionSchema),
  /** The medicine speeds up its own elimination; settled after so many days. */
  autoinduction: z.strictObject({ ...statementSchema.shape, settledAfter: figureSchema.optional() }).optional(),
  cautions: z.array(cautionSchema),
});

export type MedicineRecord = z.infer<typeof recordShapeSchema>;
export type Product = z.infer<typeof productSchema>;
export type Source = z.infer<typeof sourceSchema>;
export type RecordWindow = z.infer<typeof recordWindowSchema>;
export type PopulationRange = z.infer<typeof populationRangeSchema>;
export type Interaction = z.infer<typeof interactionSchema>;
