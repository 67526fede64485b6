import type { Matrix } from "./choleskyFactor.ts";

/**
 * The solution of a linear system whose matrix is given by its triangular square root.
 *
 * Formula: A·x = b with A = L·Lᵀ: L·y = b from the top, Lᵀ·x = y from the bottom.
 * @param factor L as choleskyFactor gives it, n by n
 * @param right b, n numbers
 * @returns x
 * Outside: throws RangeError when the sizes differ.
 * Accuracy: A·x differs from b by less than n·1e-15·Σⱼ |Aᵢⱼ·xⱼ| (tests/core/numerics/smallMatrix.test.ts).
 * Source: forward and back substitution, standard.
 * @example choleskySolve([[2, 0], [1, 2]], [8, 12]) // [1, 2]
 */
export function choleskySolve(factor: Matrix, right: readonly number[]): number[] {
  const n = factor.length;
  if (right.length !== n) throw new RangeError(`right: ${right.length} numbers; a factor of ${n} rows needs ${n}`);
  const x = [...right];
  for (let i = 0; i < n; i++) {
    let sum = x[i]!;
    for (let k = 0; k < i; k++) sum -= factor[i]![k]! * x[k]!;
    x[i] = sum / factor[i]![i]!;
  }
  for (let i = n - 1; i >= 0; i--) {
    let sum = x[i]!;
    for (let k = i + 1; k < n; k++) sum -= factor[k]![i]! * x[k]!;
    x[i] = sum / factor[i]![i]!;
  }
  return x;
}
