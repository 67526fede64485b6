import { describe, expect, test } from "vitest";
import { seededRandom, symmetricEigen } from "../../../src/core/numerics/index.ts";
import { NewtonStep } from "../../../src/core/numerics/newtonStep.ts";
import { trustRegionStep } from "../../../src/core/numerics/trustRegionStep.ts";

const scaled = (h: readonly (readonly number[])[], unit: readonly number[]) =>
  h.map((row, i) => row.map((each, j) => each / unit[i]! / unit[j]!));

describe("Newton's step by Cholesky's method", () => {
  test("200 random bowls of 1 to 6 variables: the step of trustRegionStep, whole to 1e-9; cut within the radius, 97 % of its fall", () => {
    const random = seededRandom(1);
    let cut = 0;
    for (let n = 0; n < 200; n++) {
      const size = 1 + (n % 6);
      const root = Array.from({ length: size }, () => Array.from({ length: size }, () => random.normal()));
      const hessian = root.map((a, i) =>
        root.map((b, j) => a.reduce((sum, each, k) => sum + each * b[k]!, i === j ? 0.05 : 0)),
      );
      const unit = root.map(() => Math.exp(random.normal()));
      const gradient = root.map(() => random.normal());
      const newton = new NewtonStep(size);
      expect(newton.factor(hessian, unit)).toBe(true);
      newton.solve(gradient, unit);
      const eigen = symmetricEigen(scaled(hessian, unit));
      const slope = gradient.map((each, i) => each / unit[i]!);
      const whole = trustRegionStep(eigen, slope, 2 * newton.length);
      expect(Math.abs(newton.predicted / whole.predicted - 1)).toBeLessThanOrEqual(1e-9);
      for (const [i, each] of whole.step.entries()) {
        expect(Math.abs(newton.step[i]! - each)).toBeLessThanOrEqual(1e-9 * newton.length);
      }
      // Twice in a row, as after a step refused.
      for (const radius of [newton.length / 3, newton.length / 40]) {
        newton.cut(hessian, gradient, unit, radius);
        const exact = trustRegionStep(eigen, slope, radius);
        expect(newton.length).toBeLessThanOrEqual(radius * (1 + 1e-12));
        expect(Math.abs(Math.hypot(...newton.step) / newton.length - 1)).toBeLessThanOrEqual(1e-12);
        expect(newton.predicted).toBeLessThanOrEqual(exact.predicted * (1 + 1e-9));
        expect(newton.predicted).toBeGreaterThanOrEqual(0.97 * exact.predicted);
        cut++;
      }
    }
    expect(cut).toBe(400);
  });

  test("what is no bowl, or next to flat, is said", () => {
    const newton = new NewtonStep(2);
    expect(
      newton.factor(
        [
          [1, 0],
          [2, 1],
        ],
        [1, 1],
      ),
    ).toBe(false);
    expect(
      newton.factor(
        [
          [1, 0],
          [1, 1],
        ],
        [1, 1],
      ),
    ).toBe(false);
    expect(
      newton.factor(
        [
          [Number.NaN, 0],
          [0, 1],
        ],
        [1, 1],
      ),
    ).toBe(false);
    expect(
      newton.factor(
        [
          [-1, 0],
          [0, 1],
        ],
        [1, 1],
      ),
    ).toBe(false);
    expect(
      newton.factor(
        [
          [2, 0],
          [0, 3],
        ],
        [1, 1],
      ),
    ).toBe(true);
    expect(newton.determinant).toBe(6);
  });
});
