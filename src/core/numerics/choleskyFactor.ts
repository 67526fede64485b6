/** A small square matrix by rows; of a symmetric one only the lower half is read unless the function says otherwise. */
export type Matrix = readonly (readonly number[])[];

/** Below this share of the diagonal entry a pivot is rounding (times the size of the matrix). */
const NEGLIGIBLE_PIVOT = 2 ** -52;

/**
 * The triangular square root of a symmetric positive definite matrix.
 *
 * Formula: A = L·Lᵀ, L lower triangular with a positive diagonal; row by row
 * Lᵢⱼ = (Aᵢⱼ − Σₖ Lᵢₖ·Lⱼₖ)/Lⱼⱼ for j < i and Lᵢᵢ = √(Aᵢᵢ − Σₖ Lᵢₖ²).
 * @param matrix symmetric, n by n; the lower half is read
 * @returns L with zeros above the diagonal, or null where A is not positive definite: a pivot Aᵢᵢ − Σₖ Lᵢₖ² at or below
 * n·2.2e-16·Aᵢᵢ, or an entry that is not finite
 * Outside: throws RangeError for a matrix that is not square.
 * Accuracy: L·Lᵀ differs from A by less than 1e-15·n·√(Aᵢᵢ·Aⱼⱼ) (tests/core/numerics/smallMatrix.test.ts).
 * Source: Cholesky's method, standard (Golub & Van Loan, Matrix Computations, section 4.2; from memory, unverified).
 * @example choleskyFactor([[4, 2], [2, 5]]) // [[2, 0], [1, 2]]
 */
export function choleskyFactor(matrix: Matrix): number[][] | null {
  const n = matrix.length;
  const factor: number[][] = [];
  for (let i = 0; i < n; i++) {
    const row = matrix[i]!;
    if (row.length !== n)
      throw new RangeError(`matrix: row ${i} has ${row.length} entries; a matrix of ${n} rows needs ${n}`);
    const made = new Array<number>(n).fill(0);
    for (let j = 0; j < i; j++) made[j] = (row[j]! - dotBelow(made, factor[j]!, j)) / factor[j]![j]!;
    const pivot = row[i]! - dotBelow(made, made, i);
    // Written so that NaN is refused too.
    if (!(pivot > n * NEGLIGIBLE_PIVOT * row[i]!) || pivot === Infinity) return null;
    made[i] = Math.sqrt(pivot);
    factor.push(made);
  }
  return factor;
}

function dotBelow(a: readonly number[], b: readonly number[], end: number): number {
  let sum = 0;
  for (let k = 0; k < end; k++) sum += a[k]! * b[k]!;
  return sum;
}
