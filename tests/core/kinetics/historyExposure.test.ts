import { describe, expect, it } from "vitest";
import {
  aucAfterDose,
  crossingsAfterDose,
  exposure,
  historyExposure,
  peakAfterDose,
  profile,
  timeOfPeak,
} from "../../../src/core/kinetics/index.ts";
import { historySets } from "./historySets.ts";
import { SEVERAL_PRODUCTS } from "./severalProducts.ts";
import { relativeError, WorstError } from "./worstError.ts";

const kinetics = { ka: 1.1, ke: 0.13, volume: 32, bioavailability: 0.9, lag: 0.4 };
const dose = [{ time: 0, amount: 500 }];

describe("exposure", () => {
  it("of one dose agrees with the single-dose functions", () => {
    const window = { low: 3, high: 9 };
    const found = exposure(kinetics, dose, 0, 36, window);
    // Relative 1e-15 (levels, area); times 1e-14 h.
    expect(relativeError(found.peak, peakAfterDose(kinetics, 500))).toBeLessThanOrEqual(1e-15);
    expect(Math.abs(found.timeOfPeak - timeOfPeak(kinetics))).toBeLessThanOrEqual(1e-14);
    expect(relativeError(found.auc, aucAfterDose(kinetics, 500, 36))).toBeLessThanOrEqual(1e-15);
    expect(found.average).toBe(found.auc / 36);
    expect([found.lowest, found.timeOfLowest]).toEqual([0, 0]);
    const [upLow, downLow] = crossingsAfterDose(kinetics, 500, 3) as [number, number];
    const [upHigh, downHigh] = crossingsAfterDose(kinetics, 500, 9) as [number, number];
    // Times of crossings: 1e-12 h.
    expect(Math.abs(found.hoursAbove - (downHigh - upHigh))).toBeLessThanOrEqual(1e-12);
    expect(Math.abs(found.hoursBelow - (upLow + 36 - downLow))).toBeLessThanOrEqual(1e-12);
    expect(found.hoursBelow + found.hoursWithin + found.hoursAbove).toBe(36);
  });

  it.each(SEVERAL_PRODUCTS)("several products, $name: levels and area to relative 2e-15, times to 1e-11 h", (set) => {
    const found = historyExposure(set, set.courses, set.from, set.to);
    expect(relativeError(found.auc, set.auc)).toBeLessThanOrEqual(2e-15);
    expect(relativeError(found.peak, set.peak)).toBeLessThanOrEqual(2e-15);
    expect(relativeError(found.lowest, set.lowest)).toBeLessThanOrEqual(2e-15);
    // A maximum is flat: the zero of the slope is known to its rounding (1e-16 of rates × amounts) over the curvature.
    expect(Math.abs(found.timeOfPeak - set.timeOfPeak)).toBeLessThanOrEqual(1e-11);
    expect(Math.abs(found.timeOfLowest - set.timeOfLowest)).toBeLessThanOrEqual(1e-11);
  });

  it("15 histories: no level of a fine grid is beyond the peak or the lowest, and the hours agree with the grid", () => {
    for (const { id, kinetics: k, doses } of historySets()) {
      const from = doses[0]!.time - 1;
      const to = doses[doses.length - 1]!.time + 30;
      const times = Array.from({ length: 40_001 }, (_, i) => from + ((to - from) * i) / 40_000);
      const levels = profile(k, doses, times);
      const low = 0.3 * Math.max(...levels);
      const high = 0.7 * Math.max(...levels);
      const found = exposure(k, doses, from, to, { low, high });
      // The grid may miss the peak, never pass it: 1e-15 of it for rounding. It comes within 1e-4 of it.
      expect(Math.max(...levels), id).toBeLessThanOrEqual(found.peak * (1 + 1e-15));
      expect(Math.max(...levels), id).toBeGreaterThan(found.peak * (1 - 1e-4));
      expect(found.lowest, id).toBe(0);
      expect(profile(k, doses, [found.timeOfPeak])[0]! / found.peak, id).toBeCloseTo(1, 12);
      const share = (test: (level: number) => boolean) => levels.filter(test).length / levels.length;
      // Each crossing costs the grid up to one step, 2.5e-5 of the span: 40 crossings at most.
      expect(Math.abs(found.hoursBelow / (to - from) - share((c) => c < low)), id).toBeLessThanOrEqual(1e-3);
      expect(Math.abs(found.hoursAbove / (to - from) - share((c) => c > high)), id).toBeLessThanOrEqual(1e-3);
      expect(relativeError(found.hoursBelow + found.hoursWithin + found.hoursAbove, to - from), id).toBeLessThanOrEqual(
        3e-16,
      );
      // Area against the sum over doses in closed form: relative 5e-15.
      const sum = doses.reduce((area, d) => area + aucAfterDose(k, d.amount, to - d.time), 0);
      expect(relativeError(found.auc, sum), id).toBeLessThanOrEqual(5e-15);
    }
  });

  it("a level that is exactly the peak, and one just above it", () => {
    const peak = exposure(kinetics, dose, 0, 36).peak;
    const touching = exposure(kinetics, dose, 0, 36, { low: 0, high: peak });
    expect([touching.hoursBelow, touching.hoursWithin, touching.hoursAbove]).toEqual([0, 36, 0]);
    const under = exposure(kinetics, dose, 0, 36, { low: peak * 1.001, high: peak * 2 });
    expect([under.hoursBelow, under.hoursWithin, under.hoursAbove]).toEqual([36, 0, 0]);
  });

  it("before any dose, without doses and without a window", () => {
    const before = exposure(kinetics, dose, -9, -3, { low: 1, high: 2 });
    expect(before).toEqual({
      peak: 0,
      timeOfPeak: -9,
      lowest: 0,
      timeOfLowest: -9,
      auc: 0,
      average: 0,
      hoursBelow: 6,
      hoursWithin: 0,
      hoursAbove: 0,
    });
    expect(exposure(kinetics, [], 0, 5, { low: 0, high: 2 }).hoursWithin).toBe(5);
    expect(exposure(kinetics, dose, 0, 5).hoursWithin).toBe(5);
  });

  it("starting and ending within a lag, on a dose and long after the last", () => {
    const worst = new WorstError();
    const doses = [
      { time: 0, amount: 300 },
      { time: 8, amount: 300 },
    ];
    for (const [from, to] of [
      [0.1, 0.3],
      [0.4, 8],
      [8, 8.2],
      [8.4, 20],
      [100, 900],
    ] as const) {
      const found = exposure(kinetics, doses, from, to);
      const area = (t: number) => doses.reduce((sum, d) => sum + aucAfterDose(kinetics, d.amount, t - d.time), 0);
      // The difference of two areas cancels; it is known to 1e-15 of the whole.
      worst.note("auc", Math.abs(found.auc - (area(to) - area(from))) / area(Infinity), `${from}–${to}`);
    }
    expect(worst.of("auc")).toBeLessThanOrEqual(1e-15);
  });
});
