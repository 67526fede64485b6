import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { concentrationAfterDose, steadyState, steadyStateConcentration } from "../../../src/core/kinetics/index.ts";
import {
  type AreaMethod,
  type LevelPoint,
  noncompartmental,
  type PointChoice,
  type WithinInterval,
} from "../../../src/core/noncompartmental/index.ts";
import { levelsAt, ORAL } from "./levelSets.ts";

const off = (found: number, wanted: number) => Math.abs(found - wanted) / Math.abs(wanted);
const afterOne = (
  points: readonly LevelPoint[],
  dose: number,
  method: AreaMethod = "linear-up-log-down",
  terminal?: PointChoice,
) => {
  const found = noncompartmental(points, { dose, method, ...(terminal ? { terminal } : {}) });
  if (!found.ok) throw new Error(found.issues[0]?.code);
  return found.value;
};
const within = (
  points: readonly LevelPoint[],
  dose: number,
  tau: number,
  method: AreaMethod = "linear-up-log-down",
) => {
  const found = noncompartmental(points, { dose, method, tau });
  if (!found.ok) throw new Error(found.issues[0]?.code);
  return found.value;
};
const codes = (found: { readonly flags: readonly { readonly code: string }[] }) => found.flags.map(({ code }) => code);
const hourly = (to: number, step: number) => Array.from({ length: to / step + 1 }, (_, i) => i * step);

describe("after one dose", () => {
  it("of a single exponential every figure is exact, relative 1e-13", () => {
    const rate = fc.double({ min: 0.02, max: 2, noNaN: true });
    const start = fc.double({ min: 0.1, max: 500, noNaN: true });
    const steps = fc.array(fc.double({ min: 0.1, max: 6, noNaN: true }), { minLength: 4, maxLength: 10 });
    fc.assert(
      fc.property(rate, start, steps, fc.double({ min: 1, max: 2000, noNaN: true }), (k, c0, gaps, dose) => {
        let time = 0;
        const times = [0, ...gaps.map((gap) => (time += gap))];
        const found = afterOne(
          times.map((t) => ({ time: t, value: c0 * Math.exp(-k * t) })),
          dose,
        );
        const tolerance = 1e-13 * (1 + 1 / (k * (times.at(-1)! - times[1]!)));
        expect(off(found.halfLife, Math.LN2 / k)).toBeLessThanOrEqual(tolerance);
        expect(off(found.observed.auc, c0 / k)).toBeLessThanOrEqual(tolerance);
        expect(off(found.predicted.auc, c0 / k)).toBeLessThanOrEqual(tolerance);
        expect(off(found.observed.aumc, c0 / k / k)).toBeLessThanOrEqual(3 * tolerance);
        expect(off(found.observed.mrt, 1 / k)).toBeLessThanOrEqual(3 * tolerance);
        expect(off(found.observed.clearance, (dose * k) / c0)).toBeLessThanOrEqual(tolerance);
        expect(off(found.observed.volume, dose / c0)).toBeLessThanOrEqual(3 * tolerance);
        expect(off(found.observed.extrapolatedShare, Math.exp(-k * time))).toBeLessThanOrEqual(3 * tolerance);
      }),
      { seed: 20264, numRuns: 300 },
    );
  });

  it("of a densely drawn oral curve clearance, volume and residence time are the model's, relative 2e-4", () => {
    const kinetics = { ka: 1.2, ke: 0.1, volume: 30, bioavailability: 0.8, lag: 0 };
    const points = hourly(60, 0.1).map((time) => ({ time, value: concentrationAfterDose(kinetics, 400, time) }));
    const found = afterOne(points, 0.8 * 400, "linear-up-log-down", { from: 40, to: 60 });
    expect(off(found.observed.clearance, 3)).toBeLessThanOrEqual(2e-4);
    expect(off(found.observed.volume, 30)).toBeLessThanOrEqual(2e-4);
    // Mean time in the body, and that of absorption: 1/ke + 1/ka.
    expect(off(found.observed.mrt, 1 / 0.1 + 1 / 1.2)).toBeLessThanOrEqual(2e-4);
    expect(codes(found)).toEqual([]);
  });

  it("scales: levels tenfold leave times as they are, clearance for the same dose a tenth", () => {
    const one = afterOne(ORAL, 320);
    const ten = afterOne(
      ORAL.map(({ time, value }) => ({ time, value: 10 * value })),
      320,
    );
    expect(off(ten.halfLife, one.halfLife)).toBeLessThanOrEqual(1e-13);
    expect(off(ten.observed.mrt, one.observed.mrt)).toBeLessThanOrEqual(1e-13);
    expect(off(ten.observed.clearance * 10, one.observed.clearance)).toBeLessThanOrEqual(1e-13);
    expect(off(ten.auc.linear, 10 * one.auc.linear)).toBeLessThanOrEqual(1e-13);
  });

  it("flags more than a fifth carried on, and not a fifth", () => {
    // c0·e^(−k·t) at the last point is the share carried on.
    const share = (part: number) => afterOne(levelsAt([0, 1, 2, 3].map((t) => 8 * part ** (t / 3))), 100);
    expect(share(0.21).observed.extrapolatedShare).toBeCloseTo(0.21, 12);
    expect(codes(share(0.21))).toContain("nca-extrapolated-much");
    expect(codes(share(0.19))).not.toContain("nca-extrapolated-much");
  });

  it("flags a level that was there before, and an area that begins late", () => {
    expect(codes(afterOne(levelsAt([0.74, 8, 4, 2, 0.1]), 100))).toEqual(["nca-level-at-dose"]);
    expect(codes(afterOne(levelsAt([1, 8, 4, 2, 0.1], [0.5, 1, 2, 3, 7]), 100))).toEqual(["nca-area-begins-late"]);
  });

  it("ends the area at the last level above 0 when the user has picked the terminal points before it", () => {
    const points = levelsAt([0, 8, 4, 2, 1, 0, 0]);
    const found = noncompartmental(points, { dose: 100, method: "linear", terminal: [2, 3, 4] });
    expect(found.ok && [found.value.tlast, found.value.clast, found.value.auc.linear]).toEqual([4, 1, 14.5]);
  });
});

