import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type ModelHistory, modelExposure, modelProfile } from "../../../../src/core/kinetics/index.ts";
import { even, historyOf, KINDS, RUNS } from "./modelArbitraries.ts";

const FROM = 3;
const TO = 150;

/** Readings from a grid, the way the program must not do it; `steps` h apart. */
function fromGrid(history: ModelHistory, steps: number, window: { low: number; high: number }) {
  const count = Math.round((TO - FROM) / steps);
  const at = Array.from({ length: count + 1 }, (_, i) => FROM + i * steps);
  const levels = modelProfile(history, at);
  let below = 0;
  let above = 0;
  for (const level of levels) {
    if (level < window.low) below += steps;
    if (level > window.high) above += steps;
  }
  return { peak: Math.max(...levels), lowest: Math.min(...levels), below, above };
}

describe.each(KINDS)("exposure of %s", (kind) => {
  test("no grid, however fine, finds a higher peak or a lower lowest level; finer ones come nearer to every reading", () => {
    let gapCoarse = 0;
    let gapFine = 0;
    fc.assert(
      fc.property(historyOf(kind), (history) => {
        const { peak } = modelExposure(history, FROM, TO);
        const window = { low: 0.2 * peak, high: 0.6 * peak };
        const found = modelExposure(history, FROM, TO, window);
        const coarse = fromGrid(history, 1, window);
        const fine = fromGrid(history, 0.05, window);
        for (const grid of [coarse, fine]) {
          expect(grid.peak).toBeLessThanOrEqual(peak * (1 + 1e-13));
          expect(grid.lowest).toBeGreaterThanOrEqual(found.lowest - peak * 1e-13);
        }
        gapCoarse = Math.max(gapCoarse, (peak - coarse.peak) / peak);
        gapFine = Math.max(gapFine, (peak - fine.peak) / peak);
        // A crossing moves a grid's hours by up to a step on either side; there are at most some sixty of them.
        expect(Math.abs(fine.below - found.hoursBelow)).toBeLessThanOrEqual(0.05 * 60);
        expect(Math.abs(fine.above - found.hoursAbove)).toBeLessThanOrEqual(0.05 * 60);
        // The readings themselves do not depend on anything asked before: the same bits again.
        expect(modelExposure(history, FROM, TO, window)).toEqual(found);
      }),
      { ...RUNS, numRuns: 60 },
    );
    expect(gapCoarse).toBeGreaterThan(1e-4);
    expect(gapFine).toBeLessThan(gapCoarse);
  });

  test("the level at each reported time is the reported one, to 1e-12 of the peak, unless a change of volume makes it jump there", () => {
    fc.assert(
      fc.property(historyOf(kind, 1), (history) => {
        const found = modelExposure(history, FROM, TO);
        const [peak] = modelProfile(history, [found.timeOfPeak]);
        const [lowest] = modelProfile(history, [found.timeOfLowest]);
        expect(Math.abs(peak! - found.peak)).toBeLessThanOrEqual(1e-12 * found.peak);
        expect(Math.abs(lowest! - found.lowest)).toBeLessThanOrEqual(1e-12 * found.peak);
      }),
      RUNS,
    );
  });

  test("hours below, within and above add up to the whole, whatever the window", () => {
    fc.assert(
      fc.property(historyOf(kind), even(0, 30), even(0, 30), (history, a, b) => {
        const found = modelExposure(history, FROM, TO, { low: Math.min(a, b), high: Math.max(a, b) });
        const hours = [found.hoursBelow, found.hoursWithin, found.hoursAbove];
        expect(Math.abs(hours.reduce((sum, part) => sum + part, 0) - (TO - FROM))).toBeLessThanOrEqual(1e-12 * TO);
        for (const part of hours) expect(part).toBeGreaterThanOrEqual(0);
      }),
      RUNS,
    );
  });

  test("before the first dose there is nothing, and all of it below any window", () => {
    fc.assert(
      fc.property(historyOf(kind), (history) => {
        const found = modelExposure(history, -9, -2, { low: 1, high: 2 });
        expect(found).toEqual({
          peak: 0,
          timeOfPeak: -9,
          lowest: 0,
          timeOfLowest: -9,
          auc: 0,
          average: 0,
          hoursBelow: 7,
          hoursWithin: 0,
          hoursAbove: 0,
        });
      }),
      { ...RUNS, numRuns: 20 },
    );
  });
});

