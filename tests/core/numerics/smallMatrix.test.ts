import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  choleskyFactor,
  choleskySolve,
  logDeterminant,
  symmetricEigen,
  symmetricInverse,
} from "../../../src/core/numerics/index.ts";

/** Hilbert's matrix, of known inverse and determinant, condition 5e5 at n = 5. */
const hilbert = (n: number) =>
  Array.from({ length: n }, (_, i) => Array.from({ length: n }, (_, j) => 1 / (i + j + 1)));
/** Its exact inverse (entries are whole numbers: standard result). */
const HILBERT_4_INVERSE = [
  [16, -120, 240, -140],
  [-120, 1200, -2700, 1680],
  [240, -2700, 6480, -4200],
  [-140, 1680, -4200, 2800],
];
const NOT_DEFINITE: readonly (readonly (readonly number[])[])[] = [
  [[0]],
  [[-1]],
  [
    [1, 2],
    [2, 1],
  ],
  [
    [1, 1],
    [1, 1],
  ],
  [
    [1, 1],
    [1, 1 + 2 ** -52],
  ],
  [[Number.NaN]],
  [[Infinity]],
  [
    [1, 0],
    [Number.NaN, 1],
  ],
  [
    [0, 0],
    [0, 0],
  ],
];

describe("examples", () => {
  it("the ones of the docstrings", () => {
    const matrix = [
      [4, 2],
      [2, 5],
    ];
    expect(choleskyFactor(matrix)).toEqual([
      [2, 0],
      [1, 2],
    ]);
    expect(
      choleskySolve(
        [
          [2, 0],
          [1, 2],
        ],
        [8, 12],
      ),
    ).toEqual([1, 2]);
    expect(symmetricInverse(matrix)).toEqual([
      [0.3125, -0.125],
      [-0.125, 0.25],
    ]);
    // 1 unit in the last place.
    expect(Math.abs(logDeterminant(matrix)! - Math.log(16))).toBeLessThanOrEqual(4.5e-16);
  });

  it("one by one, and diagonal", () => {
    expect(choleskyFactor([[9]])).toEqual([[3]]);
    expect(
      symmetricInverse([
        [4, 0],
        [0, 0.25],
      ]),
    ).toEqual([
      [0.25, 0],
      [0, 4],
    ]);
  });

  it("the inverse of Hilbert's 4 by 4: relative 1e-12, its condition being 1.6e4", () => {
    const found = symmetricInverse(hilbert(4))!;
    for (const [i, row] of HILBERT_4_INVERSE.entries()) {
      for (const [j, wanted] of row.entries()) expect(Math.abs(found[i]![j]! / wanted - 1)).toBeLessThanOrEqual(1e-12);
    }
  });

  it("ln det of Hilbert's 4 by 4 is −ln 6048000: absolute 1e-12; and of one whose determinant is no double", () => {
    expect(Math.abs(logDeterminant(hilbert(4))! + Math.log(6_048_000))).toBeLessThanOrEqual(1e-12);
    const tiny = [
      [1e-200, 0],
      [0, 1e-200],
    ];
    expect(Math.abs(logDeterminant(tiny)! / (400 * -Math.LN10) - 1)).toBeLessThanOrEqual(1e-15);
  });
});

describe("what is not positive definite is null, never NaN", () => {
  it.each(NOT_DEFINITE)("%j %j", (...matrix) => {
    expect(choleskyFactor(matrix)).toBeNull();
    expect(symmetricInverse(matrix)).toBeNull();
    expect(logDeterminant(matrix)).toBeNull();
  });

  it("another shape is a mistake", () => {
    expect(() => choleskyFactor([[1, 2]])).toThrow(/row 0 has 2 entries/);
    expect(() => choleskySolve([[1]], [1, 2])).toThrow(/right: 2 numbers/);
    expect(() => symmetricEigen([[1, 2]])).toThrow(RangeError);
    expect(() => symmetricEigen([[Number.NaN]])).toThrow(/not finite/);
  });
});

