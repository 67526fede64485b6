import type { Matrix } from "./choleskyFactor.ts";
import { hessianByDifferences } from "./hessianByDifferences.ts";
import { minimumTest, scaledGradient } from "./minimumTest.ts";
import { NewtonStep } from "./newtonStep.ts";
import { type SymmetricEigen, symmetricEigen } from "./symmetricEigen.ts";
import { trustRegionStep } from "./trustRegionStep.ts";

type Point = readonly number[];

export interface MinimiseOptions {
  /** Size of a typical change of each x, above 0. Default 1 each. */
  readonly scale?: readonly number[];
  /** Largest |gᵢ|·max(|xᵢ|, scaleᵢ)/max(|f|, 1) at a minimum. Default 1e-8. */
  readonly gradientTolerance?: number;
  /** Largest |step i|/max(|xᵢ|, scaleᵢ) of the Newton step still to go at a minimum. Default 1e-8. */
  readonly stepTolerance?: number;
  /** Default 200. */
  readonly mostIterations?: number;
  /** Length of the first step at most, in units of max(|xᵢ|, scaleᵢ). Default 1. */
  readonly firstRadius?: number;
}

export interface MinimiseProblem {
  /** The objective; NaN or Infinity where it has none. */
  readonly value: (x: Point) => number;
  readonly gradient: (x: Point) => readonly number[];
  readonly start: Point;
  /** Second derivatives, or an approximation of them; absent: differences of the gradient. */
  readonly hessian?: (x: Point) => Matrix;
  readonly options?: MinimiseOptions;
}

/**
 * Why it ended. "minimum": both tests passed and the curvature is nowhere negative. "no-descent": no step lowers the value any
 * more, though the tests are not passed. "flat": no slope and no curvature at all. "not-finite": value or gradient at the start, or
 * the second derivatives on the way, are not numbers.
 */
export type MinimiseEnd = "minimum" | "most-iterations" | "no-descent" | "flat" | "not-finite";

export interface Minimum {
  readonly status: "converged" | "not-converged";
  readonly end: MinimiseEnd;
  readonly x: number[];
  readonly value: number;
  /** Euclidean length of the gradient at x. */
  readonly gradientNorm: number;
  /** At x. Empty where it could not be had. */
  readonly hessian: number[][];
  readonly iterations: number;
  /** Calls of `value`. */
  readonly evaluations: number;
  /** Calls of `gradient`, those for differences included. */
  readonly gradientEvaluations: number;
}

const TOLERANCE = 1e-8;
const MOST_ITERATIONS = 200;
/** A step is taken when it brings this share of the fall promised; the radius shrinks below the second and grows above the third. */
const TAKEN_FROM = 1e-4;
const POOR = 0.25;
const GOOD = 0.75;
/** Falls below this many roundings of the value cannot be seen in it. */
const UNSEEN = 16 * 2 ** -52;
const SMALLEST_RADIUS = 1e-14;

/**
 * A local minimum of a smooth function of a few variables.
 *
 * Formula: Newton steps in a trust region: p minimises g·p + ½ pᵀHp over ‖D·p‖ <= radius (trustRegionStep), Dᵢ the largest
 * √|Hᵢᵢ| met so far; by Cholesky's method where H is positive definite (newtonStep). The radius is divided by 4 when less than a quarter of the promised fall came, or a value that is not finite,
 * and doubled when more than three quarters did at its edge. Saddles and hilltops are left along the direction of negative
 * curvature. Falls too small to be seen in the value are judged by the gradient.
 * @param problem value, gradient, start (1 to about 10 variables), second derivatives if known, options; see MinimiseProblem.
 * An approximate `hessian` (JᵀJ of a sum of squares) is allowed: slower at the end, and a saddle it hides is not recognised
 * @returns see Minimum. Converged means: scaled gradient and remaining Newton step both within their tolerances, and no
 * curvature negative (minimumTest). A valley flat in some direction may converge to any of its points; then choleskyFactor of the
 * returned Hessian is null
 * Outside: "not-converged" with the best point met and the reason in `end`. Throws RangeError for an empty start, a start or scale
 * of another size, or a tolerance or scale that is not above 0.
 * Accuracy: x to stepTolerance, mostly to its square (convergence is quadratic); no better than the rounding of the gradient over
 * the curvature
 * (tests/core/numerics/minimise.test.ts, tests/outside/theophLeastSquares.test.ts: 1e-9 in the parameters).
 * Source: trust-region Newton method: Moré & Sorensen 1983 (see trustRegionStep); scaling by the largest diagonal: Moré, The
 * Levenberg–Marquardt algorithm, in Numerical Analysis, ed. Watson, 1978, 105–116 (both from memory, unverified); written here.
 * @example minimise({ value: ([x]) => (x! - 3) ** 2, gradient: ([x]) => [2 * (x! - 3)], start: [0] }).x // [3]
 */
