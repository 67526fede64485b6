import { describe, expect, it, test } from "vitest";
import { quantileOfSorted, spreadOfEqual, spreadOfPrior } from "../../../src/core/analysis/spreadOf.ts";
import { systematicDraws } from "../../../src/core/analysis/systematicDraws.ts";
import { windowChance } from "../../../src/core/analysis/windowChance.ts";
import { sobolPoints } from "../../../src/core/numerics/index.ts";

describe("systematicDraws", () => {
  it("takes each draw as often as its weight says", () => {
    const along = Float64Array.of(1, 2, 3);
    expect([...systematicDraws(Float64Array.of(0.5, 0.25, 0.25), along, 4)]).toEqual([0, 0, 1, 2]);
    expect([...systematicDraws(Float64Array.of(0, 1, 0), along, 3)]).toEqual([1, 1, 1]);
    expect([...systematicDraws(Float64Array.of(0.5, 0.25, 0.25), along.toReversed(), 4)]).toEqual([2, 1, 0, 0]);
  });

  it("keeps every count within one of its share, whatever the weights", () => {
    const weights = Float64Array.from({ length: 500 }, (_, i) => Math.exp(Math.sin(i * 1.7) * 2));
    const total = weights.reduce((sum, each) => sum + each, 0);
    const counts = new Float64Array(500);
    for (const i of systematicDraws(weights, weights, 1_000)) counts[i]!++;
    for (const [i, count] of counts.entries()) {
      expect(Math.abs(count - (1_000 * weights[i]!) / total)).toBeLessThan(1);
    }
  });
});

it("systematicDraws keep the spread of quasi-random points, whichever figure they are looked at by", () => {
  const points = sobolPoints(3, 2_048, 1);
  const even = new Float64Array(2_048).fill(1 / 2_048);
  const chosen = systematicDraws(even, points[0]!, 1_024);
  for (const column of points) {
    const mean = chosen.reduce((sum, i) => sum + column[i]!, 0) / 1_024;
    // The mean of 1,024 independent uniform draws has a standard deviation of 0.009; every second point as they come missed by 0.25.
    expect(Math.abs(mean - 0.5)).toBeLessThan(0.012);
  }
});

describe("spreads", () => {
  it("of equal draws lie between the order statistics", () => {
    expect(spreadOfEqual(Float64Array.of(3, 1, 2)).q50).toBe(2);
    const hundred = Float64Array.from({ length: 100 }, (_, i) => i);
    // (i + 1/2)/100 = 0.05 at i = 4.5.
    expect(quantileOfSorted(hundred, 0.05)).toBeCloseTo(4.5, 12);
    expect(quantileOfSorted(hundred, 0)).toBe(0);
    expect(quantileOfSorted(hundred, 1)).toBe(99);
  });

  it("of the prior are those of a log-normal", () => {
    const { q05, q50, q95 } = spreadOfPrior(2, 0.3);
    expect(q50).toBe(2);
    expect(Math.log(q95 / 2)).toBeCloseTo(0.3 * 1.6448536269514722, 12);
    expect(q05 * q95).toBeCloseTo(4, 12);
  });
});

describe("windowChance", () => {
  const figures = {
    lowest: [4, 6, 6, 6, 4],
    peak: [9, 9, 14, 16, 16],
    average: [5, 7, 9, 10, 9],
    auc24: [120, 168, 216, 240, 216],
  };
  test.each([
    ["lowest-and-highest", { low: 5, high: 15 }, [0.2, 0.4, 0.4]],
    ["trough", { low: 5, high: 15 }, [0.4, 0.6, 0]],
    ["peak", { low: 10, high: 15 }, [0.4, 0.2, 0.4]],
    ["average", { low: 7, high: 9 }, [0.2, 0.6, 0.2]],
    ["auc24", { low: 130, high: 220 }, [0.2, 0.6, 0.2]],
  ] as const)("of a window for %s", (quantity, limits, [below, within, above]) => {
    const chance = windowChance(quantity, limits, figures)!;
    expect(chance.below).toBeCloseTo(below, 12);
    expect(chance.within).toBeCloseTo(within, 12);
    expect(chance.above).toBeCloseTo(above, 12);
  });

  it("without draws there is none", () => {
    expect(windowChance("peak", { low: 1, high: 2 }, { lowest: [], peak: [], average: [], auc24: [] })).toBeNull();
  });
});