const size = fc.integer({ min: 1, max: 6 });
const numbers = fc.array(
  fc.integer({ min: -1000, max: 1000 }).map((each) => each / 1000),
  { minLength: 36, maxLength: 36 },
);
const square = (n: number, all: readonly number[]) =>
  Array.from({ length: n }, (_, i) => Array.from({ length: n }, (_, j) => all[6 * i + j]!));

it("random matrices of 1 to 6: L·Lᵀ is the matrix, the solution solves, the inverse inverts, ln det is Σ ln λ", () => {
  fc.assert(
    fc.property(size, numbers, (n, all) => {
      const half = square(n, all);
      // Bᵀ·B + 0.1·I: positive definite, condition below 400.
      const matrix = half.map((_, i) =>
        half.map((_, j) => half.reduce((sum, row) => sum + row[i]! * row[j]!, i === j ? 0.1 : 0)),
      );
      const factor = choleskyFactor(matrix)!;
      const inverse = symmetricInverse(matrix)!;
      const x = choleskySolve(factor, all.slice(0, n));
      let worst = 0;
      for (let i = 0; i < n; i++) {
        let product = 0;
        for (let j = 0; j < n; j++) {
          product += matrix[i]![j]! * x[j]!;
          let root = 0;
          let one = 0;
          for (let k = 0; k < n; k++) {
            root += factor[i]![k]! * factor[j]![k]!;
            one += matrix[i]![k]! * inverse[k]![j]!;
          }
          worst = Math.max(worst, Math.abs(root - matrix[i]![j]!), Math.abs(one - (i === j ? 1 : 0)) / 100);
          if (inverse[i]![j] !== inverse[j]![i] || (j > i && factor[i]![j] !== 0)) return false;
        }
        worst = Math.max(worst, Math.abs(product - all[i]!) / 100);
      }
      const { values } = symmetricEigen(matrix);
      const logs = values.reduce((sum, each) => sum + Math.log(each), 0);
      return worst <= 5e-15 && Math.abs(logDeterminant(matrix)! - logs) <= 1e-12;
    }),
    { seed: 42, numRuns: 300 },
  );
});

describe("symmetricEigen", () => {
  it("examples", () => {
    const { values, vectors } = symmetricEigen([
      [2, 1],
      [1, 2],
    ]);
    // 1e-15: roundings.
    expect(Math.abs(values[0]! - 1)).toBeLessThanOrEqual(1e-15);
    expect(Math.abs(values[1]! - 3)).toBeLessThanOrEqual(1e-15);
    expect(Math.abs(vectors[0]![0]! + vectors[0]![1]!)).toBeLessThanOrEqual(1e-15);
    expect(symmetricEigen([[7]])).toEqual({ values: [7], vectors: [[1]] });
    expect(
      symmetricEigen([
        [0, 0],
        [0, 0],
      ]).values,
    ).toEqual([0, 0]);
  });

  it("random matrices of 1 to 6: Σ λ·v·vᵀ is the matrix and the vectors are orthonormal, 1e-14; values ascend", () => {
    fc.assert(
      fc.property(size, numbers, (n, all) => {
        const half = square(n, all);
        const matrix = half.map((row, i) => row.map((each, j) => each + half[j]![i]!));
        const { values, vectors } = symmetricEigen(matrix);
        for (let i = 0; i < n; i++) {
          for (let j = 0; j < n; j++) {
            let sum = 0;
            let inner = 0;
            for (let k = 0; k < n; k++) {
              sum += values[k]! * vectors[k]![i]! * vectors[k]![j]!;
              inner += vectors[i]![k]! * vectors[j]![k]!;
            }
            if (Math.abs(sum - matrix[i]![j]!) > 1e-14 || Math.abs(inner - (i === j ? 1 : 0)) > 1e-14) return false;
          }
        }
        return values.every((each, k) => k === 0 || each >= values[k - 1]!);
      }),
      { seed: 7, numRuns: 300 },
    );
  });
});
