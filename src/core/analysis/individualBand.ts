import { type ModelHistory, modelProfile, modelScaled } from "../kinetics/index.ts";
import { curveTimes } from "./curveTimes.ts";
import type { Band } from "./fitTypes.ts";
import type { DrawnPatients } from "./individualReadings.ts";
import { quantileOfSorted, SPREAD_PROBABILITIES } from "./spreadOf.ts";

/** Even points of a band, besides the corners of the curve. */
const POINTS = 240;

/** The levels of all draws over [fromH, toH] as limits at each time. Drawing only. Yields after each draw. */
export function* individualBand(
  history: ModelHistory,
  patients: DrawnPatients,
  fromH: number,
  toH: number,
): Generator<void, Band> {
  const timesH = curveTimes(history, fromH, toH, POINTS);
  const { names, count } = patients;
  const levels = new Float64Array(timesH.length * count);
  for (let i = 0; i < count; i++) {
    const own = modelProfile(modelScaled(history, names, patients.eta(i)), timesH);
    for (let j = 0; j < timesH.length; j++) levels[j * count + i] = own[j]!;
    yield;
  }
  const limits = SPREAD_PROBABILITIES.map(() => new Float64Array(timesH.length));
  for (let j = 0; j < timesH.length; j++) {
    const column = levels.subarray(j * count, (j + 1) * count).sort();
    for (const [k, probability] of SPREAD_PROBABILITIES.entries())
      limits[k]![j] = quantileOfSorted(column, probability);
  }
  const [q05, q25, q50, q75, q95] = limits;
  return { timesH, q05: q05!, q25: q25!, q50: q50!, q75: q75!, q95: q95! };
}
