import { describe, expect, it } from "vitest";
import { type LearntInput, learntScene } from "../../../src/view/chart/learntScene.ts";

const values = Array.from({ length: 61 }, (_, i) => 3 * Math.exp(-0.9 + (1.8 * i) / 60));
const bell = (centre: number, sd: number) =>
  values.map((value) => Math.exp(-0.5 * (Math.log(value / centre) / sd) ** 2));
const input: LearntInput = {
  width: 300,
  height: 118,
  margin: { top: 6, right: 14, bottom: 22, left: 14 },
  values,
  prior: bell(3, 0.3),
  posterior: bell(2.5, 0.1),
  typical: 3,
  mostLikely: 2.5,
  interval: { low: 2.1, median: 2.5, high: 2.95 },
};
const xs = (path: string) => [...path.matchAll(/[ML](-?[\d.]+),/g)].map(([, x]) => Number(x));
const peakX = (path: string) => {
  const points = [...path.matchAll(/[ML](-?[\d.]+),(-?[\d.]+)/g)].map(([, x, y]) => ({ x: Number(x), y: Number(y) }));
  return points.reduce((best, point) => (point.y < best.y ? point : best)).x;
};

describe("learntScene", () => {
  it("draws both on one axis: the prior peaks at the typical value, the posterior at the most likely", () => {
    const scene = learntScene(input);
    // Half a step of the grid: 272 px over 61 points.
    expect(Math.abs(peakX(scene.prior) - scene.typicalX)).toBeLessThan(2.5);
    expect(Math.abs(peakX(scene.posteriorLine) - scene.mostLikelyX)).toBeLessThan(2.5);
    expect(scene.mostLikelyX).toBeLessThan(scene.typicalX);
  });

  it("is symmetric on its log axis where the density is log-normal", () => {
    const drawn = xs(learntScene({ ...input, posterior: input.prior }).prior);
    const middle = (Math.min(...drawn) + Math.max(...drawn)) / 2;
    expect(Math.abs(peakX(learntScene(input).prior) - middle)).toBeLessThan(2.5);
  });

  it("keeps everything inside the plot, the interval about its median", () => {
    const scene = learntScene(input);
    for (const x of [...xs(scene.prior), ...xs(scene.posterior), scene.interval.x1, scene.interval.x2]) {
      expect(x).toBeGreaterThanOrEqual(scene.plot.left - 0.01);
      expect(x).toBeLessThanOrEqual(scene.plot.right + 0.01);
    }
    expect(scene.interval.x1).toBeLessThan(scene.interval.median);
    expect(scene.interval.median).toBeLessThan(scene.interval.x2);
  });

  it("has at least two ticks, far enough apart for their figures", () => {
    const { ticks } = learntScene(input);
    expect(ticks.length).toBeGreaterThanOrEqual(2);
    for (const [i, tick] of ticks.slice(1).entries()) expect(tick.x - ticks[i]!.x).toBeGreaterThanOrEqual(34);
  });

  it("a fixed parameter, all on one value, still has an axis", () => {
    const scene = learntScene({
      ...input,
      values: [3],
      prior: [1],
      posterior: [1],
      mostLikely: 3,
      interval: { low: 3, median: 3, high: 3 },
    });
    expect(Number.isFinite(scene.typicalX)).toBe(true);
    expect(scene.typicalX).toBeCloseTo(150, 9);
  });
});