export function minimise(problem: MinimiseProblem): Minimum {
  const { options = {} } = problem;
  const { gradientTolerance = TOLERANCE, stepTolerance = TOLERANCE, mostIterations = MOST_ITERATIONS } = options;
  const scale = options.scale ?? problem.start.map(() => 1);
  checkArguments(problem.start, scale, { gradientTolerance, stepTolerance });

  const count = problem.start.length;
  const newton = new NewtonStep(count);
  let evaluations = 0;
  let gradientEvaluations = 0;
  const valueAt = (x: Point) => {
    evaluations++;
    return problem.value(x);
  };
  const gradientAt = (x: Point) => {
    gradientEvaluations++;
    return problem.gradient(x);
  };
  const hessianAt = (x: Point): Matrix | null => {
    const found = problem.hessian ? problem.hessian(x) : hessianByDifferences(gradientAt, x, scale);
    return found !== null && isFiniteMatrix(found) ? found : null;
  };

  let x: Point = [...problem.start];
  let value = valueAt(x);
  let gradient: Point = gradientAt(x);
  let hessian: Matrix | null = null;
  let iterations = 0;
  const result = (end: MinimiseEnd): Minimum => ({
    status: end === "minimum" ? "converged" : "not-converged",
    end,
    x: [...x],
    value,
    gradientNorm: Math.hypot(...gradient),
    hessian: hessian?.map((row) => [...row]) ?? [],
    iterations,
    evaluations,
    gradientEvaluations,
  });
  if (!Number.isFinite(value) || !isFiniteRow(gradient)) return result("not-finite");

  const shape = new Float64Array(count);
  const unit = new Float64Array(count);
  const slope = new Array<number>(count).fill(0);
  /** Length of x in the variables of even curvature. */
  const reach = () => {
    let sum = 0;
    for (let i = 0; i < count; i++) sum += (unit[i]! * Math.max(Math.abs(x[i]!), scale[i]!)) ** 2;
    return Math.sqrt(sum);
  };
  let radius = 0;
  for (; ; iterations++) {
    // 1. What the surface looks like here, and whether this is the place.
    hessian = hessianAt(x);
    if (hessian === null) return result("not-finite");
    const curvature: Matrix = hessian;
    if (gradient.every((entry) => entry === 0) && curvature.every((row) => row.every((entry) => entry === 0))) {
      return result("flat");
    }
    if (scaledGradient(gradient, x, value, scale) <= gradientTolerance) {
      const noSlope = gradientTolerance * Math.max(Math.abs(value), 1);
      if (minimumTest(curvature, gradient, x, scale, noSlope) <= stepTolerance) return result("minimum");
    }
    if (iterations >= mostIterations) return result("most-iterations");

    // 2. The model in variables of even curvature.
    let steepness = 0;
    for (let i = 0; i < count; i++) {
      shape[i] = Math.max(shape[i]!, Math.sqrt(Math.abs(curvature[i]![i]!)));
      unit[i] = shape[i]! > 0 ? shape[i]! : 1 / scale[i]!;
      slope[i] = gradient[i]! / unit[i]!;
      steepness += slope[i]! * slope[i]!;
    }
    if (iterations === 0) radius = (options.firstRadius ?? 1) * reach();
    // By Cholesky's method where the surface is a bowl; what costs several times as much only where it is none.
    const isBowl = newton.factor(curvature, unit);
    if (isBowl) newton.solve(gradient, unit);
    let eigen: SymmetricEigen | null = null;

    // 3. Shorter and shorter steps until one lowers the value.
    let isTaken = false;
    while (!isTaken) {
      let found: { readonly step: ArrayLike<number>; readonly predicted: number; readonly isCut: boolean };
      if (isBowl) {
        const isCut = !(newton.length <= radius);
        if (isCut) newton.cut(curvature, gradient, unit, radius);
        found = { step: newton.step, predicted: newton.predicted, isCut };
      } else {
        eigen ??= symmetricEigen(curvature.map((row, i) => row.map((entry, j) => entry / unit[i]! / unit[j]!)));
        found = trustRegionStep(eigen, slope, radius);
      }
      const { step, predicted, isCut } = found;
      const next = new Array<number>(count);
      let isSame = true;
      let squares = 0;
      for (let i = 0; i < count; i++) {
        next[i] = x[i]! + step[i]! / unit[i]!;
        if (next[i] !== x[i]) isSame = false;
        squares += step[i]! * step[i]!;
      }
      if (isSame) return result("no-descent");
      const length = Math.sqrt(squares);
      const nextValue = valueAt(next);
      const isUnseen = predicted <= UNSEEN * Math.max(Math.abs(value), 2 ** -1000);
      const fall = value - nextValue;
      const share = isUnseen ? 1 : fall / predicted;
      let nextGradient: Point | null = null;
      if (Number.isFinite(nextValue) && share >= TAKEN_FROM) {
        nextGradient = gradientAt(next);
        const isNumber = isFiniteRow(nextGradient);
        if (isUnseen && isNumber) {
          let nextSteepness = 0;
          for (let i = 0; i < count; i++) nextSteepness += (nextGradient[i]! / unit[i]!) ** 2;
          if (nextSteepness >= steepness) return result("no-descent");
        }
        isTaken = isNumber;
      }
      if (!isTaken) {
        radius = Math.min(radius, length) / 4;
        if (radius <= SMALLEST_RADIUS * reach()) return result("no-descent");
      } else {
        if (share < POOR) radius = length / 4;
        else if (share > GOOD && isCut) radius *= 2;
        x = next;
        value = nextValue;
        gradient = nextGradient!;
      }
    }
  }
}

function isFiniteRow(row: Point): boolean {
  for (let i = 0; i < row.length; i++) if (!Number.isFinite(row[i]!)) return false;
  return true;
}

function isFiniteMatrix(matrix: Matrix): boolean {
  for (let i = 0; i < matrix.length; i++) if (!isFiniteRow(matrix[i]!)) return false;
  return true;
}

function checkArguments(start: Point, scale: Point, tolerances: Readonly<Record<string, number>>): void {
  if (start.length === 0) throw new RangeError("start: at least one variable is needed");
  if (scale.length !== start.length)
    throw new RangeError(`scale: ${scale.length} numbers for ${start.length} variables`);
  scale.forEach((each, i) => {
    if (!(each > 0)) throw new RangeError(`scale[${i}]: ${each}; must be above 0`);
  });
  for (const [name, each] of Object.entries(tolerances)) {
    if (!(each > 0)) throw new RangeError(`${name}: ${each}; must be above 0`);
  }
}
