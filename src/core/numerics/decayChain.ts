import { decay } from "./decay.ts";
import { decayDifference } from "./decayDifference.ts";

/** From this (fastest − slowest)·time on the recursion loses less than a factor 4 a level; below it the series is short. */
const RECURSION_FROM = 3;
const LONGEST_SERIES = 80;

/**
 * The convolution of any number of exponential decays: a chain of first-order steps.
 *
 * Formula: E(r₁…rₙ; t) = ∫…∫ of e^(−r₁·s₁ − … − rₙ·sₙ) over all sᵢ >= 0 with s₁ + … + sₙ = t: the divided difference of
 * e^(−r·t) over the rates, with the sign that makes it positive. n = 1: e^(−r·t); n = 2: decayDifference; a rate of 0 integrates.
 * (fastest − slowest)·t >= 3: E = (E(without the fastest) − E(without the slowest))/(fastest − slowest).
 * Below: t^(n−1)·e^(−fastest·t)·Σ hₘ/(m+n−1)!, hₘ the complete homogeneous polynomial of degree m in (fastest − rᵢ)·t; every
 * term is positive, so equal and nearly equal rates cost nothing.
 * @param rates per unit of time, each 0 or more; 1 to 4 of them, in any order
 * @param time 0 or more, finite
 * @returns a time to the power n − 1, 0 or more
 * Outside: not checked; 0 where the result is below the smallest double.
 * Accuracy: relative 1e-15 for up to 4 rates (tests/core/numerics/decayChain.test.ts).
 * Source: divided differences of the exponential, standard; forms derived here.
 * @example decayChain([1, 1, 1], 1) // 0.18393972058572117 = 1/(2e)
 */
export function decayChain(rates: readonly number[], time: number): number {
  return chainOf(
    [...rates].sort((a, b) => a - b),
    time,
  );
}

function chainOf(ascending: readonly number[], time: number): number {
  const n = ascending.length;
  const slowest = ascending[0]!;
  const fastest = ascending[n - 1]!;
  if (n === 1) return decay(slowest, time);
  if (n === 2) return decayDifference(slowest, fastest, time);
  const spread = fastest - slowest;
  if (spread * time >= RECURSION_FROM) {
    return (chainOf(ascending.slice(0, -1), time) - chainOf(ascending.slice(1), time)) / spread;
  }
  return chainSeries(ascending, time);
}

function chainSeries(ascending: readonly number[], time: number): number {
  const last = ascending.length - 1;
  const fastest = ascending[last]!;
  const y = ascending.slice(0, last).map((rate) => (fastest - rate) * time);
  // homogeneous[j] is hₘ of the first j + 1 of y; h₀ = 1.
  const homogeneous = y.map(() => 1);
  let factorial = 1;
  let scale = decay(fastest, time);
  if (scale === 0) return 0;
  for (let k = 2; k <= last; k++) factorial *= k;
  for (let k = 0; k < last; k++) scale *= time;
  const lead = 1 / factorial;
  let tail = 0;
  for (let m = 1; m < LONGEST_SERIES; m++) {
    let before = 0;
    for (let j = 0; j < y.length; j++) {
      before += y[j]! * homogeneous[j]!;
      homogeneous[j] = before;
    }
    factorial *= m + last;
    const term = before / factorial;
    if (lead + (tail + term) === lead + tail) break;
    tail += term;
  }
  return scale * (lead + tail);
}
