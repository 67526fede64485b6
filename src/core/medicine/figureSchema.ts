import { z } from "zod";
import { UNIT_CODES } from "../units/index.ts";

/** How a figure is known. `invented` is allowed only in a record marked `invented`. */
export const BASES = ["seen", "memory", "common practice", "invented"] as const;
export type Basis = (typeof BASES)[number];

/** Every figure and every statement names an entry of the record's `sources` and the basis on which it is known. */
export const provenance = { source: z.string().min(1), basis: z.enum(BASES), note: z.string().optional() };

export const figureSchema = z.strictObject({ value: z.number(), unit: z.enum(UNIT_CODES), ...provenance });
export type Figure = z.infer<typeof figureSchema>;

/** A formula over the patient's covariates; names allowed in it are listed in core/medicine/covariates.ts. */
export const formulaSchema = z.strictObject({
  formula: z.string().min(1).max(400),
  unit: z.enum(["L/h", "L", "mg/h", "mg/L"]),
  ...provenance,
});
export type Formula = z.infer<typeof formulaSchema>;
