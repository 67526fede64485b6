import type { Matrix } from "./choleskyFactor.ts";

export interface SymmetricEigen {
  /** Ascending. */
  readonly values: number[];
  /** `vectors[k]` is the unit vector of `values[k]`. */
  readonly vectors: number[][];
}

/** Jacobi's method squares the off-diagonal part with every sweep; 5 or 6 are the rule. */
const MOST_SWEEPS = 60;

/**
 * The eigenvalues and eigenvectors of a small symmetric matrix.
 *
 * Formula: A = Σ λₖ·vₖ·vₖᵀ; rotations of two coordinates at a time, each making one off-diagonal entry 0, until none changes the
 * diagonal any more.
 * @param matrix symmetric, n by n, finite; the lower half is read. Meant for n up to about 10: the work grows as n³ a sweep
 * @returns values ascending with their vectors
 * Outside: throws RangeError for a matrix that is not square or not finite.
 * Accuracy: each value to 1e-15·n·largest |λ|; vectors orthonormal to 1e-15·n (tests/core/numerics/symmetricEigen.test.ts).
 * Source: Jacobi's cyclic method (Golub & Van Loan, Matrix Computations, section 8.5; from memory, unverified).
 * @example symmetricEigen([[2, 1], [1, 2]]).values // [1, 3]
 */
export function symmetricEigen(matrix: Matrix): SymmetricEigen {
  const n = matrix.length;
  const a = matrix.map((row, i) => {
    if (row.length !== n)
      throw new RangeError(`matrix: row ${i} has ${row.length} entries; a matrix of ${n} rows needs ${n}`);
    return row.map((entry, j) => (j <= i ? entry : matrix[j]![i]!));
  });
  if (!a.flat().every(Number.isFinite)) throw new RangeError("matrix: an entry is not finite");
  const v = a.map((_, i) => a.map((_, j) => (i === j ? 1 : 0)));
  for (let sweep = 0; sweep < MOST_SWEEPS; sweep++) {
    let isChanged = false;
    for (let p = 0; p < n - 1; p++) {
      for (let q = p + 1; q < n; q++) {
        if (rotateAway(a, v, p, q)) isChanged = true;
      }
    }
    if (!isChanged) break;
  }
  const order = a.map((_, i) => i).sort((i, j) => a[i]![i]! - a[j]![j]!);
  return { values: order.map((i) => a[i]![i]!), vectors: order.map((i) => v.map((row) => row[i]!)) };
}

/** Makes a[p][q] 0 by turning coordinates p and q; false where that entry no longer counts. */
function rotateAway(a: number[][], v: number[][], p: number, q: number): boolean {
  const off = a[p]![q]!;
  if (off === 0) return false;
  const pp = a[p]![p]!;
  const qq = a[q]![q]!;
  const weight = Math.abs(off);
  if (Math.abs(pp) + weight === Math.abs(pp) && Math.abs(qq) + weight === Math.abs(qq)) {
    a[p]![q] = 0;
    a[q]![p] = 0;
    return false;
  }
  const half = (qq - pp) / (2 * off);
  const tangent = (half >= 0 ? 1 : -1) / (Math.abs(half) + Math.hypot(half, 1));
  const cosine = 1 / Math.hypot(tangent, 1);
  const sine = tangent * cosine;
  for (let k = 0; k < a.length; k++) {
    const kp = a[k]![p]!;
    const kq = a[k]![q]!;
    a[k]![p] = cosine * kp - sine * kq;
    a[k]![q] = sine * kp + cosine * kq;
  }
  for (let k = 0; k < a.length; k++) {
    const pk = a[p]![k]!;
    const qk = a[q]![k]!;
    a[p]![k] = cosine * pk - sine * qk;
    a[q]![k] = sine * pk + cosine * qk;
  }
  a[p]![p] = pp - tangent * off;
  a[q]![q] = qq + tangent * off;
  a[p]![q] = 0;
  a[q]![p] = 0;
  for (const row of v) {
    const vp = row[p]!;
    const vq = row[q]!;
    row[p] = cosine * vp - sine * vq;
    row[q] = sine * vp + cosine * vq;
  }
  return true;
}
