import { decay } from "./decay.ts";
import { normalTailRatio } from "./normalTailRatio.ts";

/** 1/√(2π). */
export const NORMAL_DENSITY_AT_0 = 0.3989422804014327;

/**
 * The part of the standard normal distribution below a point.
 *
 * Formula: Φ(x) = ∫ e^(−s²/2)/√(2π) ds from −∞ to x; φ(x)·R(−x) for x <= 0 (normalTailRatio), 1 − φ(x)·R(x) above.
 * @param x any number; ±Infinity allowed
 * @returns 0 to 1
 * Outside: 0 below x = −38.5, where the result is below the smallest double; 1 above 8.3.
 * Accuracy: relative 1.5e-15 wherever the result is a normal double (tests/core/numerics/normal.test.ts).
 * Source: standard; see normalTailRatio.
 * @example normalCdf(-1.96) // 0.0249978951482204
 */
export function normalCdf(x: number): number {
  if (x === 0) return 0.5;
  const size = Math.abs(x);
  const density = NORMAL_DENSITY_AT_0 * (size === Infinity ? 0 : decay(size, size / 2));
  const tail = density * normalTailRatio(size);
  return x <= 0 ? tail : 1 - tail;
}
