import { weightedQuantiles } from "../numerics/index.ts";

export interface DrawSummary {
  readonly mean: number;
  readonly sd: number;
  readonly q05: number;
  readonly q25: number;
  readonly q50: number;
  readonly q75: number;
  readonly q95: number;
}

export const SUMMARY_PROBABILITIES = [0.05, 0.25, 0.5, 0.75, 0.95] as const;

/** Mean and standard deviation of weighted draws. */
export function drawMoments(values: ArrayLike<number>, weights: ArrayLike<number>): { mean: number; sd: number } {
  let total = 0;
  let mean = 0;
  for (let n = 0; n < values.length; n++) {
    total += weights[n]!;
    mean += weights[n]! * values[n]!;
  }
  mean /= total;
  let squares = 0;
  for (let n = 0; n < values.length; n++) squares += weights[n]! * (values[n]! - mean) ** 2;
  return { mean, sd: Math.sqrt(squares / total) };
}

/** What weighted draws of one figure say: see weightedQuantiles. */
export function drawSummary(values: ArrayLike<number>, weights: ArrayLike<number>): DrawSummary {
  const [q05, q25, q50, q75, q95] = weightedQuantiles(values, weights, SUMMARY_PROBABILITIES);
  return { ...drawMoments(values, weights), q05: q05!, q25: q25!, q50: q50!, q75: q75!, q95: q95! };
}
