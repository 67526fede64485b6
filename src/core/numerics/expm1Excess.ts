/** Below it in size a series; above it the subtraction loses less than a factor 2.5. */
const SERIES_BELOW = 1;
/** Terms for full precision at |x| = 1: 1/20! < 1e-18. */
const TERMS = 19;

/**
 * By how much (e^x − 1)/x exceeds 1.
 *
 * Formula: (e^x − 1 − x)/x = x/2 + x²/6 + …, and 0 at x = 0.
 * @param x any number
 * @returns above 0 for x > 0, in (−1, 0) for x < 0
 * Outside: Infinity from x = 709.8 on.
 * Accuracy: relative 1e-15 (tests/core/numerics/expm1Excess.test.ts).
 * Source: standard result, derived here.
 * @example expm1Excess(1) // 0.718281828459045 = e − 2
 */
export function expm1Excess(x: number): number {
  if (Math.abs(x) >= SERIES_BELOW) {
    const e = Math.expm1(x);
    return e === Infinity ? Infinity : e / x - 1;
  }
  let sum = 1;
  for (let n = TERMS; n >= 3; n--) sum = 1 + (x / n) * sum;
  return (x / 2) * sum;
}
