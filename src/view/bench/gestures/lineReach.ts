import type { DoseLine } from "../../../core/regimen/index.ts";

/** How far a repeat reaches, as the edit takes it; null for a single dose and for one that goes on until further notice. */
export type LineReach = { readonly count: number } | { readonly days: number };

export function lineReach(line: DoseLine): LineReach | null {
  if (!line.repeat) return null;
  if ("every" in line.repeat) return line.repeat.count === undefined ? null : { count: line.repeat.count };
  return line.repeat.days === undefined ? null : { days: line.repeat.days };
}

/** The reach after its end was pulled by so many hours; at least one dose or one day is left. */
export function lineReachPulled(line: DoseLine, reach: LineReach, byHours: number): LineReach {
  if ("days" in reach) return { days: Math.max(1, reach.days + Math.round(byHours / 24)) };
  if (!line.repeat || !("every" in line.repeat)) throw new RangeError(`line "${line.id}" does not repeat by hours`);
  return { count: Math.max(1, reach.count + Math.round(byHours / line.repeat.every.value)) };
}

/** One dose or one day more or less. */
export function lineReachStepped(reach: LineReach, direction: -1 | 1): LineReach {
  return "days" in reach
    ? { days: Math.max(1, reach.days + direction) }
    : { count: Math.max(1, reach.count + direction) };
}
