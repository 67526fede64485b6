import { describe, expect, it } from "vitest";
import { type BatchLogDensity, type ImportanceSample, importanceSample } from "../../../src/core/numerics/index.ts";

type Drawn = Extract<ImportanceSample, { status: "drawn" }>;

function drawn(found: ImportanceSample): Drawn {
  if (found.status !== "drawn") throw new Error(found.status);
  return found;
}

const expectation = ({ points, weights }: Drawn, of: (x: number[]) => number) =>
  weights.reduce((sum, weight, n) => sum + weight * of(points.map((each) => each[n]!)), 0);

const PRECISION = [
  [2, 0.8, 0],
  [0.8, 1, -0.3],
  [0, -0.3, 0.5],
];
const MODE = [1, -2, 30];
const normal: BatchLogDensity = (points) =>
  points[0]!.map((_, n) => {
    const x = points.map((each, i) => each[n]! - MODE[i]!);
    return 77 - x.reduce((sum, each, i) => sum + each * PRECISION[i]!.reduce((s, p, j) => s + p * x[j]!, 0), 0) / 2;
  });
/** The inverse of PRECISION, determinant 0.5 (by hand): cofactors over it. */
const VARIANCES = [(1 * 0.5 - 0.09) / 0.5, (2 * 0.5) / 0.5, (2 - 0.64) / 0.5];

describe("a correlated normal density in three dimensions, 4,000 draws", () => {
  it("means to 0.01 and deviations to 1 % of a deviation, for 50 seeds; k̂ below 0.5, effective size above 3,000", () => {
    expect(PRECISION[0]![0]! * (0.5 - 0.09) - 0.8 * (0.8 * 0.5)).toBeCloseTo(0.5, 15);
    for (let seed = 1; seed <= 50; seed++) {
      const found = drawn(importanceSample({ logDensity: normal, mode: MODE, hessian: PRECISION, draws: 4000, seed }));
      expect(found.paretoK).toBeLessThan(0.5);
      expect(found.effectiveSize).toBeGreaterThan(3000);
      for (const i of [0, 1, 2]) {
        const deviation = Math.sqrt(VARIANCES[i]!);
        const mean = expectation(found, (x) => x[i]!);
        expect(Math.abs(mean - MODE[i]!) / deviation, `seed ${seed}`).toBeLessThanOrEqual(0.01);
        const spread = Math.sqrt(expectation(found, (x) => (x[i]! - mean) ** 2));
        expect(Math.abs(spread / deviation - 1), `seed ${seed}`).toBeLessThanOrEqual(0.01);
      }
    }
  });
});

describe("densities that are not normal", () => {
  it("ln of a gamma variate of shape 2: mean ψ(2), variance ψ′(2), to 0.005", () => {
    const found = drawn(
      importanceSample({
        logDensity: ([x]) => x!.map((each) => 2 * each - Math.exp(each)),
        mode: [Math.log(2)],
        hessian: [[2]],
        draws: 4096,
        seed: 9,
      }),
    );
    const mean = expectation(found, ([x]) => x!);
    // ψ(2) = 1 − γ, ψ′(2) = π²/6 − 1.
    expect(Math.abs(mean - (1 - 0.5772156649015329))).toBeLessThanOrEqual(0.005);
    expect(Math.abs(expectation(found, ([x]) => (x! - mean) ** 2) - (Math.PI ** 2 / 6 - 1))).toBeLessThanOrEqual(0.005);
    expect(found.paretoK).toBeLessThan(0.7);
  });

  it("an edge is fine: density 0 beyond it", () => {
    const found = drawn(
      importanceSample({
        logDensity: ([x]) => x!.map((each) => (each > 0 ? -each * each * 0.5 : -Infinity)),
        mode: [0],
        hessian: [[1]],
        draws: 4096,
        seed: 2,
      }),
    );
    // Half a normal: √(2/π); 0.003.
    expect(Math.abs(expectation(found, ([x]) => x!) - Math.sqrt(2 / Math.PI))).toBeLessThanOrEqual(0.003);
  });

  it("a density far wider than its curvature says is not trusted", () => {
    // A needle on a broad hill.
    const needle: BatchLogDensity = ([x, y]) =>
      x!.map((each, n) =>
        Math.log(
          Math.exp(-5e5 * (each * each + y![n]! * y![n]!)) + 0.99 * Math.exp(-(each * each + y![n]! * y![n]!) / 2),
        ),
      );
    const found = drawn(
      importanceSample({
        logDensity: needle,
        mode: [0, 0],
        hessian: [
          [5e5, 0],
          [0, 5e5],
        ],
        draws: 2000,
        seed: 1,
      }),
    );
    expect(found.paretoK).toBeGreaterThan(0.7);
  });
});

describe("edges", () => {
  it("same seed, same bits; the batch sees all points at once", () => {
    let calls = 0;
    const counted: BatchLogDensity = (points) => {
      calls++;
      return normal(points);
    };
    const draw = (seed: number) =>
      importanceSample({ logDensity: counted, mode: MODE, hessian: PRECISION, draws: 500, seed });
    expect(draw(1)).toEqual(draw(1));
    expect(calls).toBe(2);
    expect(draw(1)).not.toEqual(draw(2));
  });

  it("sets of points asked for again are those made anew, however many others came between", () => {
    const draw = (draws: number) =>
      importanceSample({ logDensity: normal, mode: MODE, hessian: PRECISION, draws, seed: 5 });
    const first = draw(300);
    const again = draw(300);
    for (let more = 301; more < 310; more++) draw(more);
    expect(again).toEqual(first);
    expect(draw(300)).toEqual(first);
  });

  it("no scale from a curvature that is not positive definite", () => {
    expect(
      importanceSample({
        logDensity: normal,
        mode: [0, 0],
        hessian: [
          [1, 2],
          [2, 1],
        ],
        draws: 100,
        seed: 1,
      }),
    ).toEqual({ status: "no-scale" });
  });

  it("refuses mistakes", () => {
    expect(() => importanceSample({ logDensity: normal, mode: [0], hessian: PRECISION, draws: 100, seed: 1 })).toThrow(
      /hessian: 3 rows/,
    );
    expect(() =>
      importanceSample({ logDensity: () => new Float64Array(1), mode: [0], hessian: [[1]], draws: 100, seed: 1 }),
    ).toThrow(/1 numbers for 100/);
    expect(() =>
      importanceSample({
        logDensity: ([x]) => x!.map(() => Number.NaN),
        mode: [0],
        hessian: [[1]],
        draws: 100,
        seed: 1,
      }),
    ).toThrow(/NaN/);
  });
});
