/** Half a unit in the last place of 1: below it 1 − x/2 rounds to 1. */
const NEGLIGIBLE = 2 ** -53;

/**
 * The area under an exponential decay.
 *
 * Formula: ∫₀ᵗ e^(−rate·s) ds = (1 − e^(−rate·t))/rate, and t when rate is 0.
 * @param rate per unit of time, 0 or more
 * @param time 0 or more; Infinity allowed
 * @returns a time, 0 or more; Infinity when rate is 0 and time is Infinity
 * Outside: not checked.
 * Accuracy: relative 5e-16 (tests/core/numerics/decayIntegral.test.ts).
 * Source: standard result, derived here.
 * @example decayIntegral(0.5, 2) // 1.2642411176571153
 */
export function decayIntegral(rate: number, time: number): number {
  const exponent = rate * time;
  // Written so that 0·Infinity (not a number) takes the first way too.
  if (!(exponent >= NEGLIGIBLE)) return time;
  return -Math.expm1(-exponent) / rate;
}
