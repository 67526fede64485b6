/**
 * Standard test functions of minimisation with their standard starts: Moré, Garbow & Hillstrom, Testing unconstrained optimization
 * software, ACM Trans. Math. Softw. 7 (1981) 17–41 (numbers in brackets; from memory, minima checked by the tests).
 */
export interface StandardProblem {
  readonly name: string;
  readonly value: (x: readonly number[]) => number;
  readonly gradient: (x: readonly number[]) => number[];
  readonly start: readonly number[];
  /** Any of these is right. */
  readonly minimum: readonly (readonly number[])[];
  /** Of each x over max(1, |x|). */
  readonly tolerance: number;
}

/** Ten times the standard start of these leads into a valley that falls for ever (x to −∞ and y to ∞): no minimum is there. */
export const VALLEY_WITHOUT_END: readonly string[] = ["Beale (5)", "Powell badly scaled (3)"];

type Residuals = (x: readonly number[]) => { r: number[]; jacobian: number[][] };

/** Σ r² and 2·Jᵀr. */
function sumOfSquares(
  name: string,
  residuals: Residuals,
  start: readonly number[],
  minimum: readonly (readonly number[])[],
  tolerance: number,
): StandardProblem {
  return {
    name,
    value: (x) => residuals(x).r.reduce((sum, each) => sum + each * each, 0),
    gradient: (x) => {
      const { r, jacobian } = residuals(x);
      return x.map((_, j) => 2 * r.reduce((sum, each, i) => sum + each * jacobian[i]![j]!, 0));
    },
    start,
    minimum,
    tolerance,
  };
}

const BEALE = [1.5, 2.25, 2.625];

export const STANDARD_PROBLEMS: readonly StandardProblem[] = [
  sumOfSquares(
    "Rosenbrock (1)",
    ([x = 0, y = 0]) => ({
      r: [10 * (y - x * x), 1 - x],
      jacobian: [
        [-20 * x, 10],
        [-1, 0],
      ],
    }),
    [-1.2, 1],
    [[1, 1]],
    1e-9,
  ),
  sumOfSquares(
    "Powell badly scaled (3)",
    ([x = 0, y = 0]) => ({
      r: [1e4 * x * y - 1, Math.exp(-x) + Math.exp(-y) - 1.0001],
      jacobian: [
        [1e4 * y, 1e4 * x],
        [-Math.exp(-x), -Math.exp(-y)],
      ],
    }),
    [0, 1],
    // Symmetric in x and y; the values are the root of both residuals, as published to 10 figures.
    [
      [1.09815932969759e-5, 9.10614673986524],
      [9.10614673986524, 1.09815932969759e-5],
    ],
    1e-7,
  ),
  sumOfSquares(
    "Brown badly scaled (4)",
    ([x = 0, y = 0]) => ({
      r: [x - 1e6, y - 2e-6, x * y - 2],
      jacobian: [
        [1, 0],
        [0, 1],
        [y, x],
      ],
    }),
    [1, 1],
    [[1e6, 2e-6]],
    1e-12,
  ),
  sumOfSquares(
    "Beale (5)",
    ([x = 0, y = 0]) => ({
      r: BEALE.map((c, i) => c - x * (1 - y ** (i + 1))),
      jacobian: BEALE.map((_, i) => [-(1 - y ** (i + 1)), x * (i + 1) * y ** i]),
    }),
    [1, 1],
    [[3, 0.5]],
    1e-9,
  ),
  sumOfSquares(
    "Powell singular (13)",
    ([a = 0, b = 0, c = 0, d = 0]) => ({
      r: [a + 10 * b, Math.sqrt(5) * (c - d), (b - 2 * c) ** 2, Math.sqrt(10) * (a - d) ** 2],
      jacobian: [
        [1, 10, 0, 0],
        [0, 0, Math.sqrt(5), -Math.sqrt(5)],
        [0, 2 * (b - 2 * c), -4 * (b - 2 * c), 0],
        [2 * Math.sqrt(10) * (a - d), 0, 0, -2 * Math.sqrt(10) * (a - d)],
      ],
    }),
    [3, -1, 0, 1],
    [[0, 0, 0, 0]],
    // The fourth power is flat: a slope of 1e-8 is reached at x of 1e-3.
    5e-3,
  ),
  sumOfSquares(
    "Wood (14)",
    ([a = 0, b = 0, c = 0, d = 0]) => ({
      r: [
        10 * (b - a * a),
        1 - a,
        Math.sqrt(90) * (d - c * c),
        1 - c,
        Math.sqrt(10) * (b + d - 2),
        (b - d) / Math.sqrt(10),
      ],
      jacobian: [
        [-20 * a, 10, 0, 0],
        [-1, 0, 0, 0],
        [0, 0, -2 * Math.sqrt(90) * c, Math.sqrt(90)],
        [0, 0, -1, 0],
        [0, Math.sqrt(10), 0, Math.sqrt(10)],
        [0, 1 / Math.sqrt(10), 0, -1 / Math.sqrt(10)],
      ],
    }),
    [-3, -1, -3, -1],
    [[1, 1, 1, 1]],
    1e-9,
  ),
];
