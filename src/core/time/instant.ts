import { Temporal } from "temporal-polyfill";
import { z } from "zod";
import { MS_PER_HOUR } from "./msPerHour.ts";

/** ISO 8601 with offset, to the minute or second, years 1970 to 2199. */
const PATTERN =
  /^(19[7-9]\d|20\d\d|21\d\d)-(0[1-9]|1[0-2])-(0[1-9]|[12]\d|3[01])T([01]\d|2[0-3]):[0-5]\d(:[0-5]\d)?(Z|[+-](0\d|1[0-4]):[0-5]\d)$/;

/** Whether a text is such an instant, of a date that exists. */
export function isInstant(iso: string): boolean {
  if (!PATTERN.test(iso)) return false;
  const [year, month, day] = iso.slice(0, 10).split("-").map(Number) as [number, number, number];
  return day <= Temporal.PlainYearMonth.from({ year, month }).daysInMonth;
}

/** An instant as it stands in a saved case: "2026-03-04T09:00:00+00:00". The date must exist. */
export const instantSchema = z.string().regex(PATTERN).refine(isInstant);

/** Epoch milliseconds of an instant that passes `instantSchema`; anything else throws RangeError. */
export function instantMs(iso: string): number {
  if (!isInstant(iso)) {
    throw new RangeError(`iso: "${iso}"; allowed ISO 8601 with offset, to the minute or second, of a date that exists`);
  }
  return Temporal.Instant.from(iso).epochMilliseconds;
}

/** The canonical text of an instant, with the offset of `zone`, rounded to the second: "2026-03-04T09:00:00+00:00". */
export function instantIso(ms: number, zone: string): string {
  if (!Number.isFinite(ms)) throw new RangeError(`ms: ${ms} is not a finite number of milliseconds`);
  const rounded = Math.round(ms / 1000) * 1000;
  return Temporal.Instant.fromEpochMilliseconds(rounded)
    .toZonedDateTimeISO(zone)
    .toString({ timeZoneName: "never", fractionalSecondDigits: 0 });
}

/** The instant `hours` elapsed hours later (earlier when negative), whatever the wall clock does meanwhile. */
export function instantAddHours(iso: string, hours: number, zone: string): string {
  return instantIso(instantMs(iso) + hours * MS_PER_HOUR, zone);
}
