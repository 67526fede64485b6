import { choleskyFactor, type Matrix } from "./choleskyFactor.ts";
import { choleskySolve } from "./choleskySolve.ts";

/**
 * The inverse of a symmetric positive definite matrix.
 *
 * Formula: column j solves A·x = eⱼ (choleskySolve); the halves are then averaged, so the result is symmetric to the bit.
 * @param matrix symmetric, n by n; the lower half is read
 * @returns A⁻¹, or null where A is not positive definite (see choleskyFactor)
 * Outside: throws RangeError for a matrix that is not square.
 * Accuracy: A·A⁻¹ differs from the identity by less than n·1e-15·condition of A scaled to a unit diagonal
 * (tests/core/numerics/smallMatrix.test.ts).
 * Source: standard.
 * @example symmetricInverse([[4, 2], [2, 5]]) // [[0.3125, -0.125], [-0.125, 0.25]]
 */
export function symmetricInverse(matrix: Matrix): number[][] | null {
  const factor = choleskyFactor(matrix);
  if (factor === null) return null;
  const columns = matrix.map((_, j) =>
    choleskySolve(
      factor,
      matrix.map((_, i) => (i === j ? 1 : 0)),
    ),
  );
  return columns.map((column, i) => column.map((entry, j) => (entry + columns[j]![i]!) / 2));
}
