import { describe, expect, it } from "vitest";
import { expm1Excess } from "../../../src/core/numerics/index.ts";

/** Worked out in 80-digit arithmetic (mpmath 1.3.0), given as the nearest double; pairs on either side of the change of form at 1. */
const REFERENCE = [
  [1, 0.7182818284590452],
  [-1, -0.36787944117144233],
  [1e-20, 5e-21],
  [-1e-8, -4.999999983333333e-9],
  [0.3, 0.16619602525334368],
  [-0.3, -0.1360607356057262],
  [0.9999, 0.7181818320503605],
  [-0.9999, -0.36785301625664363],
  [1.0001, 0.7183818320505483],
  [-1.0001, -0.36790586448021306],
  [5, 28.48263182051532],
  [-40, -0.975],
  [700, 1.4489029353357207e301],
] as const;

describe("expm1Excess", () => {
  it.each(REFERENCE)("%d: relative 1e-15", (x, wanted) => {
    expect(Math.abs(expm1Excess(x) / wanted - 1)).toBeLessThanOrEqual(1e-15);
  });

  it("limits", () => {
    expect(expm1Excess(0)).toBe(0);
    expect(expm1Excess(-Infinity)).toBe(-1);
    expect(expm1Excess(Infinity)).toBe(Infinity);
    expect(expm1Excess(710)).toBe(Infinity);
  });
});
