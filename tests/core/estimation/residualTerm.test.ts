import { describe, expect, test } from "vitest";
import type { ResidualModel } from "../../../src/core/estimation/index.ts";
import {
  type ResidualTerm,
  residualTerm,
  robustCdf,
  robustDensity,
  robustLogCdf,
} from "../../../src/core/estimation/residualTerm.ts";

const RESIDUAL = { additive: 0.3, proportional: 0.15 };
const term = (
  kind: "measured" | "below-limit",
  value: number,
  f: number,
  model: ResidualModel,
  residual = RESIDUAL,
) => {
  const out: ResidualTerm = { value: 0, slope: 0, curvature: 0 };
  residualTerm({ time: 0, value, kind }, f, residual, model, out);
  return out;
};
const CASES = (["normal", "robust"] as const).flatMap((model) =>
  (["measured", "below-limit"] as const).map((kind) => [model, kind] as const),
);
const PREDICTIONS = [0.01, 0.5, 2, 4.9, 5, 8, 40, 300];

describe("what one level adds", () => {
  test.each(CASES)("%s, %s: slope against central differences, 1e-8 of the larger of 1 and itself", (model, kind) => {
    for (const f of PREDICTIONS) {
      const h = 2e-4 * f;
      const at = (step: number) => term(kind, 5, f + step, model).value;
      const one = (at(h) - at(-h)) / (2 * h);
      const two = (at(2 * h) - at(-2 * h)) / (4 * h);
      const { slope, curvature } = term(kind, 5, f, model);
      expect(Math.abs((4 * one - two) / 3 - slope)).toBeLessThanOrEqual(1e-8 * Math.max(1, Math.abs(slope)));
      expect(curvature).toBeGreaterThanOrEqual(0);
    }
  });

  test("by hand: y 6, f 4, a 0.3, b 0.1: s = 0.5, z = 4; 1e-14", () => {
    const residual = { additive: 0.3, proportional: 0.1 };
    expect(term("measured", 6, 4, "normal", residual).value).toBeCloseTo(8 + Math.log(0.5), 14);
    expect(term("measured", 6, 4, "robust", residual).value).toBeCloseTo(2.5 * Math.log(5) + Math.log(0.5), 14);
    // −ln Φ(2), Φ(2) = 0.977249868051821 (tables).
    expect(term("below-limit", 5, 4, "normal", residual).value).toBeCloseTo(-Math.log(0.977249868051821), 14);
  });

  test("the expected curvature is the mean of the second derivative over what would be measured, 1e-5", () => {
    const f = 7;
    const s = Math.hypot(RESIDUAL.additive, RESIDUAL.proportional * f);
    const widening = (RESIDUAL.proportional ** 2 * f) / (s * s);
    for (const model of ["normal", "robust"] as const) {
      let mean = 0;
      let squares = 0;
      const density = (z: number) =>
        model === "normal" ? Math.exp((-z * z) / 2) / Math.sqrt(2 * Math.PI) : robustDensity(z);
      const step = 0.01;
      for (let z = -400; z <= 400; z += step) {
        const { slope } = term("measured", f + z * s, f, model);
        mean += density(z) * slope * step;
        squares += density(z) * slope * slope * step;
      }
      // Fisher information: the mean of the squared slope, whose own mean is 0.
      expect(Math.abs(mean)).toBeLessThanOrEqual(1e-5);
      expect(Math.abs(squares / term("measured", f, f, model).curvature - 1)).toBeLessThanOrEqual(1e-5);
      expect(widening).toBeGreaterThan(0);
    }
  });

  test("Student, 4 degrees: table values and tails; the impossible is Infinity, never NaN", () => {
    // t₄: P(t < 2.132) = 0.95, P(t < 4.604) = 0.995 (tables, 3 decimals of t).
    expect(robustCdf(2.132)).toBeCloseTo(0.95, 4);
    expect(robustCdf(4.604)).toBeCloseTo(0.995, 5);
    expect(robustCdf(0)).toBe(0.5);
    // Far below P → 3/8·4^(5/2)/(4·z⁴) = 3/z⁴.
    expect(Math.abs((Math.exp(robustLogCdf(-1e5).value) * 1e20) / 3 - 1)).toBeLessThanOrEqual(1e-8);
    const none = { additive: 0, proportional: 0.1 };
    for (const [model, kind] of CASES) {
      expect(term(kind, 1, 0, model, none)).toEqual({ value: Number.POSITIVE_INFINITY, slope: 0, curvature: 0 });
      for (const f of [0, 1e-30, 1e8]) expect(Object.values(term(kind, 1, f, model))).not.toContain(Number.NaN);
    }
  });
});
