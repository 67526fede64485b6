import { z } from "zod";
import { medicineRecordSchema, WINDOW_UNITS } from "../medicine/index.ts";
import { doseLineSchema } from "../regimen/index.ts";
import { instantSchema, timeZoneSchema } from "../time/index.ts";
import { quantityIn } from "../units/index.ts";

/** The saved case, version 2: docs/case-file.md. Unknown fields are refused with their path. */
export const CASE_FORMAT = "ebbline-case";
export const CASE_VERSION = 2;

const id = z.string().min(1).max(64);

/** `confirmed`: an improbable value was asked about and the user said it is meant. */
export const observationSchema = z.discriminatedUnion("kind", [
  z.strictObject({
    id,
    at: instantSchema,
    kind: z.literal("weight"),
    quantity: quantityIn("kg", "[lb_av]"),
    confirmed: z.literal(true).optional(),
  }),
  z.strictObject({
    id,
    at: instantSchema,
    kind: z.literal("serumCreatinine"),
    quantity: quantityIn("mg/dL", "umol/L"),
    confirmed: z.literal(true).optional(),
  }),
  z.strictObject({
    id,
    at: instantSchema,
    kind: z.literal("albumin"),
    quantity: quantityIn("g/L", "g/dL"),
    confirmed: z.literal(true).optional(),
  }),
]);

export const factorSchema = z.strictObject({
  kind: z.enum(["smoking", "interacting-medicine", "meal", "vomiting", "other"]),
  from: instantSchema,
  to: instantSchema.optional(),
  detail: z.string().max(200),
  /**
   * What it does to this patient's kinetics while it lasts, as a factor on clearance (saturable: on Vmax) and on volume.
   * With an onset the clearance gets there in daily steps.
   */
  effect: z
    .strictObject({
      clearance: z.number().min(0.05).max(20),
      volume: z.number().min(0.2).max(5).optional(),
      onset: quantityIn("d").optional(),
      /** Where the factors came from, such as an interaction of the record; left out: the user's own figures. */
      source: z.string().min(1).max(300).optional(),
    })
    .optional(),
});

export const patientSchema = z.strictObject({
  sex: z.enum(["female", "male"]).optional(),
  age: quantityIn("a").optional(),
  height: quantityIn("cm", "m", "[in_i]").optional(),
  observations: z.array(observationSchema).max(500),
  factors: z.array(factorSchema).max(500),
});

/** What a window is about, by mass or by amount of substance. "lowest-and-highest": the whole curve is to stay inside. */
export const windowSchema = z.strictObject({
  quantity: z.enum(["trough", "peak", "average", "auc24", "lowest-and-highest"]),
  low: quantityIn(...WINDOW_UNITS),
  high: quantityIn(...WINDOW_UNITS),
  /** Hours after a dose between which the level the window is about is drawn (lithium: 12 hours); absent: just before the next. */
  drawFrom: quantityIn("h").optional(),
  drawTo: quantityIn("h").optional(),
  basis: z.string().max(400),
  confirmed: z.literal(true).optional(),
});

/** The level's own unit is kept as typed; conversion to mg/L uses the record's molar mass. */
export const LEVEL_UNITS = ["mg/L", "ug/mL", "ug/L", "ng/mL", "umol/L", "nmol/L", "mmol/L"] as const;
export const levelSchema = z.strictObject({
  id,
  at: instantSchema,
  quantity: quantityIn(...LEVEL_UNITS),
  kind: z.enum(["measured", "below-limit"]),
  confirmed: z.literal(true).optional(),
  excluded: z.string().min(1).max(200).optional(),
});

export const optionSchema = z.strictObject({
  id,
  label: z.string().max(80),
  lines: z.array(doseLineSchema).max(50),
  chosen: z.boolean(),
});

export const caseSchema = z.strictObject({
  format: z.literal(CASE_FORMAT),
  version: z.literal(CASE_VERSION),
  id,
  label: z.string().max(120),
  /** An invented demonstration: watermarked on screen and print. */
  demo: z.literal(true).optional(),
  timeZone: timeZoneSchema,
  now: instantSchema,
  patient: patientSchema,
  medicine: medicineRecordSchema,
  window: windowSchema.optional(),
  given: z.array(doseLineSchema).max(200),
  levels: z.array(levelSchema).max(200),
  options: z.array(optionSchema).max(12),
  fit: z.strictObject({ use: z.enum(["typical", "individual"]), residualModel: z.enum(["normal", "robust"]) }),
  notes: z.string().max(10_000),
});

export type Case = z.infer<typeof caseSchema>;
export type Patient = z.infer<typeof patientSchema>;
export type Observation = z.infer<typeof observationSchema>;
export type Level = z.infer<typeof levelSchema>;
export type Factor = z.infer<typeof factorSchema>;
export type Option = z.infer<typeof optionSchema>;
export type TargetWindow = z.infer<typeof windowSchema>;
