import type { ModelHistory } from "../kinetics/index.ts";
import { curveTimes } from "./curveTimes.ts";
import { type DrawnPatients, drawnLevels } from "./drawnPatients.ts";
import type { Band } from "./fitTypes.ts";
import { quantileOfSorted, SPREAD_PROBABILITIES } from "./spreadOf.ts";

/** Even points of a band, besides the corners of the curve: at least so many, and no further apart than this, h. */
const BAND_POINTS = 240;
const BAND_STEP_H = 1;
/** Longest step of the grid the figures of a draw are read from, h. */
const LONGEST_STEP_H = 0.25;

/** What a window is, and up to when a curve is looked at. */
export interface LookedAt {
  readonly toH: number;
  readonly window: { readonly low: number; readonly high: number } | null;
}

/** A figure a draw. Concentrations mg/L, hours h. */
export interface DrawnFigures {
  readonly peak: Float64Array;
  readonly lowest: Float64Array;
  /** When it comes: the first time, on the clock. */
  readonly lowestAtH: Float64Array;
  readonly average: Float64Array;
  readonly hoursBelow: Float64Array;
  readonly hoursWithin: Float64Array;
  readonly hoursAbove: Float64Array;
}

/** Figures of so many draws, all 0. */
export function figureColumns(count: number): DrawnFigures {
  const column = () => new Float64Array(count);
  return {
    peak: column(),
    lowest: column(),
    lowestAtH: column(),
    average: column(),
    hoursBelow: column(),
    hoursWithin: column(),
    hoursAbove: column(),
  };
}

/**
 * The curves of all draws over [fromH, toH]: their band, and what each comes to up to `looked.toH`.
 * The figures are read from a grid of at most a quarter of an hour that has every corner of the curve on it: within 0.2 % of the exact
 * ones (tests/core/analysis/individual.test.ts), well inside what the number of draws leaves open. Yields between the draws how many are done.
 */
export function* drawnCurve(
  history: ModelHistory,
  patients: DrawnPatients,
  fromH: number,
  toH: number,
  looked: LookedAt,
): Generator<number, { readonly band: Band; readonly figures: DrawnFigures }> {
  const bandTimes = curveTimes(history, fromH, toH, Math.max(BAND_POINTS, Math.ceil((toH - fromH) / BAND_STEP_H)));
  const step = Math.ceil((toH - fromH) / LONGEST_STEP_H);
  const times = together(bandTimes, curveTimes(history, fromH, toH, Math.max(BAND_POINTS, step)), looked.toH);
  const inBand = Int32Array.from(bandTimes, (time) => times.indexOf(time));
  const { count } = patients;
  const rows = Float64Array.from({ length: bandTimes.length * count });
  const figures = figureColumns(count);
  for (const { first, levels } of drawnLevels(history, patients, times)) {
    const few = levels[0]!.length;
    for (let n = 0; n < few; n++) {
      for (let j = 0; j < inBand.length; j++) rows[j * count + first + n] = levels[inBand[j]!]![n]!;
      readFigures(times, levels, n, looked, figures, first + n);
    }
    yield first + few;
  }
  const limits = SPREAD_PROBABILITIES.map(() => new Float64Array(bandTimes.length));
  for (let j = 0; j < bandTimes.length; j++) {
    const sorted = rows.subarray(j * count, (j + 1) * count).sort();
    for (const [k, probability] of SPREAD_PROBABILITIES.entries())
      limits[k]![j] = quantileOfSorted(sorted, probability);
  }
  const [q05, q25, q50, q75, q95] = limits;
  return { band: { timesH: bandTimes, q05: q05!, q25: q25!, q50: q50!, q75: q75!, q95: q95! }, figures };
}

function together(a: Float64Array, b: Float64Array, c: number): Float64Array {
  return Float64Array.from(new Set([...a, ...b, c])).sort();
}

/** Peak, lowest, average and hours about the window of one draw, between straight lines. */
function readFigures(
  times: Float64Array,
  levels: readonly Float64Array[],
  draw: number,
  { toH, window }: LookedAt,
  into: DrawnFigures,
  at: number,
): void {
  let peak = levels[0]![draw]!;
  let lowest = peak;
  let lowestAtH = times[0]!;
  let area = 0;
  let below = 0;
  let above = 0;
  let i = 1;
  for (; i < times.length && times[i]! <= toH; i++) {
    const start = levels[i - 1]![draw]!;
    const end = levels[i]![draw]!;
    const length = times[i]! - times[i - 1]!;
    peak = Math.max(peak, end);
    if (end < lowest) {
      lowest = end;
      lowestAtH = times[i]!;
    }
    area += ((start + end) / 2) * length;
    if (!window) continue;
    below += length * partBelow(start, end, window.low);
    above += length * partBelow(-start, -end, -window.high);
  }
  const span = times[i - 1]! - times[0]!;
  into.peak[at] = peak;
  into.lowest[at] = lowest;
  into.lowestAtH[at] = lowestAtH;
  into.average[at] = area / span;
  into.hoursBelow[at] = below;
  into.hoursAbove[at] = above;
  into.hoursWithin[at] = Math.max(0, span - below - above);
}

/** The part of a straight line from `start` to `end` that lies strictly below `edge`. */
function partBelow(start: number, end: number, edge: number): number {
  if (start < edge && end < edge) return 1;
  if (start >= edge && end >= edge) return 0;
  const part = (edge - start) / (end - start);
  return start < edge ? part : 1 - part;
}
