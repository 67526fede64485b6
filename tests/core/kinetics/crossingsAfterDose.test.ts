import { describe, expect, it } from "vitest";
import {
  concentrationAfterDose,
  crossingsAfterDose,
  peakAfterDose,
  timeOfPeak,
} from "../../../src/core/kinetics/index.ts";

const kinetics = { ka: 1, ke: 0.15, volume: 30, bioavailability: 0.9, lag: 0.75 };
const peak = peakAfterDose(kinetics, 600);

describe("crossings of a level after one dose", () => {
  it("two below the peak, one at it, none above it", () => {
    expect(crossingsAfterDose(kinetics, 600, 10)).toHaveLength(2);
    expect(crossingsAfterDose(kinetics, 600, peak)).toEqual([timeOfPeak(kinetics)]);
    expect(crossingsAfterDose(kinetics, 600, peak * (1 + Number.EPSILON))).toEqual([]);
    expect(crossingsAfterDose(kinetics, 600, 0)).toEqual([]);
    expect(crossingsAfterDose(kinetics, 0, 1)).toEqual([]);
  });

  it.each([1e-300, 1e-30, 1e-9, 1e-3, 0.5, 0.999, 1 - 1e-9, 1 - 1e-15])(
    "%d of the peak: the level there, on either side",
    (part) => {
      const level = part * peak;
      const [up, down] = crossingsAfterDose(kinetics, 600, level) as [number, number];
      expect(up).toBeLessThanOrEqual(timeOfPeak(kinetics));
      expect(down).toBeGreaterThanOrEqual(timeOfPeak(kinetics));
      expect(up).toBeGreaterThanOrEqual(kinetics.lag);
      // Down: relative 1e-13 (ke·t is up to 700, so a unit in the last place of t is worth that much).
      expect(Math.abs(concentrationAfterDose(kinetics, 600, down) / level - 1)).toBeLessThanOrEqual(2e-13);
      // Up: a time of lag + u is rounded to 1e-16 h, which is worth that share of u.
      const share = 1.2e-16 / Math.max(up - kinetics.lag, 1e-300);
      if (share < 0.1)
        expect(Math.abs(concentrationAfterDose(kinetics, 600, up) / level - 1)).toBeLessThanOrEqual(1e-15 + share);
    },
  );

  it("equal rates and flip-flop", () => {
    for (const [ka, ke] of [
      [0.3, 0.3],
      [0.05, 2],
      [0.3, 0.3 * (1 - 1e-13)],
    ] as const) {
      const k = { ka, ke, volume: 10, bioavailability: 1, lag: 0 };
      const level = 0.4 * peakAfterDose(k, 100);
      for (const t of crossingsAfterDose(k, 100, level)) {
        expect(Math.abs(concentrationAfterDose(k, 100, t) / level - 1)).toBeLessThanOrEqual(2e-15);
      }
    }
  });
});
