import { choleskyFactor, type Matrix } from "./choleskyFactor.ts";

/**
 * The natural logarithm of the determinant of a symmetric positive definite matrix.
 *
 * Formula: ln det A = 2·Σ ln Lᵢᵢ, A = L·Lᵀ.
 * @param matrix symmetric, n by n; the lower half is read
 * @returns ln det A, or null where A is not positive definite (see choleskyFactor)
 * Outside: throws RangeError for a matrix that is not square. A determinant too large or small for a double does not matter.
 * Accuracy: absolute n·1e-15·condition of A scaled to a unit diagonal (tests/core/numerics/smallMatrix.test.ts).
 * Source: standard.
 * @example logDeterminant([[4, 2], [2, 5]]) // 2.772588722239781 = ln 16
 */
export function logDeterminant(matrix: Matrix): number | null {
  const factor = choleskyFactor(matrix);
  if (factor === null) return null;
  let sum = 0;
  for (let i = 0; i < factor.length; i++) sum += Math.log(factor[i]![i]!);
  return 2 * sum;
}
