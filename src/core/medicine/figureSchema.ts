import { z } from "zod";
import { UNIT_CODES } from "../units/index.ts";

/**
 * How a figure is known, from best to least. `derived`: computed from figures that were read, the note says from what and how.
 * `invented` is allowed only in a record marked `invented`.
 */
export const BASES = ["seen", "derived", "common practice", "memory", "invented"] as const;
export type Basis = (typeof BASES)[number];

/** Every figure and every statement names an entry of the record's `sources` and the basis on which it is known. */
export const provenance = { source: z.string().min(1), basis: z.enum(BASES), note: z.string().optional() };

export const figureSchema = z.strictObject({ value: z.number(), unit: z.enum(UNIT_CODES), ...provenance });
/** A whole sentence in our own words, fit to be printed. */
export const statementSchema = z.strictObject({ text: z.string().min(1), ...provenance });
export type Statement = z.infer<typeof statementSchema>;

export type Figure = z.infer<typeof figureSchema>;

/** A formula over the patient's covariates with units in it, and the unit its value is wanted in. docs/medicine-record.md describes the language. */
export const formulaSchema = z.strictObject({
  formula: z.string().min(1).max(2_000),
  unit: z.enum(["L/h", "L", "mg/h", "mg/L"]),
  ...provenance,
});
export type Formula = z.infer<typeof formulaSchema>;
