import { describe, expect, it } from "vitest";
import { seededRandom } from "../../../src/core/numerics/index.ts";
import { fixtureFile } from "./fixtureFile.ts";

const reference = fixtureFile<{ seed: number; first: number[]; last: number[]; uniform996to1000: number[] }>(
  "quasi_random.json",
);

describe("seededRandom", () => {
  it("is MT19937: the 10,000th number of seed 5489 as the C++ standard states it", () => {
    const { bits } = seededRandom(5489);
    let last = bits();
    expect(last).toBe(3_499_211_612);
    for (let n = 2; n <= 10_000; n++) last = bits();
    expect(last).toBe(4_123_659_995);
  });

  it("gives NumPy's numbers for another seed, past the first two fillings", () => {
    const { bits } = seededRandom(reference.seed);
    const all = Array.from({ length: 2000 }, bits);
    expect(all.slice(0, 3)).toEqual(reference.first);
    expect(all.slice(-3)).toEqual(reference.last);
  });

  it("uniform is NumPy's with the half place more: 2^-53", () => {
    const { uniform } = seededRandom(reference.seed);
    const all = Array.from({ length: 1000 }, uniform);
    for (const [i, wanted] of reference.uniform996to1000.entries()) {
      expect(Math.abs(all[995 + i]! - wanted)).toBeLessThanOrEqual(2 ** -53);
    }
  });

  it("same seed, same bits; another seed, others", () => {
    const draw = (seed: number) => {
      const random = seededRandom(seed);
      return Array.from({ length: 200 }, () => [random.uniform(), random.normal(), random.bits()]);
    };
    expect(draw(1)).toEqual(draw(1));
    expect(draw(1)).not.toEqual(draw(2));
  });

  it("moments of 100,000: uniform and normal within four standard errors", () => {
    const random = seededRandom(2024);
    const n = 100_000;
    let outside = 0;
    const sums = [0, 0, 0, 0, 0, 0];
    for (let i = 0; i < n; i++) {
      const u = random.uniform();
      if (!(u > 0 && u < 1)) outside++;
      const z = random.normal();
      for (const [k, term] of [u, u * u, z, z * z, z ** 3, z ** 4].entries()) sums[k] = sums[k]! + term / n;
    }
    expect(outside).toBe(0);
    // Mean and standard deviation of one draw of u, u², z, z², z³, z⁴.
    const wanted = [
      [1 / 2, Math.sqrt(1 / 12)],
      [1 / 3, Math.sqrt(4 / 45)],
      [0, 1],
      [1, Math.sqrt(2)],
      [0, Math.sqrt(15)],
      [3, Math.sqrt(96)],
    ] as const;
    for (const [k, [mean, deviation]] of wanted.entries()) {
      expect(Math.abs(sums[k]! - mean) / (deviation / Math.sqrt(n)), `moment ${k}`).toBeLessThanOrEqual(4);
    }
  });

  it("refuses other seeds", () => {
    for (const seed of [-1, 0.5, 2 ** 32, Number.NaN]) expect(() => seededRandom(seed)).toThrow(/seed/);
  });
});
