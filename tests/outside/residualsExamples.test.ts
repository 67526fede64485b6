import { describe, expect, it } from "vitest";
import { noncompartmental, residualsMethod } from "../../src/core/noncompartmental/index.ts";
import { relativeError, workedExample } from "./workedExample.ts";

const pointsOf = (id: string) => {
  const { t_h, C_mgL } = workedExample(id).inputs as { t_h: readonly number[]; C_mgL: readonly number[] };
  return t_h.map((time, i) => ({ time, value: C_mgL[i]! }));
};
const figures = (id: string) => workedExample(id).computed as Readonly<Record<string, never>>;

/*
 * W05: D. W. A. Bourne, PHAR 7632/7633 course notes, University of Oklahoma, ch. 9 page c0902 (the same table on page Ch0902, Table IX-1).
 * Printed there: late line 5.5·exp(−0.2·t), residual line 5.5·exp(−2.05·t). The regressions were computed in R and again in Python.
 */
describe("W05, curve stripping", () => {
  const points = pointsOf("W05");

  it.each([3, 4, 5])("terminal line from %i h, residuals up to 1 h, relative 1e-12", (from) => {
    const wanted: Readonly<Record<string, number>> = figures("W05")[`terminal points t>=${from} h, residuals t<=1 h`]!;
    const found = residualsMethod(points, { terminal: { from, to: 7 }, residual: { from: 0, to: 1 } });
    if (!found.ok) throw new Error(found.issues[0]?.code);
    const { ke, ka, terminal, residualLine, flags } = found.value;
    expect(relativeError(ke, wanted.ke!)).toBeLessThanOrEqual(1e-12);
    expect(relativeError(ka!, wanted.ka!)).toBeLessThanOrEqual(1e-12);
    expect(relativeError(Math.exp(terminal.intercept), wanted.A!)).toBeLessThanOrEqual(1e-12);
    expect(relativeError(Math.exp(residualLine!.intercept), wanted.residualIntercept!)).toBeLessThanOrEqual(1e-12);
    expect(flags).toEqual([]);
  });

  it("stays within the spread the source's rounding allows with the points chosen by itself", () => {
    const found = residualsMethod(points);
    if (!found.ok) throw new Error(found.issues[0]?.code);
    const { ke, ka, terminal, lag } = found.value;
    // Absolute bounds of the example: they hold whatever points are chosen.
    expect(ke).toBeGreaterThan(0.19);
    expect(ke).toBeLessThan(0.21);
    expect(ka).toBeGreaterThan(1.95);
    expect(ka).toBeLessThan(2.15);
    expect(Math.exp(terminal.intercept)).toBeGreaterThan(5.4);
    expect(Math.exp(terminal.intercept)).toBeLessThan(5.65);
    expect(lag).toBeLessThan(0.02);
  });

  it("has the printed residuals to the graph's reading: absolute 0.06", () => {
    const { residualColumn } = (
      workedExample("W05") as unknown as { printedInSource: { residualColumn: readonly number[] } }
    ).printedInSource;
    const found = residualsMethod(points, { terminal: { from: 3, to: 7 } });
    if (!found.ok) throw new Error(found.issues[0]?.code);
    for (const [i, printed] of residualColumn.entries()) {
      expect(Math.abs(found.value.residuals[i]!.residual - printed)).toBeLessThanOrEqual(0.06);
    }
  });
});

/*
 * W06: open courseware "Introduction to Pharmacokinetics - Oral Dosing - Introduction", page 3 (collegeofpharmacy); 500 mg, F 0.45.
 * Answers computed in R and again in Python. The dose is put in as F × dose, so clearance is CL itself.
 */
describe("W06, half-life, absorption rate and area", () => {
  const points = pointsOf("W06");
  const wanted: Readonly<Record<string, number>> = figures("W06");
  const terminal = { from: 3, to: 8 };

  it("terminal line and residuals, relative 1e-12", () => {
    const found = residualsMethod(points, { terminal, residual: { from: 0.5, to: 1.5 } });
    if (!found.ok) throw new Error(found.issues[0]?.code);
    expect(relativeError(found.value.ke, wanted.ke_t3to8!)).toBeLessThanOrEqual(1e-12);
    expect(relativeError(found.value.ka!, wanted.ka_from_residuals_t0p5to1p5!)).toBeLessThanOrEqual(1e-12);
    expect(relativeError(Math.exp(found.value.terminal.intercept), wanted.A!)).toBeLessThanOrEqual(1e-12);
  });

  it("flags that 1.40 is only 3 times 0.47", () => {
    const found = residualsMethod(points, { terminal, residual: { from: 0.5, to: 1.5 } });
    expect(found.ok && found.value.flags.map(({ code }) => code)).toEqual(["nca-rates-too-near"]);
  });

  it("area, half-life and clearance, relative 1e-12", () => {
    const found = noncompartmental(points, { dose: 500 * 0.45, method: "linear", terminal });
    if (!found.ok) throw new Error(found.issues[0]?.code);
    expect(relativeError(found.value.halfLife, wanted.halfLife_h!)).toBeLessThanOrEqual(1e-12);
    expect(relativeError(found.value.auc.linear, wanted.AUC0_8_linear!)).toBeLessThanOrEqual(1e-12);
    expect(relativeError(found.value.observed.auc, wanted.AUCinf_linear!)).toBeLessThanOrEqual(1e-12);
    expect(relativeError(found.value.observed.clearance, wanted.CL_L_h!)).toBeLessThanOrEqual(1e-12);
  });
});
