import { rootBracketed } from "./rootBracketed.ts";
import type { SymmetricEigen } from "./symmetricEigen.ts";

/** Components of the slope below this share of the largest count as none: the "hard case" of the method. */
const NO_SLOPE = 1e-14;

export interface TrustRegionStep {
  readonly step: number[];
  /** By how much the model falls, 0 or more. */
  readonly predicted: number;
  /** Whether the step was cut by the radius. */
  readonly isCut: boolean;
}

/**
 * The step that makes a quadratic model smallest within a given length.
 *
 * Formula: minimise g·p + ½ pᵀHp over ‖p‖ <= radius: p = −Σ aₖ/(λₖ + μ)·vₖ, aₖ = vₖ·g, with μ = 0 where H is positive definite
 * and that p is short enough, else the μ > max(0, −λ₁) that makes ‖p‖ = radius. Where g has no part along the direction of
 * negative curvature (a saddle), the length that is left is walked along it.
 * @param eigen of H, ascending
 * @param gradient g
 * @param radius above 0
 * @returns the step, the fall the model promises, and whether it was cut
 * Outside: not checked; eigenvalues and slopes whose squares are below the smallest double are not meant. A step of 0 only where g is 0 and H has no negative eigenvalue.
 * Accuracy: ‖p‖ = radius to 1e-12 where cut (tests/core/numerics/trustRegionStep.test.ts).
 * Source: Moré & Sorensen, Computing a trust region step, SIAM J. Sci. Stat. Comput. 4 (1983) 553–572 (from memory, unverified).
 * @example trustRegionStep(symmetricEigen([[2, 0], [0, 4]]), [-2, -4], 10).step // [1, 1]
 */
export function trustRegionStep(eigen: SymmetricEigen, gradient: readonly number[], radius: number): TrustRegionStep {
  const { values, vectors } = eigen;
  const slopes = vectors.map((vector) => dot(vector, gradient));
  const steepest = Math.max(...slopes.map(Math.abs));
  const lowest = values[0]!;
  const floor = Math.max(0, -lowest);
  const at = (mu: number) =>
    slopes.map((slope, k) => (Math.abs(slope) <= NO_SLOPE * steepest ? 0 : -slope / (values[k]! + mu)));

  let parts = at(floor);
  const length = Math.hypot(...parts);
  let isCut = false;
  if (!(length <= radius)) {
    const excess = (mu: number) => 1 / radius - 1 / Math.hypot(...at(mu));
    const slope = (mu: number) => {
      const found = at(mu);
      const bend = found.reduce((sum, part, k) => sum + (part * part) / (values[k]! + mu), 0);
      return -bend / Math.hypot(...found) ** 3;
    };
    const high = floor + Math.hypot(...slopes) / radius;
    parts = at(rootBracketed(excess, slope, floor, high, high, 1e-13 * high).root);
    const stretch = radius / Math.hypot(...parts);
    parts = parts.map((part) => part * stretch);
    isCut = true;
  } else if (lowest < 0) {
    // Either sense falls alike; which one is a convention.
    parts = [parts[0]! + Math.sqrt(radius * radius - length * length), ...parts.slice(1)];
    isCut = true;
  }
  const step = gradient.map((_, i) => parts.reduce((sum, part, k) => sum + part * vectors[k]![i]!, 0));
  const predicted = parts.reduce((sum, part, k) => sum - part * (slopes[k]! + (values[k]! * part) / 2), 0);
  return { step, predicted: Math.max(0, predicted), isCut };
}

function dot(a: readonly number[], b: readonly number[]): number {
  return a.reduce((sum, entry, i) => sum + entry * b[i]!, 0);
}
