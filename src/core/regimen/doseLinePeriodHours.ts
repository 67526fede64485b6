import type { DoseLine } from "./doseLine.ts";

/** Hours after which a line repeats itself: its interval, or 24 for a clock repeat (as the wall clock counts); null for a single dose. */
export function doseLinePeriodHours(line: DoseLine): number | null {
  if (!line.repeat) return null;
  return "every" in line.repeat ? line.repeat.every.value : 24;
}
