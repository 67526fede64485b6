import { describe, expect, it } from "vitest";
import { chainDiagnostics, rankNormalised, seededRandom } from "../../../src/core/numerics/index.ts";
import { fixtureFile, relative } from "./fixtureFile.ts";

const { cases } = fixtureFile<{ cases: { name: string; chains: number[][]; rHat: number; effectiveSize: number }[] }>(
  "chain_diagnostics.json",
);

describe("against the formulas written separately", () => {
  it.each(cases)("$name: relative 1e-10", ({ chains, rHat, effectiveSize }) => {
    const found = chainDiagnostics(chains.map((chain) => Float64Array.from(chain)));
    expect(relative(found.rHat, rHat)).toBeLessThanOrEqual(1e-10);
    expect(relative(found.effectiveSize, effectiveSize)).toBeLessThanOrEqual(1e-10);
  });
});

const independent = (seed: number, change: (z: number, chain: number) => number = (z) => z) => {
  const random = seededRandom(seed);
  return [0, 1, 2, 3].map((chain) => Float64Array.from({ length: 500 }, () => change(random.normal(), chain)));
};

describe("what it sees", () => {
  it("independent draws agree and are worth their number", () => {
    const { rHat, effectiveSize } = chainDiagnostics(independent(1));
    expect(rHat).toBeLessThan(1.01);
    expect(effectiveSize).toBeGreaterThan(1600);
  });

  it("a chain elsewhere, a chain of another width, a chain that drifts, chains that stand still", () => {
    expect(chainDiagnostics(independent(2, (z, chain) => z + (chain === 0 ? 1 : 0))).rHat).toBeGreaterThan(1.05);
    expect(chainDiagnostics(independent(3, (z, chain) => z * (chain === 0 ? 4 : 1))).rHat).toBeGreaterThan(1.05);
    let n = 0;
    expect(chainDiagnostics(independent(4, (z) => z + (n++ % 500) / 150)).rHat).toBeGreaterThan(1.05);
    expect(chainDiagnostics(independent(5, () => 3))).toEqual({ rHat: Infinity, effectiveSize: 0 });
  });

  it("correlation ρ between neighbours leaves about (1 − ρ)/(1 + ρ) of the draws: within 25 %", () => {
    for (const correlation of [0.5, 0.8]) {
      const sizes = [1, 2, 3, 4, 5].map((seed) => {
        let before = 0;
        return chainDiagnostics(
          independent(seed, (z) => {
            before = correlation * before + Math.sqrt(1 - correlation ** 2) * z;
            return before;
          }),
        ).effectiveSize;
      });
      const mean = sizes.reduce((sum, each) => sum + each, 0) / sizes.length;
      expect(relative(mean, (2000 * (1 - correlation)) / (1 + correlation))).toBeLessThanOrEqual(0.25);
    }
  });

  it("any rising change of scale leaves the effective size", () => {
    const plain = chainDiagnostics(independent(6));
    expect(chainDiagnostics(independent(6, Math.exp)).effectiveSize).toBe(plain.effectiveSize);
  });
});

it("ranks: ties share theirs", () => {
  const [first, second] = rankNormalised([Float64Array.of(1, 5, 5), Float64Array.of(9)]);
  expect(first![1]).toBe(first![2]);
  // Φ⁻¹ of 0.625/4.25, 2.125/4.25, 3.625/4.25.
  expect([first![1], second![0]! + first![0]!].every((each) => Math.abs(each!) <= 1e-15)).toBe(true);
  // Φ⁻¹(0.625/4.25) by mpmath 1.3.0, 1e-15.
  expect(Math.abs(first![0]! + 1.0491313979639705)).toBeLessThanOrEqual(1e-15);
});

it("refuses chains that can't be compared", () => {
  expect(() => chainDiagnostics([new Float64Array(10)])).toThrow(/at least 2/);
  expect(() => chainDiagnostics([new Float64Array(10), new Float64Array(12)])).toThrow(/same even number/);
  expect(() => chainDiagnostics([new Float64Array(9), new Float64Array(9)])).toThrow(/same even number/);
});
