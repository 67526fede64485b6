import { chiSquareQuantile } from "./chiSquareQuantile.ts";
import { normalQuantile } from "./normalQuantile.ts";
import { sobolPoints } from "./sobolPoints.ts";

export interface StandardTPoints {
  /** One array a dimension. Shared between calls: to be read only. */
  readonly points: readonly Float64Array[];
  /** z₁² + … + z_d² of each point. */
  readonly squaredLengths: Float64Array;
}

/** How many sets are kept: the same few are asked for again and again while something is dragged. */
const KEPT = 6;
const kept = new Map<string, StandardTPoints>();

/**
 * Points spread evenly over a multivariate t distribution about 0 with the identity as its scale.
 *
 * Formula: z·√(ν/c), z the normal quantiles of the first d coordinates of scrambled Sobol points in d + 1 dimensions and c the
 * chi-square quantile, ν degrees, of the last.
 * @param dimension d, 1 to 15
 * @param degrees ν, even, 2 to 40
 * @param count how many points
 * @param seed whole number, 0 to 2^32 − 1
 * @returns see StandardTPoints. The last six sets are kept and given again: the same values as made anew
 * Outside: RangeError (sobolPoints, chiSquareQuantile).
 * Accuracy: that of normalQuantile and chiSquareQuantile.
 * Source: the t distribution as a normal one over the root of a chi-square one, standard.
 * @example standardTPoints(1, 4, 1024, 1).points[0] // half of it within ±0.741
 */
export function standardTPoints(dimension: number, degrees: number, count: number, seed: number): StandardTPoints {
  const key = `${dimension} ${degrees} ${count} ${seed}`;
  const known = kept.get(key);
  if (known) return known;
  const cube = sobolPoints(dimension + 1, count, seed);
  const chance = cube[dimension]!;
  const points = cube.slice(0, dimension);
  const squaredLengths = new Float64Array(count);
  for (let n = 0; n < count; n++) {
    const stretch = Math.sqrt(degrees / chiSquareQuantile(chance[n]!, degrees));
    for (const column of points) {
      column[n] = normalQuantile(column[n]!) * stretch;
      squaredLengths[n] = squaredLengths[n]! + column[n]! * column[n]!;
    }
  }
  const made = { points, squaredLengths };
  const [oldest] = kept.keys();
  if (kept.size >= KEPT && oldest !== undefined) kept.delete(oldest);
  kept.set(key, made);
  return made;
}
