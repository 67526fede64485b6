import type { DoseLine } from "./doseLine.ts";

const DAY_H = 24;
const WEEK_H = 7 * DAY_H;

/** Hours after which a line repeats itself: its interval, 24 for a clock repeat, 168 for one on weekdays (as the wall clock counts); null for a single dose. */
export function doseLinePeriodHours(line: DoseLine): number | null {
  if (!line.repeat) return null;
  if ("every" in line.repeat) return line.repeat.every.value;
  return line.repeat.weekdays ? WEEK_H : DAY_H;
}

/** The most hours from a day with doses to the next one: as the period, but on weekdays the longest gap between two of them (Mon, Wed and Fri: 72). */
export function doseLineGapHours(line: DoseLine): number | null {
  if (!line.repeat || "every" in line.repeat || !line.repeat.weekdays) return doseLinePeriodHours(line);
  const { weekdays } = line.repeat;
  const gaps = weekdays.map((day, i) => (weekdays[i + 1] ?? (weekdays[0] ?? day) + 7) - day);
  return Math.max(...gaps) * DAY_H;
}
