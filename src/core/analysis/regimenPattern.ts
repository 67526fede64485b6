import type { Case } from "../case/index.ts";
import { doseLabelledMg, doseMg, productOf } from "../medicine/index.ts";
import {
  type DoseLine,
  type DoseRepeat,
  doseLineEndMs,
  doseLineFirstMs,
  doseLineGapHours,
  doseLinePeriodHours,
} from "../regimen/index.ts";
import { instantMs, wallClock } from "../time/index.ts";
import { patternStartMs } from "./patternStart.ts";

const MINUTE_MS = 60_000;
const HOUR_MS = 60 * MINUTE_MS;
const DAY_MIN = 1_440;
/** A common period longer than this (two weeks) is not treated as one repeating pattern. */
const LONGEST_PERIOD_MIN = 14 * DAY_MIN;

export interface RegimenPattern {
  readonly periodH: number;
  /** When the pattern begins: the dose from which on the option gives all of it. */
  readonly startMs: number;
  /** Doses within [0, periodH) from `startMs`, by product. */
  readonly courses: ReadonlyMap<string, readonly { readonly time: number; readonly amount: number }[]>;
  /** mg as the products are labelled (of a salt, mg of salt). */
  readonly dosePerPeriodMg: number;
  /** When the last dose of the lead-in is due; null without one. */
  readonly leadInEndMs: number | null;
}

export type PatternResult =
  | { readonly ok: true; readonly pattern: RegimenPattern }
  | { readonly ok: false; readonly reason: "no-repeat" | "no-common-period" };

/**
 * The pattern an option settles into, as if its last repeating lines went on for ever.
 * Lines that end before the others are a lead-in (a loading dose, a lower first step) and are left out; so are exceptions.
 * Periods are whole minutes; the common period is their least common multiple, at most two weeks.
 * Clock-time lines count 24 h a day here, on weekdays seven days a week; the change of a daylight-saving night is in the profile, not in the steady state.
 */
export function regimenPattern(value: Case, lines: readonly DoseLine[]): PatternResult {
  const repeating = lines.filter((line) => line.repeat !== undefined);
  if (repeating.length === 0) return { ok: false, reason: "no-repeat" };
  const ends = repeating.map((line) => lineEndMs(line, value.timeZone));
  const lastEnd = Math.max(...ends);
  const ongoing = repeating.filter(
    (line, i) => ends[i] === lastEnd || ends[i]! + (doseLineGapHours(line) ?? 0) * HOUR_MS > lastEnd,
  );
  const period = ongoing.map(periodMin).reduce(leastCommonMultiple);
  if (!Number.isInteger(period) || period > LONGEST_PERIOD_MIN) return { ok: false, reason: "no-common-period" };

  // Accumulation and the wait count from here, so a pattern is taken in the order in which its doses are given.
  const startMs = patternStartMs(
    ongoing.map((line) => ({ line, firstMs: doseLineFirstMs(line, value.timeZone) ?? instantMs(line.start) })),
    value.timeZone,
  );
  const courses = new Map<string, { time: number; amount: number }[]>();
  let dosePerPeriodMg = 0;
  for (const line of ongoing) {
    const product = productOf(value.medicine, line.product);
    const mg = doseMg(line.amount, product);
    const labelled = doseLabelledMg(line.amount, product);
    if (!mg.ok || !labelled.ok) return { ok: false, reason: "no-repeat" };
    const doses = courses.get(line.product) ?? [];
    for (const minute of patternMinutes(line, startMs, period, value.timeZone)) {
      doses.push({ time: minute / 60, amount: mg.value });
      dosePerPeriodMg += labelled.value;
    }
    courses.set(line.product, doses);
  }
  const leadIn = lines.filter((line) => !ongoing.includes(line));
  const leadInEndMs = leadIn.length === 0 ? null : Math.max(...leadIn.map((line) => lineEndMs(line, value.timeZone)));
  for (const doses of courses.values()) doses.sort((a, b) => a.time - b.time);
  return { ok: true, pattern: { periodH: period / 60, startMs, courses, dosePerPeriodMg, leadInEndMs } };
}

/** Infinity for a line until further notice. */
function lineEndMs(line: DoseLine, zone: string): number {
  return line.repeat ? (doseLineEndMs(line, zone) ?? Number.POSITIVE_INFINITY) : instantMs(line.start);
}

function periodMin(line: DoseLine): number {
  const hours = doseLinePeriodHours(line);
  if (hours === null) throw new RangeError("a single dose has no period");
  return Math.round(hours * 60);
}

/** Minutes from the pattern's start at which the line gives a dose, within one period. */
function patternMinutes(line: DoseLine, startMs: number, period: number, zone: string): number[] {
  if (!line.repeat) return [];
  const own = periodMin(line);
  const offsets =
    "every" in line.repeat
      ? [(instantMs(line.start) - startMs) / MINUTE_MS]
      : clockOffsets(line.repeat, wallClock(startMs, zone));
  const minutes: number[] = [];
  for (const offset of offsets) {
    const first = ((offset % own) + own) % own;
    for (let minute = first; minute < period; minute += own) minutes.push(minute);
  }
  return minutes;
}

/** Minutes from the pattern's start to each clock time on its day, or on each of its weekdays; before wrapping into the period. */
function clockOffsets(
  { clock, weekdays }: Extract<DoseRepeat, { clock: string[] }>,
  start: { readonly time: string; readonly weekday: number },
): number[] {
  const days = weekdays?.map((day) => day - start.weekday) ?? [0];
  return days.flatMap((day) => clock.map((time) => day * DAY_MIN + minuteOfDay(time) - minuteOfDay(start.time)));
}

function minuteOfDay(time: string): number {
  return Number(time.slice(0, 2)) * 60 + Number(time.slice(3, 5));
}

function leastCommonMultiple(a: number, b: number): number {
  let x = a;
  let y = b;
  while (y !== 0) [x, y] = [y, x % y];
  return (a / x) * b;
}