test("a jump of the level at a change of volume counts with both its sides", () => {
  const disposition = { kind: "one-compartment", clearance: 3, volume: 30 } as const;
  const history: ModelHistory = {
    dispositions: [
      { from: Number.NEGATIVE_INFINITY, disposition },
      { from: 10, disposition: { ...disposition, volume: 20 } },
    ],
    inputs: [
      {
        absorption: { kind: "zero-order", duration: 2 },
        bioavailability: 1,
        lag: 0,
        doses: [{ time: 0, amount: 300 }],
      },
    ],
  };
  const [before] = modelProfile(history, [10]);
  const found = modelExposure(history, 6, 16);
  expect(found.timeOfPeak).toBe(10);
  expect(Math.abs(found.peak / (before! * 1.5) - 1)).toBeLessThanOrEqual(1e-15);
  const later = modelExposure(history, 10, 16);
  expect([later.peak, later.lowest < before!]).toEqual([found.peak, true]);
  const early = modelExposure(history, 6, 10);
  expect(early.lowest).toBe(before);
});

describe("a quick part on top of a long constant input: a peak, then a plateau on which the slope is lost in rounding", () => {
  const absorption = {
    kind: "mixed",
    fastFraction: 0.5,
    fastKa: 2,
    slow: { kind: "zero-order", duration: 200 },
    slowLag: 0,
  } as const;

  test.each([
    { kind: "one-compartment", clearance: 20, volume: 30 },
    { kind: "two-compartment", clearance: 20, volume: 30, exchange: 9, peripheralVolume: 10 },
    { kind: "saturable", vmax: 70, km: 0.5, volume: 70 },
  ] as const)("$kind", (disposition) => {
    const history: ModelHistory = {
      dispositions: [{ from: Number.NEGATIVE_INFINITY, disposition }],
      inputs: [{ absorption, bioavailability: 1, lag: 0, doses: [{ time: 0, amount: 60 }] }],
    };
    const { peak, timeOfPeak, lowest } = modelExposure(history, 0.2, 199);
    const at = Array.from({ length: 4000 }, (_, i) => 0.2 + i * 0.001);
    const highest = Math.max(...modelProfile(history, at));
    expect(peak).toBeGreaterThanOrEqual(highest);
    // Near a peak the level changes by its curvature only: a step of 0.001 h misses at most a millionth.
    expect(peak).toBeLessThanOrEqual(highest * (1 + 1e-6));
    expect(timeOfPeak).toBeLessThan(3);
    expect(lowest).toBeLessThan(peak / 4);
  });
});

test("two compartments: a peak, a dip and a second rise in one stretch, long after which the fast decay has gone without trace", () => {
  // Met in random trials; all its digits are needed for the sign that was lost.
  const first = {
    kind: "two-compartment",
    volume: 109.535795,
    clearance: 57.422495800176975,
    exchange: 1.565636958191801,
    peripheralVolume: 25.588295926949222,
  } as const;
  const second = {
    kind: "two-compartment",
    volume: 138.16706,
    clearance: 1.73436506294021,
    exchange: 274.1034592774387,
    peripheralVolume: 177.99393999586215,
  } as const;
  const history: ModelHistory = {
    dispositions: [
      { from: Number.NEGATIVE_INFINITY, disposition: first },
      { from: 29, disposition: second },
    ],
    inputs: [
      {
        absorption: {
          kind: "mixed",
          fastFraction: 0.68938,
          fastKa: 2.4360258919503397,
          slow: { kind: "zero-order", duration: 37.5 },
          slowLag: 0,
        },
        bioavailability: 0.8696233,
        lag: 0,
        doses: [
          { time: 36.25, amount: 285 },
          { time: 39.25, amount: 312 },
          { time: 101.75, amount: 95 },
          { time: 102.25, amount: 775 },
        ],
      },
    ],
  };
  const { peak, timeOfPeak } = modelExposure(history, 3, 150);
  const highest = Math.max(
    ...modelProfile(
      history,
      Array.from({ length: 8000 }, (_, i) => 102 + i * 0.001),
    ),
  );
  expect(peak).toBeGreaterThanOrEqual(highest);
  expect(peak).toBeLessThanOrEqual(highest * (1 + 1e-6));
  expect(Math.abs(timeOfPeak - 102.9695)).toBeLessThanOrEqual(1e-4);
});
