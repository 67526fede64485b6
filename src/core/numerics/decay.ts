import { productError } from "./productError.ts";

/** Below this argument the rounding of rate·time moves the result by less than a tenth of a unit in the last place. */
const CORRECT_ABOVE = 0.1;

/**
 * An exponential decay, as accurate for large arguments as for small ones.
 *
 * Formula: e^(−rate·time). The product is rounded before `Math.exp` sees it, which costs a relative
 * rate·time·1e-16; that remainder is put back.
 * @param rate per unit of time, 0 or more
 * @param time 0 or more; Infinity allowed with a rate above 0
 * @returns a number in [0, 1]
 * Outside: not checked; 0 when the result is below the smallest double.
 * Accuracy: relative 2.5e-16 wherever the result is a normal double (tests/core/numerics/decay.test.ts).
 * Source: standard result, derived here.
 * @example decay(0.1, 6000) // 2.65039655300422e-261 (Math.exp(-(0.1 * 6000)) gives 2.65039655300431e-261)
 */
export function decay(rate: number, time: number): number {
  const exponent = rate * time;
  const e = Math.exp(-exponent);
  if (exponent < CORRECT_ABOVE || e === 0) return e;
  return e - e * productError(rate, time, exponent);
}
