import { describe, expect, test } from "vitest";
import { drawMoments } from "../../../src/core/estimation/index.ts";
import { thinnedDraws } from "../../../src/core/estimation/thinnedDraws.ts";
import { normalQuantile, sobolPoints, weightedQuantiles } from "../../../src/core/numerics/index.ts";

/** Normal points twice as wide as the density, weighted to it: mean 0, standard deviation 1. */
function weightedNormal(dimensions: number, count: number, seed: number) {
  const points = sobolPoints(dimensions, count, seed).map((column) => column.map((u) => 2 * normalQuantile(u)));
  const weights = new Float64Array(count).map((_, n) =>
    Math.exp(-0.375 * points.reduce((sum, column) => sum + column[n]! ** 2, 0)),
  );
  const total = weights.reduce((sum, each) => sum + each, 0);
  return { points, weights: weights.map((each) => each / total) };
}

describe("fewer draws in the place of many", () => {
  const many = weightedNormal(3, 16_384, 1);
  const few = thinnedDraws(many.points, many.weights, 2048);

  test("each is one of the many, the weights' sum is unchanged to 1e-12", () => {
    expect(few.weights).toHaveLength(2048);
    expect(Math.abs(few.weights.reduce((sum, each) => sum + each, 0) - 1)).toBeLessThanOrEqual(1e-12);
    const known = new Set(many.points[0]);
    expect(few.points[0]!.every((each) => known.has(each))).toBe(true);
    expect(new Set(few.points[0]).size).toBe(2048);
  });

  test("moments and percentiles of the many: mean 0.01, sd 1 % and of e^(0.6 z) 4 %, percentiles 0.06 sd, for ten seeds", () => {
    for (let seed = 1; seed <= 10; seed++) {
      const all = weightedNormal(3, 16_384, seed);
      const kept = thinnedDraws(all.points, all.weights, 2048);
      for (const [i, column] of all.points.entries()) {
        const before = drawMoments(column, all.weights);
        const after = drawMoments(kept.points[i]!, kept.weights);
        expect(Math.abs(after.mean - before.mean)).toBeLessThanOrEqual(0.01);
        expect(Math.abs(after.sd / before.sd - 1)).toBeLessThanOrEqual(0.01);
        // As of a parameter with ω = 0.6. Not of one with ω = 1: its sd rests on a handful of draws and was up to 20 % off.
        const ofExp = (values: Float64Array, weights: Float64Array) =>
          drawMoments(
            values.map((z) => Math.exp(0.6 * z)),
            weights,
          ).sd;
        expect(Math.abs(ofExp(kept.points[i]!, kept.weights) / ofExp(column, all.weights) - 1)).toBeLessThanOrEqual(
          0.04,
        );
        const at = [0.05, 0.5, 0.95];
        const whole = weightedQuantiles(column, all.weights, at);
        for (const [p, each] of weightedQuantiles(kept.points[i]!, kept.weights, at).entries()) {
          // As many plain draws would be off by 0.05 as a rule and 0.13 at worst in these sixty.
          expect(Math.abs(each - whole[p]!)).toBeLessThanOrEqual(0.06);
        }
      }
    }
  });

  test("far out the cells hold less weight", () => {
    const weightWhere = (isIn: (z: number) => boolean) => {
      const own = few.weights.filter((_, n) => isIn(Math.hypot(...few.points.map((column) => column[n]!))));
      return own.reduce((sum, each) => sum + each, 0) / own.length;
    };
    expect(weightWhere((z) => z > 3)).toBeLessThan(0.6 * weightWhere((z) => z < 1));
  });

  test("as many as there are: all of them; one draw with all the weight: it is kept; points without weight do no harm", () => {
    const all = thinnedDraws([Float64Array.of(3, 1, 2)], Float64Array.of(0.2, 0.3, 0.5), 3);
    expect([...all.points[0]!].sort()).toEqual([1, 2, 3]);
    const one = thinnedDraws([Float64Array.of(3, 1, 2, 7)], Float64Array.of(0, 0, 1, 0), 2);
    expect(one.weights.reduce((sum, each) => sum + each, 0)).toBe(1);
    expect(one.points[0]![one.weights.indexOf(1)]).toBe(2);
    const flat = thinnedDraws([new Float64Array(8).fill(5)], new Float64Array(8).fill(1 / 8), 4);
    expect([...flat.points[0]!]).toEqual([5, 5, 5, 5]);
  });
});
