import {
  type BatchLogDensity,
  choleskyFactor,
  type ImportanceSample,
  importanceSample,
  logDeterminant,
  type Matrix,
  PROPOSAL_DEGREES,
  paretoSmoothed,
  studentTLogDensity,
} from "../numerics/index.ts";

/** A place where a density is greatest among its neighbours. */
export interface Mode {
  readonly at: readonly number[];
  /** Minus the logarithm of the density there. */
  readonly objective: number;
  /** Its second derivatives there, positive definite. */
  readonly hessian: Matrix;
}

/** Each mode gets at least this part of the draws: its share is only guessed from its curvature. */
const LEAST_SHARE = 0.15;

/**
 * Weighted draws from a density with several modes.
 *
 * Formula: from each mode the points of importanceSample, in number by its mass as its height and curvature tell it (e^(−O)/√det H, at
 * least 15 %); every point is weighted by the density over the mixture of all the t distributions, then smoothed by paretoSmoothed.
 * @returns as importanceSample
 * Source: deterministic mixture weights (Owen & Zhou, Safe and effective importance sampling, J Am Stat Assoc 2000;95:135–143, from
 * memory, unverified).
 */
export function mixtureSample(
  logDensity: BatchLogDensity,
  modes: readonly Mode[],
  draws: number,
  seed: number,
): ImportanceSample {
  const factors = modes.map(({ hessian }) => choleskyFactor(hessian));
  if (factors.some((factor) => factor === null)) return { status: "no-scale" };
  const counts = countsOf(modes, draws);
  const d = modes[0]!.at.length;
  const points = modes[0]!.at.map(() => new Float64Array(draws));
  let filled = 0;
  for (const [m, { at, hessian }] of modes.entries()) {
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
  const logProposal = new Float64Array(draws);
  const terms = modes.map(() => 0);
  for (let n = 0; n < draws; n++) {
    for (const [m, { at }] of modes.entries()) {
      const factor = factors[m]!;
      // |Lᵀ·(x − mode)|² with H = L·Lᵀ.
      let squared = 0;
      for (let j = 0; j < d; j++) {
        let sum = 0;
        for (let i = j; i < d; i++) sum += factor[i]![j]! * (points[i]![n]! - at[i]!);
        squared += sum * sum;
      }
      terms[m] =
        Math.log(counts[m]! / draws) +
        factor.reduce((sum, row, i) => sum + Math.log(row[i]!), 0) +
        studentTLogDensity(squared, PROPOSAL_DEGREES, d);
    }
    const most = Math.max(...terms);
    logProposal[n] = most + Math.log(terms.reduce((sum, term) => sum + Math.exp(term - most), 0));
  }
  const density = logDensity(points);
  const { weights, paretoK, effectiveSize } = paretoSmoothed(density.map((each, n) => each - logProposal[n]!));
  return { status: "drawn", points, weights, paretoK, effectiveSize };
}

function countsOf(modes: readonly Mode[], draws: number): number[] {
  const least = modes[0]!.objective;
  const masses = modes.map(({ objective, hessian }) => {
    const half = (logDeterminant(hessian) ?? 0) / 2;
    return { log: least - objective - half };
  });
  const most = Math.max(...masses.map(({ log }) => log));
  const raw = masses.map(({ log }) => Math.exp(log - most));
  const total = raw.reduce((sum, each) => sum + each, 0);
  const share = Math.min(LEAST_SHARE, 1 / modes.length);
  const floored = raw.map((each) => Math.max(share, each / total));
  const sum = floored.reduce((all, each) => all + each, 0);
  const counts = floored.map((each) => Math.floor((draws * each) / sum));
  counts[0] = counts[0]! + draws - counts.reduce((all, each) => all + each, 0);
  return counts;
}
