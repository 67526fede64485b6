import { decay } from "./decay.ts";
import { decayIntegral } from "./decayIntegral.ts";

/**
 * The divided difference of two exponential decays: two first-order steps in a row.
 *
 * Formula: φ(t) = (e^(−a·t) − e^(−b·t))/(b − a), and t·e^(−a·t) when a = b. Computed without subtraction of
 * the decays: with k = min(a, b), Δ = |a − b|, φ = e^(−k·t) · (1 − e^(−Δ·t))/Δ. Symmetric in a and b.
 * @param a per unit of time, above 0
 * @param b per unit of time, above 0
 * @param time 0 or more; Infinity allowed
 * @returns a time, 0 or more
 * Outside: not checked; 0 where the result is below the smallest double.
 * Accuracy: relative 1e-15, equal and near-equal rates included (tests/core/numerics/decayDifference.test.ts).
 * Source: standard result, derived here.
 * @example decayDifference(0.2, 1, 3) // 0.6237807096577031
 */
export function decayDifference(a: number, b: number, time: number): number {
  const slow = Math.min(a, b);
  const e = decay(slow, time);
  return e === 0 ? 0 : e * decayIntegral(Math.max(a, b) - slow, time);
}
