import { Temporal } from "temporal-polyfill";
import { localDays } from "./localDays.ts";

/** Epoch ms of the start of the local day that holds `ms`. Where midnight is skipped, the day's first instant. */
export function localMidnight(ms: number, zone: string): number {
  return Temporal.Instant.fromEpochMilliseconds(Math.floor(ms)).toZonedDateTimeISO(zone).startOfDay().epochMilliseconds;
}

/** Starts of the local days with fromMs ≤ start ≤ toMs; 23, 24 or 25 hours apart across a change of the clocks. */
export function midnightsBetween(fromMs: number, toMs: number, zone: string): number[] {
  const starts: number[] = [];
  for (const { startMs } of localDays(fromMs, zone)) {
    if (startMs > toMs) break;
    if (startMs >= fromMs) starts.push(startMs);
  }
  return starts;
}
