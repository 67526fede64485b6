import { describe, expect, it } from "vitest";
import { chiSquareQuantile, logGamma, studentTLogDensity } from "../../../src/core/numerics/index.ts";
import { fixtureFile, relative } from "./fixtureFile.ts";

const reference = fixtureFile<{
  logGamma: [number, string][];
  studentT: [number, number, number, string][];
  chiSquare: [number, number, string][];
}>("distributions.json");

describe("against 50-digit values", () => {
  it("ln Γ: 5e-15, relative above 1", () => {
    for (const [x, wanted] of reference.logGamma) {
      const gap = Math.abs(logGamma(x) - Number(wanted)) / Math.max(1, Math.abs(Number(wanted)));
      expect(gap, `at ${x}`).toBeLessThanOrEqual(5e-15);
    }
  });

  it("ln of the t density: 1e-14 relative above 1, 1e-12 for 1,000 degrees (a difference of large ln Γ)", () => {
    expect(reference.studentT.length).toBe(90);
    for (const [q, degrees, dimension, wanted] of reference.studentT) {
      const gap =
        Math.abs(studentTLogDensity(q, degrees, dimension) - Number(wanted)) / Math.max(1, Math.abs(Number(wanted)));
      expect(gap, `${q} ${degrees} ${dimension}`).toBeLessThanOrEqual(degrees === 1000 ? 1e-12 : 1e-14);
    }
  });

  it("chi-square quantiles: relative 4e-15, 1e-13 at p = 1e-300", () => {
    for (const [p, degrees, wanted] of reference.chiSquare) {
      const most = p === 1e-300 ? 1e-13 : 4e-15;
      expect(relative(chiSquareQuantile(p, degrees), Number(wanted)), `${p} ${degrees}`).toBeLessThanOrEqual(most);
    }
  });
});

describe("special values and mistakes", () => {
  it("ends", () => {
    expect([chiSquareQuantile(0, 4), chiSquareQuantile(1, 4)]).toEqual([0, Infinity]);
    // 2 degrees: −2·ln(1 − p); relative 1e-15.
    expect(relative(chiSquareQuantile(0.3, 2), -2 * Math.log1p(-0.3))).toBeLessThanOrEqual(1e-15);
  });

  it("the t density adds up to 1: 4 degrees, trapezium over ±200, 1e-6", () => {
    let sum = 0;
    for (let x = -200; x <= 200; x += 0.01) sum += 0.01 * Math.exp(studentTLogDensity(x * x, 4));
    // Beyond 200: 2·4·(3/8)·4^(5/2)/(4·4·200⁴) is below 1e-8.
    expect(Math.abs(sum - 1)).toBeLessThanOrEqual(1e-6);
  });

  it("refuse what they don't cover", () => {
    expect(() => chiSquareQuantile(0.5, 3)).toThrow(/even number/);
    expect(() => chiSquareQuantile(0.5, 42)).toThrow(/even number/);
    expect(() => chiSquareQuantile(1.5, 4)).toThrow(/0 to 1/);
    expect(() => logGamma(0)).toThrow(/above 0/);
    expect(() => studentTLogDensity(-1, 4)).toThrow(/squaredLength/);
    expect(() => studentTLogDensity(1, 0)).toThrow(/degrees/);
  });
});
