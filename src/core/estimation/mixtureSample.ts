import {
  type BatchLogDensity,
  choleskyFactor,
  type ImportanceSample,
  importanceSample,
  type Matrix,
  PROPOSAL_DEGREES,
  paretoSmoothed,
} from "../numerics/index.ts";

/** A t distribution with 4 degrees that a part of the draws comes from. */
export interface Component {
  readonly at: readonly number[];
  /** Inverse of its scale matrix, positive definite. */
  readonly hessian: Matrix;
  /** Its part of the draws; they add up to 1. */
  readonly share: number;
}

/**
 * Weighted draws from a density, proposed by several t distributions together.
 *
 * Formula: from each component the points of importanceSample; every point is weighted by the density over the mixture of all
 * components, then smoothed by paretoSmoothed.
 * @returns as importanceSample
 * Source: deterministic mixture weights (Owen & Zhou, Safe and effective importance sampling, J Am Stat Assoc 2000;95:135–143, from
 * memory, unverified).
 */
export function mixtureSample(
  logDensity: BatchLogDensity,
  components: readonly Component[],
  draws: number,
  seed: number,
): ImportanceSample {
  const counts = countsOf(components, draws);
  const points = components[0]!.at.map(() => new Float64Array(draws));
  let filled = 0;
  for (const [m, { at, hessian }] of components.entries()) {
    const part = importanceSample({
      logDensity: (each) => new Float64Array(each[0]!.length),
      mode: at,
      hessian,
      draws: counts[m]!,
      seed: (seed + m) % 2 ** 32,
    });
    if (part.status !== "drawn") return part;
    for (const [i, column] of part.points.entries()) points[i]!.set(column, filled);
    filled += counts[m]!;
  }
  const logProposal = logMixture(components, counts, points);
  if (logProposal === null) return { status: "no-scale" };
  const density = logDensity(points);
  const { weights, paretoK, effectiveSize } = paretoSmoothed(density.map((each, n) => each - logProposal[n]!));
  return { status: "drawn", points, weights, paretoK, effectiveSize };
}

/** Whole numbers that add up to the draws. */
function countsOf(components: readonly Component[], draws: number): number[] {
  const counts = components.map(({ share }) => Math.floor(share * draws));
  counts[0] = counts[0]! + draws - counts.reduce((sum, count) => sum + count, 0);
  return counts;
}

/** ln of the mixture of the components at each point, up to a constant. */
function logMixture(
  components: readonly Component[],
  counts: readonly number[],
  points: readonly Float64Array[],
): Float64Array | null {
  const d = points.length;
  const draws = points[0]!.length;
  const mixture = new Float64Array(draws).fill(Number.NEGATIVE_INFINITY);
  const power = (PROPOSAL_DEGREES + d) / 2;
  for (const [m, { at, hessian }] of components.entries()) {
    const factor = choleskyFactor(hessian);
    if (factor === null) return null;
    if (counts[m] === 0) continue;
    // H = L·Lᵀ: the density carries det L, and the distance is |Lᵀ·(x − at)|.
    const height = Math.log(counts[m]! / draws) + factor.reduce((sum, row, i) => sum + Math.log(row[i]!), 0);
    for (let n = 0; n < draws; n++) {
      let squared = 0;
      for (let j = 0; j < d; j++) {
        let sum = 0;
        for (let i = j; i < d; i++) sum += factor[i]![j]! * (points[i]![n]! - at[i]!);
        squared += sum * sum;
      }
      const term = height - power * Math.log1p(squared / PROPOSAL_DEGREES);
      const before = mixture[n]!;
      mixture[n] = Math.max(before, term) + Math.log1p(Math.exp(-Math.abs(before - term)));
    }
  }
  return mixture;
}
