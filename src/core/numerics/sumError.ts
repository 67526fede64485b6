/**
 * What rounding took from a sum.
 *
 * Formula: a + b − s, exactly, where s is the rounded sum `a + b`.
 * @param a any finite number
 * @param b any finite number
 * @param s `a + b` as computed
 * @returns the exact remainder, |remainder| <= half a unit in the last place of s
 * Outside: meaningless when the sum overflows.
 * Accuracy: exact.
 * Source: Knuth's two-sum, The Art of Computer Programming vol. 2, section 4.2.2 (from memory, unverified).
 * @example sumError(1, 1e-17, 1) // 1e-17
 */
export function sumError(a: number, b: number, s: number): number {
  const bPart = s - a;
  return a - (s - bPart) + (b - bPart);
}