describe("within one steady-state interval", () => {
  const kinetics = { ka: 0.9, ke: 0.12, volume: 25, bioavailability: 1, lag: 0 };
  const tau = 12;
  const at = (times: readonly number[]) =>
    times.map((time) => {
      const value = steadyStateConcentration(kinetics, 300, tau, Math.min(time, tau));
      // No dose at the end of the interval: elimination alone, as absorption is over.
      return { time, value: value * Math.exp(-kinetics.ke * Math.max(0, time - tau)) };
    });
  const settled = steadyState(kinetics, 300, tau);

  it("densely drawn, clearance and average are the model's, relative 1e-4", () => {
    const found = within(at(hourly(12, 0.1)), 300, tau);
    expect(off(found.interval.clearance, 3)).toBeLessThanOrEqual(1e-4);
    expect(off(found.interval.average, settled.average)).toBeLessThanOrEqual(1e-4);
    expect(off(found.interval.auc, settled.auc)).toBeLessThanOrEqual(1e-4);
    expect([found.interval.startFrom, found.interval.endFrom, found.interval.extrapolatedShare]).toEqual([
      "measured",
      "measured",
      0,
    ]);
    expect(codes(found)).toEqual([]);
  });

  it.each<[string, readonly number[], WithinInterval["interval"]["startFrom"], string, string[]]>([
    ["both ends drawn", [0, 1, 2, 4, 8, 12], "measured", "measured", []],
    ["no level at the end", [0, 1, 2, 4, 8], "measured", "other-end", ["nca-extrapolated-much", "nca-end-from-start"]],
    ["no level at the start", [1, 2, 4, 8, 12], "other-end", "measured", ["nca-start-from-end"]],
    ["neither", [1, 2, 4, 6, 8, 10], "other-end", "line", ["nca-start-from-end", "nca-end-from-line"]],
    ["neither, drawn on after it", [1, 2, 4, 8, 11, 13], "other-end", "between", ["nca-start-from-end"]],
  ])("%s: says where the ends come from, and comes within 4 percent", (_, times, startFrom, endFrom, flags) => {
    const found = within(at(times), 300, tau);
    expect([found.interval.startFrom, found.interval.endFrom]).toEqual([startFrom, endFrom]);
    expect(codes(found)).toEqual(flags);
    expect(off(found.interval.auc, settled.auc)).toBeLessThanOrEqual(0.04);
    expect(off(found.interval.endLevel, settled.trough)).toBeLessThanOrEqual(0.04);
    const start = startFrom === "measured" ? found.firstLevel : found.interval.endLevel;
    expect(found.interval.startLevel).toBe(start);
    expect(found.interval.average).toBe(found.interval.auc / tau);
    expect(found.interval.clearance).toBe(300 / found.interval.auc);
  });

  it("needs no terminal line when both ends are drawn: flat levels have an area and a clearance", () => {
    const found = within(levelsAt([5, 5, 5, 5], [0, 4, 8, 12]), 300, tau);
    expect([found.interval.auc, found.interval.clearance, found.halfLife, found.interval.volume]).toEqual([
      60,
      5,
      null,
      null,
    ]);
    expect(found.terminalIssues.map(({ code }) => code)).toEqual(["nca-levels-equal"]);
  });

  it("but says why there is none when the end hangs on it", () => {
    const found = noncompartmental(levelsAt([1, 2, 3, 4], [1, 2, 4, 8]), { dose: 300, method: "linear", tau });
    expect(found.ok ? [] : found.issues.map(({ code }) => code)).toEqual(["nca-terminal-few"]);
  });

  it("cuts at the end of the interval on the line the method draws: a single exponential stays exact, relative 1e-14", () => {
    const points = [0, 3, 6, 10, 14, 20].map((time) => ({ time, value: 9 * Math.exp(-0.2 * time) }));
    const found = within(points, 300, tau);
    expect(off(found.interval.endLevel, 9 * Math.exp(-2.4))).toBeLessThanOrEqual(1e-14);
    expect(off(found.interval.auc, -45 * Math.expm1(-2.4))).toBeLessThanOrEqual(1e-14);
    const linear = within(points, 300, tau, "linear");
    expect(off(linear.interval.endLevel, (9 * (Math.exp(-2) + Math.exp(-2.8))) / 2)).toBeLessThanOrEqual(1e-14);
  });
});
