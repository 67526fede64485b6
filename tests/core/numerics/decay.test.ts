import { describe, expect, it } from "vitest";
import { decay } from "../../../src/core/numerics/index.ts";

/** Worked out in 80-digit arithmetic (mpmath 1.3.0), given as the nearest double. */
const REFERENCE = [
  [0.1, 6000, 2.6503965530042227e-261],
  [0.3, 1, 0.7408182206817179],
  [1e-9, 1e9, 0.3678794411714423],
  [12.7, 55, 4.418800460323848e-304],
  [0.07, 9999, 1.0574583757701946e-304],
  [1 / 3, 2000, 2.95355728026621e-290],
] as const;

describe("decay", () => {
  it.each(REFERENCE)(
    "rate %d time %d: relative 2.5e-16, where the plain form loses up to 1e-13",
    (rate, time, wanted) => {
      expect(Math.abs(decay(rate, time) / wanted - 1)).toBeLessThanOrEqual(2.5e-16);
    },
  );

  it("is needed: the plain form misses the first of these by more than 1e-14", () => {
    expect(Math.abs(Math.exp(-(0.1 * 6000)) / REFERENCE[0][2] - 1)).toBeGreaterThan(1e-14);
  });

  it("limits", () => {
    expect(decay(1, 0)).toBe(1);
    expect(decay(0, 1e300)).toBe(1);
    expect(decay(1, Infinity)).toBe(0);
    expect(decay(1e300, 1e300)).toBe(0);
    expect(decay(1e-300, 1e302)).toBeCloseTo(Math.exp(-100), 55);
    expect(decay(1e302, 1e-300)).toBeCloseTo(Math.exp(-100), 55);
  });
});
