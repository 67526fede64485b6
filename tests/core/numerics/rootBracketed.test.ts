import { describe, expect, it } from "vitest";
import { rootBracketed } from "../../../src/core/numerics/index.ts";

describe("rootBracketed", () => {
  it("finds a simple root to the last place in a few steps", () => {
    const found = rootBracketed(
      (x) => x * x - 2,
      (x) => 2 * x,
      0,
      2,
      1,
      0,
    );
    expect(found.converged).toBe(true);
    // Two units in the last place.
    expect(Math.abs(found.root - Math.SQRT2)).toBeLessThanOrEqual(4.5e-16);
    expect(found.steps).toBeLessThanOrEqual(10);
    expect(Math.abs(found.residual)).toBeLessThanOrEqual(1e-15);
  });

  it("falling as well as rising, root at an end, tolerance kept", () => {
    expect(
      rootBracketed(
        (x) => 1 - x,
        () => -1,
        0,
        3,
        2.5,
        0,
      ).root,
    ).toBe(1);
    expect(
      rootBracketed(
        (x) => x,
        () => 1,
        0,
        3,
        2,
        0,
      ),
    ).toEqual({ root: 0, residual: 0, steps: 0, converged: true });
    expect(
      rootBracketed(
        (x) => x - 3,
        () => 1,
        0,
        3,
        2,
        0,
      ).root,
    ).toBe(3);
    const rough = rootBracketed((x) => Math.exp(x) - 5, Math.exp, 0, 4, 4, 1e-3);
    expect(Math.abs(rough.root - Math.log(5))).toBeLessThanOrEqual(1e-3);
  });

  it("where Newton alone runs away: arctangent from far out", () => {
    const found = rootBracketed(
      (x) => Math.atan(x - 0.3),
      (x) => 1 / (1 + (x - 0.3) ** 2),
      -50,
      80,
      60,
      0,
    );
    expect(found.converged).toBe(true);
    expect(Math.abs(found.root - 0.3)).toBeLessThanOrEqual(2e-16);
  });

  it("with no use in the slope, by halving: across 300 powers of ten, an infinite end value, a step", () => {
    const far = rootBracketed(
      (x) => x - 1e-300,
      () => Number.NaN,
      0,
      1,
      0.5,
      0,
    );
    expect(far.converged).toBe(true);
    expect(Math.abs(far.root / 1e-300 - 1)).toBeLessThanOrEqual(1e-15);
    const log = rootBracketed(
      (x) => Math.log(x / 3),
      (x) => 1 / x,
      0,
      10,
      10,
      0,
    );
    expect(Math.abs(log.root - 3)).toBeLessThanOrEqual(1e-15);
    const step = rootBracketed(
      (x) => (x < 0.7 ? -1 : 1),
      () => 0,
      0,
      1,
      0.5,
      0,
    );
    expect(step.converged).toBe(true);
    expect(Math.abs(step.root - 0.7)).toBeLessThanOrEqual(4e-16);
  });

  it("says when there is nothing to find", () => {
    const found = rootBracketed(
      (x) => x * x + 1,
      (x) => 2 * x,
      -1,
      2,
      0,
      0,
    );
    expect(found.converged).toBe(false);
    expect(found.root).toBe(-1);
    expect(found.residual).toBe(2);
  });
});
