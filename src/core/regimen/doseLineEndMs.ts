import type { DoseLine } from "./doseLine.ts";
import { isEndlessLine, MOST_DOSES } from "./doseLineExpand.ts";
import { type ScheduledDose, scheduledDoses } from "./scheduledDoses.ts";

/** Epoch ms when the last dose of a line is due by the schedule; null for a line that goes on until further notice, or that has no dose at all. */
export function doseLineEndMs(line: DoseLine, zone: string): number | null {
  if (isEndlessLine(line)) return null;
  let last: ScheduledDose | null = null;
  for (const dose of scheduledDoses(line, zone)) {
    last = dose;
    if (dose.index + 1 >= MOST_DOSES) break;
  }
  return last ? dueMs(last) : null;
}

/** Epoch ms when the first dose of a line is due by the schedule; null for a line that has no dose at all. */
export function doseLineFirstMs(line: DoseLine, zone: string): number | null {
  for (const dose of scheduledDoses(line, zone)) return dueMs(dose);
  return null;
}

/** Epoch ms when dose `index` (from 0) is due by the schedule; throws RangeError when the line has no such dose. */
export function doseLineScheduledMs(line: DoseLine, index: number, zone: string): number {
  if (Number.isInteger(index) && index >= 0 && index < MOST_DOSES) {
    for (const dose of scheduledDoses(line, zone)) {
      if (dose.index === index) return dueMs(dose);
    }
  }
  throw new RangeError(`index: dose line "${line.id}" has no dose ${index}`);
}

/** How many doses a line has; Infinity until further notice. */
export function doseLineCount(line: DoseLine, zone: string): number {
  if (isEndlessLine(line)) return Number.POSITIVE_INFINITY;
  if (!line.repeat) return 1;
  if ("every" in line.repeat) return line.repeat.count ?? Number.POSITIVE_INFINITY;
  let count = 0;
  for (const _ of scheduledDoses(line, zone)) count += 1;
  return count;
}

/** Of a time that comes twice the first, of a skipped one the instant the clocks have changed. */
function dueMs({ found }: ScheduledDose): number {
  if (found.kind === "once") return found.ms;
  return found.kind === "twice" ? found.firstMs : found.afterMs;
}
