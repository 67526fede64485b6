/** From here on the asymptotic series is good to the last place. */
const SERIES_FROM = 10;
/** Bernoulli numbers B₂ₖ over 2k(2k − 1). */
const SERIES = [1 / 12, -1 / 360, 1 / 1260, -1 / 1680, 1 / 1188, -691 / 360360, 1 / 156, -3617 / 122400];
/** ln √(2π). */
const HALF_LOG_2_PI = 0.9189385332046728;

/**
 * The natural logarithm of the gamma function.
 *
 * Formula: ln Γ(x) = (x − ½)·ln x − x + ln √(2π) + Σ B₂ₖ/(2k(2k − 1)·x^(2k−1)) from x = 10 on; below, ln Γ(x + n) − ln(x·(x + 1)…).
 * @param x above 0
 * @returns ln Γ(x)
 * Outside: RangeError.
 * Accuracy: 5e-15·max(1, |ln Γ|) for x up to 1e6 (tests/core/numerics/studentT.test.ts).
 * Source: Stirling's series, standard.
 * @example logGamma(5) // 3.178053830347946 = ln 24
 */
export function logGamma(x: number): number {
  if (!(x > 0)) throw new RangeError(`x: ${x}; must be above 0`);
  let product = 1;
  let at = x;
  while (at < SERIES_FROM) {
    product *= at;
    at += 1;
  }
  let sum = 0;
  for (let k = SERIES.length - 1; k >= 0; k--) sum = sum / (at * at) + SERIES[k]!;
  return (at - 0.5) * Math.log(at) - at + HALF_LOG_2_PI + sum / at - Math.log(product);
}
