import { describe, expect, it } from "vitest";
import { DormandPrince } from "../../../src/core/numerics/index.ts";

/** A pendulum: nonlinear, two components, so that every coefficient counts. */
const pendulum = (y: Float64Array, change: Float64Array) => {
  change[0] = y[1]!;
  change[1] = -Math.sin(y[0]!);
};

function errorOf(h: number): { error: number; estimate: number } {
  const start = Float64Array.of(1, 0.5);
  const one = new DormandPrince(2, pendulum);
  one.step(start, h);
  // The same stretch in 64 steps is exact by comparison.
  const many = new DormandPrince(2, pendulum);
  let y = start;
  for (let i = 0; i < 64; i++) {
    many.step(y, h / 64);
    y = many.result.slice();
  }
  return { error: Math.abs(one.result[0]! - y[0]!), estimate: Math.abs(one.error[0]!) };
}

describe("DormandPrince", () => {
  it("has a local error of sixth order and an estimate of fifth", () => {
    const wide = errorOf(0.1);
    const narrow = errorOf(0.05);
    expect(Math.log2(wide.error / narrow.error)).toBeGreaterThan(5.5);
    expect(Math.log2(wide.error / narrow.error)).toBeLessThan(6.6);
    expect(Math.log2(wide.estimate / narrow.estimate)).toBeGreaterThan(4.5);
    expect(Math.log2(wide.estimate / narrow.estimate)).toBeLessThan(5.6);
    expect(narrow.estimate).toBeGreaterThan(narrow.error);
  });

  it("integrates polynomials up to the fifth degree exactly, to rounding", () => {
    // y₀ is time, y₁ = t⁵.
    const solver = new DormandPrince(2, (y, change) => {
      change[0] = 1;
      change[1] = 5 * y[0]! ** 4;
    });
    solver.step(Float64Array.of(1, 1), 1);
    expect(Math.abs(solver.result[1]! - 32)).toBeLessThanOrEqual(1e-13);
    expect(Math.abs(solver.error[1]!)).toBeGreaterThan(0);
  });

  it("leaves the state it starts from as it is", () => {
    const y = Float64Array.of(1);
    const solver = new DormandPrince(1, (v, change) => {
      change[0] = -v[0]!;
    });
    solver.step(y, 0.1);
    expect(y[0]).toBe(1);
    expect(Math.abs(solver.result[0]! - Math.exp(-0.1))).toBeLessThanOrEqual(1e-9);
  });
});
