import { describe, expect, it } from "vitest";
import { adaptiveChain, type BatchLogDensity, importanceSample } from "../../../src/core/numerics/index.ts";

const normal: BatchLogDensity = (points) =>
  points[0]!.map((_, n) => -points.reduce((sum, x) => sum + x[n]! * x[n]!, 0) / 2);
const mean = (x: Float64Array) => x.reduce((sum, each) => sum + each, 0) / x.length;
const deviation = (x: Float64Array) => Math.sqrt(mean(x.map((each) => (each - mean(x)) ** 2)));
const IDENTITY = [
  [1, 0],
  [0, 1],
];

/** Four standard errors of a mean of that many independent draws, and nearly that of a standard deviation. */
const within = (effectiveSize: number) => 4 / Math.sqrt(effectiveSize);

describe("finds", () => {
  it("a normal density from a start two deviations off: means and deviations within four standard errors, three seeds", () => {
    for (const seed of [1, 2, 3]) {
      const found = adaptiveChain({ logDensity: normal, start: [2, -2], scale: IDENTITY, draws: 2000, seed });
      if (found.status !== "drawn") throw new Error(found.status);
      expect(found.rHat).toBeLessThanOrEqual(1.01);
      expect(found.effectiveSize).toBeGreaterThanOrEqual(400);
      for (const x of found.points) {
        expect(x).toHaveLength(2000);
        expect(Math.abs(mean(x))).toBeLessThanOrEqual(within(found.effectiveSize));
        expect(Math.abs(deviation(x) - 1)).toBeLessThanOrEqual(within(found.effectiveSize));
      }
    }
  });

  it("scales a hundred times off the guess, correlated 0.95", () => {
    const found = adaptiveChain({
      logDensity: ([x, y]) =>
        x!.map((each, n) => {
          const [a, b] = [each / 100, y![n]! * 10];
          return -(a * a - 1.9 * a * b + b * b) / (2 * (1 - 0.95 ** 2));
        }),
      start: [0, 0],
      scale: IDENTITY,
      draws: 2000,
      seed: 5,
    });
    if (found.status !== "drawn") throw new Error(found.status);
    expect(Math.abs(deviation(found.points[0]!) / 100 - 1)).toBeLessThanOrEqual(within(found.effectiveSize));
    expect(Math.abs(deviation(found.points[1]!) * 10 - 1)).toBeLessThanOrEqual(within(found.effectiveSize));
  });

  it("a density with an edge: x even over (0, 1), starts outside brought in", () => {
    const found = adaptiveChain({
      logDensity: ([x]) => x!.map((each) => (each > 0 && each < 1 ? 0 : -Infinity)),
      start: [0.5],
      scale: [[1]],
      draws: 2000,
      seed: 1,
    });
    if (found.status !== "drawn") throw new Error(found.status);
    expect(found.points[0]!.every((each) => each > 0 && each < 1)).toBe(true);
    expect(Math.abs(mean(found.points[0]!) - 0.5) * Math.sqrt(12)).toBeLessThanOrEqual(within(found.effectiveSize));
    expect(Math.abs(deviation(found.points[0]!) * Math.sqrt(12) - 1)).toBeLessThanOrEqual(within(found.effectiveSize));
  });

  it("the same skew density as importance sampling: medians within 0.1 deviations", () => {
    // ln of a gamma variate of shape 2, and a normal one about its half.
    const logDensity: BatchLogDensity = ([x, y]) =>
      x!.map((each, n) => 2 * each - Math.exp(each) - (y![n]! - each / 2) ** 2);
    const mode = [Math.log(2), Math.log(2) / 2];
    const hessian = [
      [2.5, -1],
      [-1, 2],
    ];
    const weighted = importanceSample({ logDensity, mode, hessian, draws: 4096, seed: 1 });
    const chain = adaptiveChain({ logDensity, start: mode, scale: IDENTITY, draws: 4000, seed: 1 });
    if (weighted.status !== "drawn" || chain.status !== "drawn") throw new Error("not drawn");
    for (const i of [0, 1]) {
      const one = weighted.points[i]!.reduce((sum, each, n) => sum + each * weighted.weights[n]!, 0);
      expect(Math.abs(one - mean(chain.points[i]!))).toBeLessThanOrEqual(within(chain.effectiveSize));
    }
  });
});

describe("withholds", () => {
  it("draws of chains that stay in heaps too far apart", () => {
    const heaps: BatchLogDensity = ([x]) =>
      x!.map((each) => Math.max(-((each - 500) ** 2) / 2, -((each + 500) ** 2) / 2 - 1));
    const seen = [1, 2, 3, 4].map((seed) =>
      adaptiveChain({ logDensity: heaps, start: [0], scale: [[1e4]], draws: 400, seed }),
    );
    const apart = seen.filter((found) => found.status === "not-converged");
    // All four starts in one heap happens by chance, once in eight; some of these four must be apart.
    expect(apart.length).toBeGreaterThan(0);
    for (const found of apart) expect(found.rHat > 1.01 || found.effectiveSize < 200).toBe(true);
    expect(apart[0]).not.toHaveProperty("points");
  });

  it("anything without a start or a scale", () => {
    const nowhere: BatchLogDensity = ([x]) => x!.map(() => -Infinity);
    expect(adaptiveChain({ logDensity: nowhere, start: [0], scale: [[1]], draws: 100, seed: 1 })).toEqual({
      status: "no-start",
    });
    expect(adaptiveChain({ logDensity: normal, start: [0], scale: [[-1]], draws: 100, seed: 1 })).toEqual({
      status: "no-scale",
    });
  });

  it("refuses mistakes", () => {
    const nan: BatchLogDensity = ([x]) => x!.map(() => Number.NaN);
    expect(() => adaptiveChain({ logDensity: nan, start: [0], scale: [[1]], draws: 100, seed: 1 })).toThrow(
      /logDensity: NaN/,
    );
    expect(() => adaptiveChain({ logDensity: normal, start: [0], scale: [[1]], draws: 10, seed: 1 })).toThrow(
      /draws: 10/,
    );
    expect(() => adaptiveChain({ logDensity: normal, start: [0, 0], scale: [[1]], draws: 100, seed: 1 })).toThrow(
      /scale: 1 rows/,
    );
    const short: BatchLogDensity = () => new Float64Array(1);
    expect(() => adaptiveChain({ logDensity: short, start: [0], scale: [[1]], draws: 100, seed: 1 })).toThrow(
      /1 numbers for 4/,
    );
  });
});

it("same seed, same bits; another seed, other draws", () => {
  const draw = (seed: number) =>
    adaptiveChain({ logDensity: normal, start: [0, 0], scale: IDENTITY, draws: 400, seed });
  expect(draw(3)).toEqual(draw(3));
  expect(draw(3)).not.toEqual(draw(4));
});
