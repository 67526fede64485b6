import type { DoseLine } from "../../regimen/index.ts";
import { instantMs } from "../../time/index.ts";

const HOUR_MS = 3_600_000;

/** How many doses a line has; Infinity until further notice. */
export function lineDoseCount(line: DoseLine, _timeZone: string): number {
  if (!line.repeat) return 1;
  if ("every" in line.repeat) return line.repeat.count ?? Number.POSITIVE_INFINITY;
  throw new RangeError("clock repeats are not counted yet");
}

/** When dose `index` of a line falls by the line alone, exceptions aside; epoch ms. */
export function lineScheduledMs(line: DoseLine, index: number, timeZone: string): number {
  if (!Number.isInteger(index) || index < 0 || index >= lineDoseCount(line, timeZone)) {
    throw new RangeError(`index: dose line "${line.id}" has no dose ${index}`);
  }
  if (!line.repeat) return instantMs(line.start);
  if ("every" in line.repeat) return instantMs(line.start) + index * line.repeat.every.value * HOUR_MS;
  throw new RangeError("clock repeats are not scheduled yet");
}
