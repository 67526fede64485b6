import { describe, expect, test } from "vitest";
import { drawMoments } from "../../../src/core/estimation/index.ts";
import { mixtureSample } from "../../../src/core/estimation/mixtureSample.ts";

/** Two normal heaps, 3 parts at (−2, 0) and 1 part at (2, 1), standard deviations 0.5. */
const heaps = ([x, y]: readonly Float64Array[]) =>
  x!.map((each, n) => {
    const at = (a: number, b: number) => Math.exp(-2 * ((each - a) ** 2 + (y![n]! - b) ** 2));
    return Math.log(3 * at(-2, 0) + at(2, 1));
  });
const NARROW = [
  [4, 0],
  [0, 4],
];

describe("draws from several t distributions together", () => {
  const components = [
    { at: [-2, 0], hessian: NARROW, share: 0.5 },
    { at: [2, 1], hessian: NARROW, share: 0.5 },
  ];

  test("two heaps of unequal weight, 4,096 draws: means to 0.02, sd to 1 %, k̂ below 0.5", () => {
    for (const seed of [1, 2, 3]) {
      const sample = mixtureSample(heaps, components, 4096, seed);
      if (sample.status !== "drawn") throw new Error(sample.status);
      const [x, y] = sample.points.map((column) => drawMoments(column, sample.weights));
      // Mean ¾·(−2) + ¼·2 = −1; variance ¼ + ¾·¼·4² = 3.25. Of y: ¼, ¼ + 3/16.
      expect(Math.abs(x!.mean + 1)).toBeLessThanOrEqual(0.02);
      expect(Math.abs(y!.mean - 0.25)).toBeLessThanOrEqual(0.02);
      expect(Math.abs(x!.sd / Math.sqrt(3.25) - 1)).toBeLessThanOrEqual(0.01);
      expect(Math.abs(y!.sd / Math.sqrt(7 / 16) - 1)).toBeLessThanOrEqual(0.01);
      expect(sample.paretoK).toBeLessThan(0.5);
      expect(Math.abs(sample.weights.reduce((sum, each) => sum + each, 0) - 1)).toBeLessThanOrEqual(1e-12);
    }
  });

  test("the counts add up whatever the shares; a component that is no shape is said", () => {
    const odd = components.map((each, m) => ({ ...each, share: m === 0 ? 2 / 3 : 1 / 3 }));
    const sample = mixtureSample(heaps, odd, 1001, 1);
    if (sample.status !== "drawn") throw new Error(sample.status);
    expect(sample.points[0]).toHaveLength(1001);
    const flat = [
      [1, 0],
      [0, 0],
    ];
    expect(mixtureSample(heaps, [{ at: [0, 0], hessian: flat, share: 1 }], 256, 1)).toEqual({ status: "no-scale" });
  });
});
