import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { passedTwoSteps } from "../../../src/core/numerics/index.ts";

/** Worked out in 80-digit arithmetic (mpmath 1.3.0), given as the nearest double; pairs on either side of the change of form at fastest·time = 2. */
const REFERENCE = [
  [1, 1, 1, 0.26424111765711533],
  [0.2, 1, 3, 0.32643222197443295],
  [0.15, 0.15000000000000002, 4, 0.12190138224955772],
  [0.001, 0.001, 0.001, 4.999996666667917e-13],
  [25, 0.4, 1e-9, 4.999999957666668e-18],
  [2, 1e-5, 0.9999, 5.675790154117618e-6],
  [2, 1e-5, 1.0001, 5.67751947219603e-6],
  [2, 1.9, 0.999, 0.5794568735980269],
  [2, 1.9, 1.001, 0.5805386071152512],
  [0.05, 0.9, 400, 0.9999999978176021],
] as const;

describe("passedTwoSteps", () => {
  it.each(REFERENCE)("%d %d time %d: relative 1.5e-15, the same either way round", (a, b, time, wanted) => {
    expect(Math.abs(passedTwoSteps(a, b, time) / wanted - 1)).toBeLessThanOrEqual(1.5e-15);
    expect(passedTwoSteps(b, a, time)).toBe(passedTwoSteps(a, b, time));
  });

  it("limits", () => {
    expect(passedTwoSteps(1, 2, 0)).toBe(0);
    expect(passedTwoSteps(1, 2, Infinity)).toBe(1);
    expect(passedTwoSteps(1e300, 1e300, 1e300)).toBe(1);
  });

  it("is a part, and only rises with time", () => {
    const rate = fc.double({ min: -3, max: 2, noNaN: true }).map((x) => 10 ** x);
    const time = fc.double({ min: 0, max: 100, noNaN: true });
    fc.assert(
      fc.property(rate, rate, time, time, (a, b, t, more) => {
        const early = passedTwoSteps(a, b, t);
        const late = passedTwoSteps(a, b, t + more);
        expect(early).toBeGreaterThanOrEqual(0);
        // Rounding may lift either by 1.5e-15.
        expect(late).toBeLessThanOrEqual(1 + 2e-15);
        expect(late).toBeGreaterThanOrEqual(early * (1 - 3e-15));
      }),
      { seed: 5, numRuns: 500 },
    );
  });
});
