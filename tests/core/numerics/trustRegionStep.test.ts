import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { symmetricEigen } from "../../../src/core/numerics/symmetricEigen.ts";
import { trustRegionStep } from "../../../src/core/numerics/trustRegionStep.ts";

const model = (matrix: readonly (readonly number[])[], g: readonly number[], p: readonly number[]) =>
  p.reduce((sum, each, i) => sum + each * (g[i]! + matrix[i]!.reduce((s, h, j) => s + (h * p[j]!) / 2, 0)), 0);

describe("trustRegionStep", () => {
  it("the whole Newton step where it is short enough", () => {
    expect(
      trustRegionStep(
        symmetricEigen([
          [2, 0],
          [0, 4],
        ]),
        [-2, -4],
        10,
      ),
    ).toEqual({ step: [1, 1], predicted: 3, isCut: false });
  });

  it("is cut to the radius: along −g for even curvature", () => {
    const { step, isCut } = trustRegionStep(
      symmetricEigen([
        [2, 0],
        [0, 2],
      ]),
      [-6, -8],
      1,
    );
    expect(isCut).toBe(true);
    // 1e-12: the length is found by iteration.
    expect(Math.abs(step[0]! - 0.6)).toBeLessThanOrEqual(1e-12);
    expect(Math.abs(step[1]! - 0.8)).toBeLessThanOrEqual(1e-12);
  });

  it("walks along negative curvature from a saddle without a slope, and with a slope across it", () => {
    const saddle = symmetricEigen([
      [2, 0],
      [0, -1],
    ]);
    const still = trustRegionStep(saddle, [0, 0], 2);
    expect(still.step.map(Math.abs)).toEqual([0, 2]);
    expect(still.predicted).toBe(2);
    const across = trustRegionStep(saddle, [-3, 0], 2);
    // (H + 1)·p = −g along x: p = 1; the rest of the radius along y.
    expect(Math.abs(across.step[0]! - 1)).toBeLessThanOrEqual(1e-14);
    expect(Math.abs(Math.abs(across.step[1]!) - Math.sqrt(3))).toBeLessThanOrEqual(1e-14);
  });

  it("stays where there is neither slope nor negative curvature", () => {
    expect(
      trustRegionStep(
        symmetricEigen([
          [0, 0],
          [0, 1],
        ]),
        [0, 0],
        1,
      ),
    ).toEqual({ step: [0, 0], predicted: 0, isCut: false });
  });

  it("random models: within the radius, the fall is the promised one, and none of 200 other points of the ball is lower", () => {
    const unit = fc.integer({ min: -1000, max: 1000 }).map((each) => each / 1000);
    const three = fc.tuple(unit, unit, unit);
    fc.assert(
      fc.property(
        three,
        three,
        three,
        fc.integer({ min: 1, max: 500 }).map((each) => each / 100),
        fc.array(three, { minLength: 200, maxLength: 200 }),
        (diagonal, off, g, radius, others) => {
          const matrix = [
            [diagonal[0], off[0], off[1]],
            [off[0], diagonal[1], off[2]],
            [off[1], off[2], diagonal[2]],
          ];
          const { step, predicted } = trustRegionStep(symmetricEigen(matrix), g, radius);
          const here = model(matrix, g, step);
          const size = radius * (1 + radius);
          if (Math.hypot(...step) > radius * (1 + 1e-11) || Math.abs(here + predicted) > 1e-11 * size) return false;
          return others.every((other) => {
            const length = Math.hypot(...other);
            const p = other.map((each) => (each * radius) / Math.max(length, 1));
            return model(matrix, g, p) >= here - 1e-11 * size;
          });
        },
      ),
      { seed: 3, numRuns: 100 },
    );
  });
});
