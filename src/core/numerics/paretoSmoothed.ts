import { generalisedParetoFit } from "./generalisedParetoFit.ts";

export interface SmoothedWeights {
  /** Add up to 1. */
  readonly weights: Float64Array;
  /** Shape of the tail of the raw weights; above 0.7 the weights can't be trusted. Infinity where the tail is too short or too bare to tell. */
  readonly paretoK: number;
  /** 1/Σw² of the smoothed weights: how many even draws would say as much. */
  readonly effectiveSize: number;
}

/** Fewer weights in the tail don't tell its shape. */
const SHORTEST_TAIL = 5;
/** Tails narrower than this share of the largest weight hold nothing to smooth. */
const EVEN = 1e-12;

/**
 * Importance weights with their largest ones smoothed, and how heavy their tail is.
 *
 * Formula: the M = ⌈min(S/5, 3√S)⌉ largest of S weights, less the largest one below them (u), are fitted with a generalised Pareto
 * distribution (generalisedParetoFit) and replaced, in their order, by u + its quantiles at (z − 1/2)/M, z = 1…M, none above the
 * largest raw weight. Then all are divided by their sum.
 * @param logWeights natural logarithms, up to a common constant; −Infinity is weight 0
 * @returns see SmoothedWeights. With a tail of next to even weights nothing is smoothed and paretoK is 0: no tail at all
 * Outside: RangeError for an empty list, NaN or Infinity. Fewer than 21 weights, a quarter of the tail no heavier than u, or all of
 * weight 0: paretoK Infinity and nothing smoothed (all of weight 0: weights 0, effectiveSize 0).
 * Accuracy: of its own formula 1e-12 (tests/core/numerics/paretoSmoothed.test.ts); as an estimate of the shape, see there.
 * Source: Vehtari, Simpson, Gelman, Yao & Gabry, Pareto smoothed importance sampling, J. Mach. Learn. Res. 25 (2024) 72 (from memory,
 * unverified): tail length, order-statistic quantiles, threshold 0.7.
 * @example paretoSmoothed(Float64Array.of(0, 0)).weights // [0.5, 0.5]
 */
export function paretoSmoothed(logWeights: ArrayLike<number>): SmoothedWeights {
  const count = logWeights.length;
  if (count === 0) throw new RangeError("logWeights: at least one is needed");
  let largest = -Infinity;
  for (let i = 0; i < count; i++) {
    const each = logWeights[i]!;
    if (Number.isNaN(each) || each === Infinity)
      throw new RangeError(`logWeights[${i}]: ${each}; must be below Infinity`);
    largest = Math.max(largest, each);
  }
  const weights = new Float64Array(count);
  if (largest === -Infinity) return { weights, paretoK: Infinity, effectiveSize: 0 };
  for (let i = 0; i < count; i++) weights[i] = Math.exp(logWeights[i]! - largest);

  const paretoK = smoothTail(weights);
  let sum = 0;
  for (const each of weights) sum += each;
  let squares = 0;
  for (let i = 0; i < count; i++) {
    weights[i] = weights[i]! / sum;
    squares += weights[i]! * weights[i]!;
  }
  return { weights, paretoK, effectiveSize: 1 / squares };
}

/** Weights with the largest 1; returns the shape. */
function smoothTail(weights: Float64Array): number {
  const count = weights.length;
  const size = Math.ceil(Math.min(count / 5, 3 * Math.sqrt(count)));
  if (size < SHORTEST_TAIL) return Infinity;
  const order = Array.from(weights.keys()).sort((a, b) => weights[a]! - weights[b]!);
  const tail = order.slice(count - size);
  const threshold = weights[order[count - size - 1]!]!;
  if (1 - threshold <= EVEN) return 0;
  const excesses = Float64Array.from(tail, (place) => weights[place]! - threshold);
  const fit = generalisedParetoFit(excesses);
  if (fit === null) return Infinity;
  const { shape, scale } = fit;
  for (const [z, place] of tail.entries()) {
    // ln(1 − p), p = (z + 1/2)/M.
    const logRest = Math.log1p(-(z + 0.5) / size);
    const excess = shape === 0 ? -scale * logRest : (scale * Math.expm1(-shape * logRest)) / shape;
    weights[place] = Math.min(threshold + excess, 1);
  }
  return shape;
}
