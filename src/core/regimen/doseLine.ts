import { z } from "zod";
import { instantSchema } from "../time/index.ts";
import { quantityIn } from "../units/index.ts";

/** Units a dose may be written in. Which of them fits is the product's to say (see core/medicine). */
export const DOSE_UNITS = ["mg", "g", "ug", "mL"] as const;
export const doseAmountSchema = quantityIn(...DOSE_UNITS);

export const clockTimeSchema = z.string().regex(/^([01]\d|2[0-3]):[0-5]\d$/);

/** Elapsed-hours repeat. Without `count`: until further notice (given lane: to the now line; option: to the end of the span shown). */
const everySchema = z.strictObject({ every: quantityIn("h"), count: z.int().min(1).max(10_000).optional() });
/** Weekdays of a repeat, 1 for Monday to 7 for Sunday, ascending, each once. */
const weekdaysSchema = z
  .array(z.int().min(1).max(7))
  .min(1)
  .max(7)
  .refine((days) => days.every((day, i) => i === 0 || day > (days[i - 1] ?? 0)), {
    params: { code: "line-weekdays-order" },
  });
/**
 * Wall-clock repeat, once a day at each clock time; `days` counts calendar days from that of `start`. Without `days`: until further notice.
 * With `weekdays`, only the days that fall on one of them carry doses; without, every day does.
 */
const clockSchema = z.strictObject({
  clock: z.array(clockTimeSchema).min(1).max(24),
  days: z.int().min(1).max(3_660).optional(),
  weekdays: weekdaysSchema.optional(),
});

/**
 * One dose of a repeat that did not go as the line says. `index` counts from 0 over the whole line.
 * "late" and "moved" carry `at`, the instant it was (or will be) taken; "missed" carries neither.
 */
const exceptionSchema = z.strictObject({
  index: z.int().min(0),
  status: z.enum(["missed", "late", "moved"]),
  at: instantSchema.optional(),
  amount: doseAmountSchema.optional(),
});

/** What a person would say in one breath: an amount of a product, from an instant, perhaps repeated. */
export const doseLineSchema = z.strictObject({
  id: z.string().min(1).max(64),
  product: z.string().min(1).max(64),
  amount: doseAmountSchema,
  start: instantSchema,
  repeat: z.union([everySchema, clockSchema]).optional(),
  except: z.array(exceptionSchema).max(10_000).optional(),
});

export type DoseLine = z.infer<typeof doseLineSchema>;
export type DoseRepeat = NonNullable<DoseLine["repeat"]>;
export type DoseException = z.infer<typeof exceptionSchema>;
export type DoseAmount = z.infer<typeof doseAmountSchema>;
