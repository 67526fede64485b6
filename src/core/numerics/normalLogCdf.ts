import { decay } from "./decay.ts";
import { NORMAL_DENSITY_AT_0 } from "./normalCdf.ts";
import { normalTailRatio } from "./normalTailRatio.ts";

/** ln √(2π). */
const HALF_LOG_2_PI = 0.9189385332046728;

/**
 * The natural logarithm of the part of the standard normal distribution below a point.
 *
 * Formula: ln Φ(x); −x²/2 − ln √(2π) + ln R(−x) for x <= 0 (normalTailRatio), ln(1 − φ(x)·R(x)) above. Never the logarithm of a
 * probability that has become 0.
 * @param x any finite number
 * @returns 0 or less
 * Outside: −Infinity at −Infinity and where x²/2 overflows; 0 at Infinity.
 * Accuracy: relative 1e-15, to x = −1e150 and for results down to −1e-300 (tests/core/numerics/normal.test.ts).
 * Source: standard; see normalTailRatio.
 * @example normalLogCdf(-40) // -804.6084420137538
 */
export function normalLogCdf(x: number): number {
  if (x <= 0) return x === -Infinity ? -Infinity : Math.log(normalTailRatio(-x)) - HALF_LOG_2_PI - (x * x) / 2;
  return x === Infinity ? 0 : Math.log1p(-NORMAL_DENSITY_AT_0 * decay(x, x / 2) * normalTailRatio(x));
}

/**
 * The slope of the logarithm of the part of the standard normal distribution below a point.
 *
 * Formula: d ln Φ(x)/dx = φ(x)/Φ(x) = 1/R(−x) for x <= 0 (normalTailRatio), φ(x)/(1 − φ(x)·R(x)) above. Its own slope is −s·(x + s).
 * @param x any number; ±Infinity allowed
 * @returns above 0: near −x far to the left, √(2/π) at 0, falling to 0 to the right
 * Outside: 0 above x = 38.6, where the result is below the smallest double.
 * Accuracy: relative 1.5e-15 wherever the result is a normal double (tests/core/numerics/normal.test.ts).
 * Source: standard; see normalTailRatio.
 * @example normalLogCdfSlope(0) // 0.7978845608028654
 */
export function normalLogCdfSlope(x: number): number {
  if (x <= 0) return 1 / normalTailRatio(-x);
  const density = x === Infinity ? 0 : NORMAL_DENSITY_AT_0 * decay(x, x / 2);
  return density / (1 - density * normalTailRatio(x));
}
