import { describe, expect, it } from "vitest";
import { decayIntegral } from "../../../src/core/numerics/index.ts";

/** Worked out in 80-digit arithmetic (mpmath 1.3.0), given as the nearest double. */
const REFERENCE = [
  [0.5, 2, 1.2642411176571153],
  [1e-12, 3, 2.9999999999955],
  [0.3, 1e-9, 9.999999998500002e-10],
  [2.7, 40, 0.37037037037037035],
  [1e-20, 7, 7.0],
] as const;

describe("decayIntegral", () => {
  it.each(REFERENCE)("rate %d time %d: relative 5e-16", (rate, time, wanted) => {
    expect(Math.abs(decayIntegral(rate, time) / wanted - 1)).toBeLessThanOrEqual(5e-16);
  });

  it("limits", () => {
    expect(decayIntegral(0, 5)).toBe(5);
    expect(decayIntegral(1, 0)).toBe(0);
    expect(decayIntegral(0.25, Infinity)).toBe(4);
    expect(decayIntegral(0, Infinity)).toBe(Infinity);
    expect(decayIntegral(1e-300, 1e-30)).toBe(1e-30);
  });
});
