import { describe, expect, it } from "vitest";
import { sobolPoints } from "../../../src/core/numerics/index.ts";
import { fixtureFile } from "./fixtureFile.ts";

const { sobolTimes256 } = fixtureFile<{ sobolTimes256: number[][] }>("quasi_random.json");

/** How many points lie in each box of 2^a by 2^b over two of the dimensions. */
function boxCounts(x: Float64Array, y: Float64Array, a: number, b: number): number[] {
  const counts = new Array<number>(2 ** (a + b)).fill(0);
  for (const [n, each] of x.entries()) {
    const box = Math.floor(each * 2 ** a) * 2 ** b + Math.floor(y[n]! * 2 ** b);
    counts[box] = counts[box]! + 1;
  }
  return counts;
}

describe("sobolPoints", () => {
  it("without a seed: SciPy's points to the bit, 256 in 16 dimensions", () => {
    expect(sobolTimes256).toHaveLength(16);
    expect(sobolPoints(16, 256, null).map((each) => Array.from(each, (x) => x * 256))).toEqual(sobolTimes256);
  });

  it.each([null, 1, 2, 77])(
    "seed %s: of 1,024 points each dimension has one in every 1,024th, and in any run of 2^m so",
    (seed) => {
      for (const points of sobolPoints(16, 1024, seed)) {
        expect(new Set(Array.from(points, (x) => Math.floor(x * 1024))).size).toBe(1024);
        for (const start of [0, 64, 192, 960]) {
          expect(new Set(Array.from(points.subarray(start, start + 64), (x) => Math.floor(x * 64))).size).toBe(64);
        }
      }
    },
  );

  it.each([null, 1, 2, 77])(
    "seed %s: the first two dimensions are a net: every box of area 2^-8 holds one of 256",
    (seed) => {
      const [x, y] = sobolPoints(2, 256, seed);
      for (let a = 0; a <= 8; a++) expect(boxCounts(x!, y!, a, 8 - a).every((count) => count === 1)).toBe(true);
    },
  );

  it("scrambling keeps what net the plain points are: dimensions 3 and 7, the same fullest box", () => {
    const plain = sobolPoints(7, 1024, null);
    for (const seed of [3, 9]) {
      const mixed = sobolPoints(7, 1024, seed);
      for (let a = 0; a <= 10; a++) {
        const fullest = (points: Float64Array[]) => Math.max(...boxCounts(points[2]!, points[6]!, a, 10 - a));
        expect(fullest(mixed)).toBe(fullest(plain));
      }
    }
  });

  it("random points would not: the test sees it", () => {
    const noise = (k: number) =>
      Float64Array.from({ length: 256 }, (_, n) => (Math.sin(n * 12.9898 + k * 78.233) * 43758.5453) % 1).map(Math.abs);
    expect(boxCounts(noise(1), noise(2), 4, 4).every((count) => count === 1)).toBe(false);
  });

  it("same seed, same bits; other seeds, other points; never 0 and never 1; each is even over the seeds", () => {
    expect(sobolPoints(5, 512, 4)).toEqual(sobolPoints(5, 512, 4));
    expect(sobolPoints(5, 512, 4)).not.toEqual(sobolPoints(5, 512, 5));
    let sum = 0;
    const seeds = 400;
    for (let seed = 0; seed < seeds; seed++) {
      const points = sobolPoints(3, 4, seed);
      expect(points.every((each) => each.every((x) => x > 0 && x < 1))).toBe(true);
      sum += points[2]![1]!;
    }
    // Four standard errors of a mean of 400 even numbers.
    expect(Math.abs(sum / seeds - 0.5)).toBeLessThanOrEqual((4 * Math.sqrt(1 / 12)) / Math.sqrt(seeds));
  });

  it("adds up better than chance: the mean of x·y·z over 4,096 points to 2e-4, where chance has 2e-3", () => {
    for (const seed of [1, 2, 3]) {
      const [x, y, z] = sobolPoints(3, 4096, seed);
      const mean = x!.reduce((sum, each, n) => sum + each * y![n]! * z![n]!, 0) / 4096;
      expect(Math.abs(mean - 1 / 8)).toBeLessThanOrEqual(2e-4);
    }
  });

  it("refuses what it has not", () => {
    expect(() => sobolPoints(17, 4, 1)).toThrow(/dimension: 17/);
    expect(() => sobolPoints(0, 4, 1)).toThrow(/dimension/);
    expect(() => sobolPoints(2, 0, 1)).toThrow(/count/);
    expect(() => sobolPoints(2, 4, -1)).toThrow(/seed/);
  });
});
