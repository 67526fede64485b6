import { choleskyFactor, type Matrix } from "./choleskyFactor.ts";
import { paretoSmoothed } from "./paretoSmoothed.ts";
import { standardTPoints } from "./standardTPoints.ts";
import { symmetricInverse } from "./symmetricInverse.ts";

/** Logarithms of an unnormalised density at many points at once: one array a dimension in, one number a point out. */
export type BatchLogDensity = (points: readonly Float64Array[]) => Float64Array;

export interface ImportanceProblem {
  readonly logDensity: BatchLogDensity;
  /** Where the density is greatest. */
  readonly mode: readonly number[];
  /** Second derivatives of minus the log density there, positive definite. */
  readonly hessian: Matrix;
  /** How many points, 25 or more; a power of 2 fills evenly. */
  readonly draws: number;
  /** Whole number, 0 to 2^32 − 1. */
  readonly seed: number;
}

export type ImportanceSample =
  | {
      readonly status: "drawn";
      /** One array a dimension. */
      readonly points: Float64Array[];
      /** Add up to 1. */
      readonly weights: Float64Array;
      /** See paretoSmoothed: above 0.7 not to be trusted. */
      readonly paretoK: number;
      readonly effectiveSize: number;
    }
  /** The second derivatives given are not positive definite. */
  | { readonly status: "no-scale" };

/**
 * Degrees of the t distribution drawn from. Tails of power ν + d cover any density that falls as fast as a normal one, and wider and
 * skew ones: of 2, 4, 6, 8, 12, 20 and 40 degrees 4 kept the most of 4,096 draws where the density is skew or 1.6 times wider than its
 * curvature says, at a cost of a tenth where it is normal (docs/methods/optimiser-and-sampling.md).
 */
export const PROPOSAL_DEGREES = 4;

/**
 * Weighted draws from a density known up to a factor, from its greatest point and its curvature there.
 *
 * Formula: x = mode + L·z·√(ν/c), L·Lᵀ = H⁻¹, z standard normal and c chi-square with ν = 4 degrees, both by their quantiles from
 * scrambled Sobol points in d + 1 dimensions (standardTPoints): a multivariate t. Weight: density over that t's density, smoothed by paretoSmoothed.
 * @param problem see ImportanceProblem; 1 to 15 dimensions
 * @returns see ImportanceSample
 * Outside: RangeError for sizes that don't fit, a seed or number of draws out of range, a log density of NaN or Infinity. −Infinity
 * (density 0) is allowed.
 * Accuracy: with 4,000 draws from a three-dimensional normal density means to 0.01 and standard deviations to 1 % of themselves, for
 * any of 50 seeds (tests/core/numerics/importanceSample.test.ts). Same seed, same bits, within one engine.
 * Source: importance sampling from a t about the mode, standard (Geweke, Bayesian inference in econometric models using Monte Carlo
 * integration, Econometrica 57 (1989) 1317–1339; from memory, unverified).
 * @example importanceSample({ logDensity: ([x]) => x!.map((each) => -each * each / 2), mode: [0], hessian: [[1]], draws: 1024, seed: 1 }).paretoK // below 0.7
 */
export function importanceSample(problem: ImportanceProblem): ImportanceSample {
  const { mode, hessian, draws } = problem;
  const d = mode.length;
  if (hessian.length !== d) throw new RangeError(`hessian: ${hessian.length} rows for ${d} dimensions`);
  const scale = symmetricInverse(hessian);
  const factor = scale && choleskyFactor(scale);
  if (!factor) return { status: "no-scale" };

  const standard = standardTPoints(d, PROPOSAL_DEGREES, draws, problem.seed);
  const points = mode.map((centre, i) => {
    const row = factor[i]!;
    return Float64Array.from({ length: draws }, (_, n) => {
      let sum = centre;
      for (let j = 0; j <= i; j++) sum += row[j]! * standard.points[j]![n]!;
      return sum;
    });
  });
  // The t's constants are the same for every point and drop out of the weights.
  const logProposal = standard.squaredLengths.map(
    (squared) => -((PROPOSAL_DEGREES + d) / 2) * Math.log1p(squared / PROPOSAL_DEGREES),
  );
  const logDensity = problem.logDensity(points);
  if (logDensity.length !== draws) throw new RangeError(`logDensity: ${logDensity.length} numbers for ${draws} points`);
  const { weights, paretoK, effectiveSize } = paretoSmoothed(logDensity.map((each, n) => each - logProposal[n]!));
  return { status: "drawn", points, weights, paretoK, effectiveSize };
}
