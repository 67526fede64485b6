import { describe, expect, it } from "vitest";
import { normalCdf, normalLogCdf, normalLogCdfSlope, normalQuantile } from "../../../src/core/numerics/index.ts";
import { fixtureFile, relative } from "./fixtureFile.ts";

type Text = string;
const { cdf, far, quantile } = fixtureFile<{
  cdf: [number, Text, Text, Text][];
  far: [number, Text, Text][];
  quantile: [number, Text][];
}>("distributions.json");

describe("against 50-digit values", () => {
  it("the part below: relative 1.5e-15", () => {
    expect(cdf.length).toBeGreaterThan(80);
    for (const [x, below] of cdf) expect(relative(normalCdf(x), Number(below)), `at ${x}`).toBeLessThanOrEqual(1.5e-15);
  });

  it("its logarithm: relative 1e-15, also where the part itself is below every double", () => {
    for (const [x, , log] of cdf) expect(relative(normalLogCdf(x), Number(log)), `at ${x}`).toBeLessThanOrEqual(1e-15);
    for (const [x, log] of far) expect(relative(normalLogCdf(x), Number(log)), `at ${x}`).toBeLessThanOrEqual(1e-15);
  });

  it("the slope of that logarithm: relative 1.5e-15", () => {
    for (const [x, , , slope] of cdf) {
      expect(relative(normalLogCdfSlope(x), Number(slope)), `at ${x}`).toBeLessThanOrEqual(1.5e-15);
    }
    for (const [x, , slope] of far) {
      expect(relative(normalLogCdfSlope(x), Number(slope)), `at ${x}`).toBeLessThanOrEqual(1.5e-15);
    }
  });

  it("the quantiles: 1e-15 relative, at least 1e-16", () => {
    for (const [p, x] of quantile) {
      const gap = Math.abs(normalQuantile(p) - Number(x));
      expect(gap, `at ${p}`).toBeLessThanOrEqual(Math.max(1e-16, 1e-15 * Math.abs(Number(x))));
    }
  });
});

describe("special values", () => {
  it("ends and middle", () => {
    expect([normalCdf(0), normalCdf(-Infinity), normalCdf(Infinity)]).toEqual([0.5, 0, 1]);
    expect([normalLogCdf(-Infinity), normalLogCdf(Infinity)]).toEqual([-Infinity, 0]);
    expect([normalLogCdfSlope(-Infinity), normalLogCdfSlope(Infinity)]).toEqual([Infinity, 0]);
    expect([normalQuantile(0), normalQuantile(0.5), normalQuantile(1)]).toEqual([-Infinity, 0, Infinity]);
    expect(normalLogCdf(-1e200)).toBe(-Infinity);
  });

  it("the quantile refuses what is no probability", () => {
    for (const p of [-0.1, 1.1, Number.NaN]) expect(() => normalQuantile(p)).toThrow(/must be 0 to 1/);
  });
});

it("quantile and part below undo each other over the tail, and both rise", () => {
  let before = -Infinity;
  for (let x = -37; x <= 8; x += 0.37) {
    const back = normalQuantile(normalCdf(x));
    // A rounding of p moves x by p/φ(x) of it: 1e-15 up to 0, more above.
    const rounding = 4e-16 / normalLogCdfSlope(x);
    expect(Math.abs(back - x)).toBeLessThanOrEqual(2e-15 * Math.max(1, Math.abs(x)) + rounding);
    expect(back).toBeGreaterThan(before);
    before = back;
  }
});

it("the slope is the slope of the logarithm: central differences, relative 3e-9", () => {
  for (const x of [-30, -6, -1, -0.01, 0.01, 1, 3]) {
    // h²·x²/6 of it is the difference's own error.
    const h = 1e-5 * Math.max(1, Math.abs(x));
    const slope = (normalLogCdf(x + h) - normalLogCdf(x - h)) / (2 * h);
    expect(relative(slope, normalLogCdfSlope(x))).toBeLessThanOrEqual(3e-9);
  }
});
