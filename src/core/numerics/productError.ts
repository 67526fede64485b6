/** 2^27 + 1: Dekker's constant, splits a double into two halves of 26 bits. */
const SPLITTER = 134_217_729;
/** Above this the splitting itself would overflow. */
const LARGEST_SPLIT = 2 ** 990;

/**
 * What rounding took from a product.
 *
 * Formula: a·b − p, exactly, where p is the rounded product `a * b`.
 * @param a any finite number
 * @param b any finite number
 * @param p `a * b` as computed
 * @returns the exact remainder, |remainder| <= half a unit in the last place of p
 * Outside: 0 (no correction) when a factor is beyond 2^990, where splitting would overflow.
 * Accuracy: exact unless the remainder falls below the smallest double.
 * Source: Dekker, A floating-point technique for extending the available precision, Numer. Math. 18 (1971) 224–242
 * (from memory, unverified).
 * @example productError(0.1, 10, 1) // 5.551115123125783e-17
 */
export function productError(a: number, b: number, p: number): number {
  if (Math.abs(a) > LARGEST_SPLIT || Math.abs(b) > LARGEST_SPLIT) return 0;
  const aScaled = SPLITTER * a;
  const aHigh = aScaled - (aScaled - a);
  const aLow = a - aHigh;
  const bScaled = SPLITTER * b;
  const bHigh = bScaled - (bScaled - b);
  const bLow = b - bHigh;
  return aLow * bLow - (p - aHigh * bHigh - aLow * bHigh - aHigh * bLow);
}
