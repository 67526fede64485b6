import { describe, expect, it } from "vitest";
import { decayDifference } from "../../../src/core/numerics/index.ts";

/** Worked out in 80-digit arithmetic (mpmath 1.3.0), given as the nearest double. */
const REFERENCE = [
  [0.2, 1, 3, 0.623780709657703],
  [0.15, 0.15, 4, 2.1952465443761056],
  [0.15, 0.15000000000000002, 4, 2.1952465443761056],
  [0.1, 0.1000001, 50, 0.33689650771230223],
  [3, 0.002, 900, 0.05513638699852786],
  [25, 0.4, 1e-6, 9.999873001058593e-7],
  [0.3, 0.30000003, 1000, 5.148123000181e-128],
] as const;

describe("decayDifference", () => {
  it.each(REFERENCE)("%d %d time %d: relative 1e-15, the same either way round", (a, b, time, wanted) => {
    expect(Math.abs(decayDifference(a, b, time) / wanted - 1)).toBeLessThanOrEqual(1e-15);
    expect(decayDifference(b, a, time)).toBe(decayDifference(a, b, time));
  });

  it("is needed: the textbook form misses a near-equal pair by more than 1e-11", () => {
    const [a, b, time, wanted] = REFERENCE[3];
    const textbook = (Math.exp(-a * time) - Math.exp(-b * time)) / (b - a);
    expect(Math.abs(textbook / wanted - 1)).toBeGreaterThan(1e-11);
  });

  it("limits", () => {
    expect(decayDifference(1, 2, 0)).toBe(0);
    expect(decayDifference(1, 2, Infinity)).toBe(0);
    expect(decayDifference(1, 1, Infinity)).toBe(0);
    expect(decayDifference(1e300, 1e300, 1e300)).toBe(0);
  });
});
