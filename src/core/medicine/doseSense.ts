import type { DoseLine } from "../regimen/index.ts";
import { quantityConvert } from "../units/index.ts";
import { doseLabelledMg } from "./doseMg.ts";
import type { MedicineRecord } from "./medicineRecord.ts";
import { productOf } from "./productOf.ts";

/** Beyond this many times the record's maximum a typed dose is asked about: a slip of a digit, not a decision. Our choice. */
export const DOSE_FAR = 3;

export interface DoseSense {
  readonly per: "dose" | "day";
  readonly mg: number;
  /** The record's maximum, mg. */
  readonly limitMg: number;
  readonly limit: "single" | "daily";
}

/**
 * Whether a dose line as typed is far above the record's maximum single or daily dose, as labelled; null where it is not, or the record states none.
 * One dose is held against both limits; a day of the line (mg · doses a day, 24 / interval by elapsed hours) against the daily one.
 * Not a limit: what exceeds it by less is taken, and is a concern.
 * Example: theophylline (at most 600 mg a day), 2000 mg every 12 h: 2000 mg in one dose, over 3 · 600 mg.
 */
export function doseSense(
  line: Pick<DoseLine, "product" | "amount" | "repeat">,
  record: MedicineRecord,
): DoseSense | null {
  const read = doseLabelledMg(line.amount, productOf(record, line.product));
  if (!read.ok) return null;
  const { maximumSingleDose, maximumDailyDose } = record.limits;
  const single = maximumSingleDose ? quantityConvert(maximumSingleDose, "mg") : null;
  const daily = maximumDailyDose ? quantityConvert(maximumDailyDose, "mg") : null;
  const mg = read.value;
  if (single !== null && mg > DOSE_FAR * single) return { per: "dose", mg, limitMg: single, limit: "single" };
  if (daily === null) return null;
  if (mg > DOSE_FAR * daily) return { per: "dose", mg, limitMg: daily, limit: "daily" };
  const dayMg = mg * dosesPerDay(line.repeat);
  return dayMg > DOSE_FAR * daily ? { per: "day", mg: dayMg, limitMg: daily, limit: "daily" } : null;
}

/** At most: of a course that is over within a day, all its doses. */
function dosesPerDay(repeat: DoseLine["repeat"]): number {
  if (!repeat) return 1;
  if ("clock" in repeat) return repeat.clock.length;
  return Math.max(1, Math.min(24 / repeat.every.value, repeat.count ?? Number.POSITIVE_INFINITY));
}
