import type { Matrix } from "./choleskyFactor.ts";
import { NewtonStep } from "./newtonStep.ts";
import { symmetricEigen } from "./symmetricEigen.ts";

/** Curvature below this share of the greatest counts as none: differences of a gradient give no better. */
const NO_CURVATURE = 1e-9;

/**
 * The largest relative slope: by what share of itself the value would change if one x changed by its own size.
 *
 * Formula: maxᵢ |gᵢ|·max(|xᵢ|, scaleᵢ)/max(|f|, 1).
 * @param gradient g
 * @param x where
 * @param value f there
 * @param scale size of a typical change of each x, above 0
 * @returns 0 or more, no unit
 * Outside: not checked.
 * Accuracy: rounding only.
 * Source: Dennis & Schnabel, Numerical Methods for Unconstrained Optimization, 1983, section 7.2 (from memory, unverified).
 * @example scaledGradient([1e-6], [2], 4, [1]) // 5e-7
 */
export function scaledGradient(
  gradient: readonly number[],
  x: readonly number[],
  value: number,
  scale: readonly number[],
): number {
  const size = Math.max(Math.abs(value), 1);
  let largest = 0;
  for (let i = 0; i < gradient.length; i++) {
    const each = (Math.abs(gradient[i]!) * Math.max(Math.abs(x[i]!), scale[i]!)) / size;
    // Written so that NaN stays.
    if (!(each <= largest)) largest = each;
  }
  return largest;
}

/**
 * How far a point with a small slope still is from the minimum, as a Newton step sees it.
 *
 * Formula: maxᵢ |pᵢ|/max(|xᵢ|, scaleᵢ), H·p = −g. Directions whose curvature is below 1e-9 of the greatest (H scaled to a unit
 * diagonal) are left out: the step along them is rounding.
 * @param hessian H
 * @param gradient g
 * @param x where
 * @param scale size of a typical change of each x, above 0
 * @param noSlope change of the value below which a slope over the size of x counts as none; a flat direction must be below it
 * @returns 0 or more; Infinity where a curvature is negative (a saddle or hilltop) or a flat direction has a slope
 * Outside: not checked.
 * Accuracy: that of H and g.
 * Source: written here.
 * @example minimumTest([[2]], [2e-9], [1], [1], 1e-8) // 1e-9
 */
export function minimumTest(
  hessian: Matrix,
  gradient: readonly number[],
  x: readonly number[],
  scale: readonly number[],
  noSlope: number,
): number {
  const size = x.map((each, i) => Math.max(Math.abs(each), scale[i]!));
  const unit = hessian.map((row, i) => (row[i] === 0 ? 1 / size[i]! : Math.sqrt(Math.abs(row[i]!))));
  // The diagonal is ±1, so no eigenvalue exceeds n in size; a product of them this large leaves none below the bound: all count.
  const newton = new NewtonStep(x.length);
  if (newton.factor(hessian, unit) && newton.determinant > NO_CURVATURE * x.length ** x.length) {
    newton.solve(gradient, unit);
    let farthest = 0;
    for (let i = 0; i < size.length; i++) {
      farthest = Math.max(farthest, Math.abs(newton.step[i]!) / unit[i]! / size[i]!);
    }
    return farthest;
  }
  const { values, vectors } = symmetricEigen(
    hessian.map((row, i) => row.map((entry, j) => entry / unit[i]! / unit[j]!)),
  );
  const greatest = Math.max(...values.map(Math.abs));
  if (greatest === 0 || values[0]! < -NO_CURVATURE * greatest) return Infinity;
  const step = x.map(() => 0);
  for (const [k, vector] of vectors.entries()) {
    const slope = vector.reduce((sum, each, i) => sum + (each * gradient[i]!) / unit[i]!, 0);
    if (values[k]! <= NO_CURVATURE * greatest) {
      const reach = Math.max(...size.map((each, i) => each * unit[i]!));
      if (Math.abs(slope) * reach > noSlope) return Infinity;
      continue;
    }
    for (const [i, each] of vector.entries()) step[i] = step[i]! - (slope / values[k]!) * (each / unit[i]!);
  }
  return Math.max(...step.map((each, i) => Math.abs(each) / size[i]!));
}
