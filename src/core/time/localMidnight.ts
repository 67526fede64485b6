import { Temporal } from "temporal-polyfill";

const zoned = (ms: number, zone: string) =>
  Temporal.Instant.fromEpochMilliseconds(Math.floor(ms)).toZonedDateTimeISO(zone);

/** Epoch ms of the start of the local day that holds `ms`. Where midnight is skipped, the day's first instant. */
export function localMidnight(ms: number, zone: string): number {
  return zoned(ms, zone).startOfDay().epochMilliseconds;
}

/** Starts of the local days with fromMs ≤ start ≤ toMs; 23, 24 or 25 hours apart across a change of the clocks. */
export function midnightsBetween(fromMs: number, toMs: number, zone: string): number[] {
  const starts: number[] = [];
  let date = zoned(fromMs, zone).toPlainDate();
  for (;;) {
    const start = date.toZonedDateTime(zone).epochMilliseconds;
    if (start > toMs) return starts;
    if (start >= fromMs) starts.push(start);
    date = date.add({ days: 1 });
  }
}
