import { weightedQuantiles } from "../numerics/index.ts";
import type { Spread } from "./fitTypes.ts";

/** The limits of the 90 % and the 50 % interval, and the middle. */
export const SPREAD_PROBABILITIES = [0.05, 0.25, 0.5, 0.75, 0.95] as const;

/** Standard normal quantiles at those, from a table of the distribution. */
const NORMAL = [-1.6448536269514722, -0.6744897501960817, 0, 0.6744897501960817, 1.6448536269514722] as const;

export function spread([q05, q25, q50, q75, q95]: ArrayLike<number> & Iterable<number>): Spread {
  return { q05: q05!, q25: q25!, q50: q50!, q75: q75!, q95: q95! };
}

/** Of weighted draws. */
export function spreadOf(values: Float64Array, weights: Float64Array): Spread {
  return spread(weightedQuantiles(values, weights, SPREAD_PROBABILITIES));
}

/** Of draws that all weigh the same. The values are put in order. */
export function spreadOfEqual(values: Float64Array): Spread {
  values.sort();
  return spread(SPREAD_PROBABILITIES.map((probability) => quantileOfSorted(values, probability)));
}

/** Linear between the order statistics (i + 1/2)/n; the ends beyond the first and the last. Example: of 1, 2, 3 at 0.5: 2. */
export function quantileOfSorted(sorted: Float64Array, probability: number): number {
  const at = Math.min(Math.max(probability * sorted.length - 0.5, 0), sorted.length - 1);
  const below = Math.floor(at);
  const low = sorted[below]!;
  const high = sorted[Math.min(below + 1, sorted.length - 1)]!;
  return low + (high - low) * (at - below);
}

/** Of typical · e^η, η normal with the given standard deviation. */
export function spreadOfPrior(typical: number, omega: number): Spread {
  return spread(NORMAL.map((z) => typical * Math.exp(omega * z)));
}
