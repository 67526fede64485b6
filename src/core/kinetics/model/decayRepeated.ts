/** Below it in size a series, above it a difference that loses less than a factor 8. */
const SERIES_BELOW = 1;
/** Terms for full precision at 1: 1/20! < 1e-18. */
const TERMS = 18;

/**
 * Two steps at one rate and a third at another: the chain of decays with a repeated.
 *
 * Formula: E(a, a, b; u) = (e^(−a·u)·((b − a)·u − 1) + e^(−b·u))/(b − a)²; near a = b u²·e^(−a·u)·Σ (−(b − a)·u)^m/(m + 2)!.
 * @param a per h, 0 or more
 * @param b per h, 0 or more
 * @param u h, 0 or more
 * @param leftA e^(−a·u)
 * @param leftB e^(−b·u)
 * @returns h², 0 or more
 * Outside: not checked.
 * Accuracy: relative 2e-15 of the larger of the two decays × u² (tests/core/kinetics/model/decayRepeated.test.ts).
 * Source: decayChain, the usual case apart: every level of a fit needs several.
 * @example decayRepeated(1, 1, 1, Math.exp(-1), Math.exp(-1)) // 0.18393972058572117 = 1/(2e)
 */
export function decayRepeated(a: number, b: number, u: number, leftA: number, leftB: number): number {
  const gap = b - a;
  const x = gap * u;
  if (x > SERIES_BELOW || x < -SERIES_BELOW) return (leftA * (x - 1) + leftB) / gap / gap;
  let sum = 1;
  for (let m = TERMS; m >= 1; m--) sum = 1 - (x / (m + 2)) * sum;
  return (u * u * leftA * sum) / 2;
}
