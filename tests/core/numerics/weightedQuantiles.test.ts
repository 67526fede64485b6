import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { quantileRoom, seededRandom, weightedQuantiles } from "../../../src/core/numerics/index.ts";

/** The definition, plainly. */
function plain(values: readonly number[], weights: readonly number[], p: number): number {
  const used = values.map((value, i) => ({ value, weight: weights[i]! })).filter((each) => each.weight > 0);
  used.sort((a, b) => a.value - b.value);
  const total = used.reduce((sum, each) => sum + each.weight, 0);
  let below = 0;
  const parts = used.map(({ weight }) => {
    below += weight;
    return (below - weight / 2) / total;
  });
  if (p <= parts[0]!) return used[0]!.value;
  for (let i = 1; i < used.length; i++) {
    if (p <= parts[i]!) {
      return (
        used[i - 1]!.value + (used[i]!.value - used[i - 1]!.value) * ((p - parts[i - 1]!) / (parts[i]! - parts[i - 1]!))
      );
    }
  }
  return used[used.length - 1]!.value;
}

describe("small examples, exact", () => {
  it("1, 2, 3 with weights 1, 2, 1 stand at 1/8, 1/2, 7/8", () => {
    expect([...weightedQuantiles([3, 1, 2], [1, 1, 2], [0, 0.125, 0.3125, 0.5, 0.6875, 0.875, 1])]).toEqual([
      1, 1, 1.5, 2, 2.5, 3, 3,
    ]);
  });

  it("even weights: Hazen's (i − 1/2)/n", () => {
    expect([...weightedQuantiles([4, 3, 2, 1], [1, 1, 1, 1], [0.125, 0.25, 0.5, 0.875])]).toEqual([1, 1.5, 2.5, 4]);
  });

  it("weight 0 does not count, whatever the value; one value is every quantile; equal values are one", () => {
    expect([...weightedQuantiles([1e9, 1, 2, -1e9], [0, 1, 1, 0], [0, 0.5, 1])]).toEqual([1, 1.5, 2]);
    expect([...weightedQuantiles([7], [0.1], [0, 0.5, 1])]).toEqual([7, 7, 7]);
    expect([...weightedQuantiles([2, 2, 2], [1, 5, 1], [0.1, 0.9])]).toEqual([2, 2]);
    expect([...weightedQuantiles([0, -0, 0], [1, 1, 1], [0.3])]).toEqual([0]);
  });

  it("values nearer to each other than the sort sees are still in order: 1e-15 apart", () => {
    const values = [1 + 3e-15, 1, 1 + 2e-15, 1 + 1e-15, -1, -1 - 1e-15];
    const found = weightedQuantiles(
      values,
      [1, 1, 1, 1, 1, 1],
      [1, 3, 5, 7, 9, 11].map((k) => k / 12),
    );
    expect([...found]).toEqual([...values].sort((a, b) => a - b));
  });
});

it("random samples: as the plain definition, relative 1e-12, any order of probabilities, room used again", () => {
  const value = fc.integer({ min: -50, max: 50 }).map((each) => each / 7);
  fc.assert(
    fc.property(
      fc.array(fc.tuple(value, fc.integer({ min: 0, max: 5 })), { minLength: 1, maxLength: 40 }),
      fc.array(
        fc.integer({ min: 0, max: 100 }).map((each) => each / 100),
        { minLength: 1, maxLength: 6 },
      ),
      (pairs, probabilities) => {
        const values = pairs.map(([each]) => each);
        const weights = pairs.map(([, weight], i) => (i === 0 ? weight + 1 : weight));
        const room = quantileRoom(values.length);
        const into = new Float64Array(probabilities.length);
        weightedQuantiles(
          values.map((each) => -each),
          weights,
          probabilities,
          into,
          room,
        );
        const found = weightedQuantiles(values, weights, probabilities, into, room);
        return (
          found === into && probabilities.every((p, i) => Math.abs(found[i]! - plain(values, weights, p)) <= 1e-12 * 10)
        );
      },
    ),
    { seed: 5, numRuns: 300 },
  );
});

it("4,000 values with weights: as the plain definition to 1e-12", () => {
  const random = seededRandom(11);
  const values = Float64Array.from({ length: 4000 }, () => Math.exp(random.normal()));
  const weights = Float64Array.from({ length: 4000 }, () => random.uniform());
  const probabilities = [0.05, 0.25, 0.5, 0.75, 0.95];
  const found = weightedQuantiles(values, weights, probabilities);
  for (const [i, p] of probabilities.entries()) {
    expect(Math.abs(found[i]! / plain([...values], [...weights], p) - 1)).toBeLessThanOrEqual(1e-12);
  }
});

it("refuses what has no quantile", () => {
  expect(() => weightedQuantiles([], [], [0.5])).toThrow(/values/);
  expect(() => weightedQuantiles([1, Number.NaN], [1, 1], [0.5])).toThrow(/values\[1\]: NaN/);
  expect(() => weightedQuantiles([1], [0], [0.5])).toThrow(/sum is 0/);
  expect(() => weightedQuantiles([1, 2], [1, -1], [0.5])).toThrow(/weights\[1\]: -1/);
  expect(() => weightedQuantiles([1], [1, 2], [0.5])).toThrow(/weights: 2 for 1/);
  expect(() => weightedQuantiles([1], [1], [1.5])).toThrow(/probabilities\[0\]/);
  expect(() => weightedQuantiles([1], [1], [0.5], undefined, quantileRoom(2))).toThrow(/room/);
});
