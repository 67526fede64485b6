import { describe, expect, it } from "vitest";
import { generalisedParetoFit, paretoSmoothed, seededRandom } from "../../../src/core/numerics/index.ts";
import { fixtureFile, relative } from "./fixtureFile.ts";

const reference = fixtureFile<{
  cases: { logWeights: number[]; paretoK: number; effectiveSize: number; largest: [number, number][] }[];
  fit: { values: number[]; shape: number; scale: number };
}>("pareto_smoothed.json");

describe("against the formulas written separately", () => {
  it.each(reference.cases)("shape $paretoK: shape, effective size and the largest weights, relative 1e-10", (one) => {
    const found = paretoSmoothed(one.logWeights);
    expect(relative(found.paretoK, one.paretoK)).toBeLessThanOrEqual(1e-10);
    expect(relative(found.effectiveSize, one.effectiveSize)).toBeLessThanOrEqual(1e-10);
    for (const [at, weight] of one.largest) expect(relative(found.weights[at]!, weight)).toBeLessThanOrEqual(1e-10);
  });

  it("the fit before its prior on the shape: relative 1e-10", () => {
    const { values, shape, scale } = reference.fit;
    const found = generalisedParetoFit(Float64Array.from(values));
    const n = values.length;
    expect(relative((found!.shape * (n + 10) - 5) / n, shape)).toBeLessThanOrEqual(1e-10);
    expect(relative(found!.scale, scale)).toBeLessThanOrEqual(1e-10);
  });
});

/** Mean shape found over seeds, from weights that are draws of a generalised Pareto distribution of the given shape. */
function meanShape(shape: number, draws: number, seeds: number): number {
  let sum = 0;
  for (let seed = 1; seed <= seeds; seed++) {
    const { uniform } = seededRandom(seed);
    const logs = Float64Array.from({ length: draws }, () => {
      const rest = -Math.log(uniform());
      return Math.log(shape === 0 ? rest : Math.expm1(shape * rest) / shape);
    });
    sum += paretoSmoothed(logs).paretoK / seeds;
  }
  return sum;
}

it.each([0, 0.3, 0.5, 0.7, 1])(
  "tails of shape %d, 4,000 draws: 0.05 on the mean of 40 seeds, the weak prior towards 1/2 apart",
  (shape) => {
    // 190 in the tail: the prior moves it by 10/200 of its way to 1/2.
    const wanted = shape + (0.5 - shape) * (10 / 200);
    expect(Math.abs(meanShape(shape, 4000, 40) - wanted)).toBeLessThanOrEqual(0.05);
  },
);

describe("what smoothing does", () => {
  const { uniform } = seededRandom(3);
  const logs = Float64Array.from({ length: 1000 }, () => -0.8 * Math.log(uniform()));

  it("keeps the order, adds up to 1, leaves the body's ratios, and no weight exceeds the largest raw one", () => {
    const { weights, effectiveSize } = paretoSmoothed(logs);
    const order = Array.from(logs.keys()).sort((a, b) => logs[a]! - logs[b]!);
    for (let i = 1; i < order.length; i++) expect(weights[order[i]!]!).toBeGreaterThanOrEqual(weights[order[i - 1]!]!);
    // Rounding of 1,000 terms.
    expect(Math.abs(weights.reduce((sum, each) => sum + each, 0) - 1)).toBeLessThanOrEqual(1e-13);
    const [low, high] = [order[10]!, order[500]!];
    expect(relative(weights[high]! / weights[low]!, Math.exp(logs[high]! - logs[low]!))).toBeLessThanOrEqual(1e-12);
    const [body, last] = [order[500]!, order[999]!];
    expect(weights[last]! / weights[body]!).toBeLessThanOrEqual(Math.exp(logs[last]! - logs[body]!) * (1 + 1e-12));
    expect(effectiveSize).toBeGreaterThan(1);
    expect(effectiveSize).toBeLessThan(1000);
  });

  it("a common factor changes nothing: to 1e-10, even e^±800", () => {
    const base = paretoSmoothed(logs);
    for (const shift of [-800, 800]) {
      const moved = paretoSmoothed(logs.map((each) => each + shift));
      expect(relative(moved.paretoK, base.paretoK)).toBeLessThanOrEqual(1e-10);
      expect(relative(moved.effectiveSize, base.effectiveSize)).toBeLessThanOrEqual(1e-10);
    }
  });
});

describe("edges", () => {
  it("even weights have no tail", () => {
    const found = paretoSmoothed(new Float64Array(100).fill(-3));
    expect(found.paretoK).toBe(0);
    expect(found.weights.every((each) => Math.abs(each - 0.01) < 1e-16)).toBe(true);
    // Rounding of 100 squares.
    expect(Math.abs(found.effectiveSize - 100)).toBeLessThanOrEqual(1e-11);
  });

  it("too few to tell: Infinity, the weights as they are", () => {
    expect(paretoSmoothed([0, Math.log(3)])).toMatchObject({ paretoK: Infinity });
    expect(relative(paretoSmoothed([0, Math.log(3)]).weights[1]!, 0.75)).toBeLessThanOrEqual(1e-15);
  });

  it("weights of 0 are allowed; all of them 0 is no sample", () => {
    const some = Float64Array.from({ length: 100 }, (_, i) => (i % 2 ? -Infinity : Math.sin(i)));
    const found = paretoSmoothed(some);
    expect(Number.isFinite(found.paretoK)).toBe(true);
    expect(found.weights[1]).toBe(0);
    expect(paretoSmoothed(new Float64Array(50).fill(-Infinity))).toEqual({
      weights: new Float64Array(50),
      paretoK: Infinity,
      effectiveSize: 0,
    });
  });

  it("one draw that outweighs all others is not trusted, whether those are even or not", () => {
    const even = new Float64Array(2000);
    even[77] = 60;
    const found = paretoSmoothed(even);
    expect(found.paretoK).toBe(Infinity);
    expect(found.effectiveSize).toBeLessThan(1.001);
    const uneven = Float64Array.from({ length: 2000 }, (_, i) => (i === 77 ? 60 : Math.sin(i)));
    expect(paretoSmoothed(uneven).paretoK).toBeGreaterThan(0.7);
  });

  it("refuses NaN, Infinity and nothing", () => {
    expect(() => paretoSmoothed([])).toThrow(/at least one/);
    expect(() => paretoSmoothed([0, Number.NaN])).toThrow(/logWeights\[1\]: NaN/);
    expect(() => paretoSmoothed([Infinity])).toThrow(/Infinity/);
  });
});
