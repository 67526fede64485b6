import { describe, expect, it } from "vitest";
import { concentrationAfterDose } from "../../../src/core/kinetics/index.ts";
import { residualsMethod, wagnerNelson, wagnerNelsonRate } from "../../../src/core/noncompartmental/index.ts";
import { levelsAt, ORAL } from "./levelSets.ts";

const off = (found: number, wanted: number) => Math.abs(found - wanted) / Math.abs(wanted);
const kinetics = { ka: 2, ke: 0.15, volume: 30, bioavailability: 1, lag: 0 };
const drawn = (times: readonly number[], change: Partial<typeof kinetics> = {}) =>
  times.map((time) => ({ time, value: concentrationAfterDose({ ...kinetics, ...change }, 500, time) }));
const TIMES = [0, 0.25, 0.5, 0.75, 1, 1.25, 1.5, 2, 4, 8, 16, 20, 24, 30, 36];
/** From 16 h on absorption has left less than e^−32 of the dose: the line is the model's. */
const late = { from: 16, to: 36 };
const read = (points: ReturnType<typeof drawn>, options: Parameters<typeof residualsMethod>[1] = {}) => {
  const found = residualsMethod(points, options);
  if (!found.ok) throw new Error(found.issues[0]?.code);
  return found.value;
};
const codes = (found: { readonly flags: readonly { readonly code: string }[] }) => found.flags.map(({ code }) => code);

describe("method of residuals", () => {
  it("of an exact curve gives back both rates, relative 1e-11", () => {
    const found = read(drawn(TIMES), { terminal: late });
    expect(off(found.ke, 0.15)).toBeLessThanOrEqual(1e-11);
    expect(off(found.ka!, 2)).toBeLessThanOrEqual(1e-11);
    expect(Math.abs(found.lag!)).toBeLessThanOrEqual(1e-11);
    expect(found.flags).toEqual([]);
    expect(found.residuals.filter(({ isUsed }) => isUsed).map(({ time }) => time)).toEqual([
      0.25, 0.5, 0.75, 1, 1.25, 1.5,
    ]);
  });

  it("gives back a lag, absolute 1e-10 h", () => {
    const found = read(drawn(TIMES, { lag: 0.4 }), { terminal: late });
    expect(Math.abs(found.lag! - 0.4)).toBeLessThanOrEqual(1e-10);
    expect(found.residuals.find(({ time }) => time === 0.25)?.isUsed).toBe(false);
  });

  it("of flip-flop levels ka is the faster rate, whichever it is", () => {
    const found = read(drawn(TIMES, { ka: 0.15, ke: 2 }), { terminal: late });
    expect(off(found.ka!, 2)).toBeLessThanOrEqual(1e-11);
    expect(off(found.ke, 0.15)).toBeLessThanOrEqual(1e-11);
  });

  it("lines that meet before the dose mean no lag", () => {
    const points = [0.25, 0.5, 1, 2, 6, 8, 12].map((time) => ({
      time,
      value: 8 * Math.exp(-0.1 * time) - 7 * Math.exp(-2 * time),
    }));
    const found = read(points, { terminal: { from: 6, to: 12 } });
    expect(found.meetingTime).toBeCloseTo(Math.log(7 / 8) / 1.9, 3);
    expect(found.lag).toBe(0);
  });

  it.each<[string, number, string[]]>([
    ["6 times the terminal rate", 0.9, []],
    ["4 times", 0.6, ["nca-rates-near"]],
    ["twice", 0.3, ["nca-rates-too-near"]],
  ])("ka %s is flagged accordingly", (_, ka, flags) => {
    const times = [0, 0.5, 1, 1.5, 2, 3, 4, 60, 66, 72];
    expect(
      codes(read(drawn(times, { ka }), { terminal: { from: 60, to: 72 }, residual: { from: 0.5, to: 4 } })),
    ).toEqual(flags);
  });

  it("fewer than two residuals above 0 leave ka open and say so", () => {
    const found = read(levelsAt([0, 8, 4, 2, 1]));
    expect([found.ka, found.residualLine, found.meetingTime, found.lag]).toEqual([null, null, null, null]);
    expect(codes(found)).toEqual(["nca-residuals-few"]);
  });

  it("residuals that do not fall leave ka open and say so", () => {
    const found = read(levelsAt([0, 31.9, 10, 8, 4, 2]), { residual: [1, 2] });
    expect(found.ka).toBeNull();
    expect(codes(found)).toEqual(["nca-residuals-rise"]);
  });

  it("shows every early point, used or not", () => {
    const found = read(ORAL);
    expect(found.residuals.map(({ time }) => time)).toEqual(
      ORAL.slice(0, found.terminal.indices[0]).map(({ time }) => time),
    );
    for (const each of found.residuals) expect(each.residual).toBe(each.line - each.level);
  });
});

describe("Wagner–Nelson", () => {
  it("of a densely drawn curve the fraction is 1 − e^(−ka·t), absolute 2e-4, and gives back ka, relative 2e-3", () => {
    const times = Array.from({ length: 1201 }, (_, i) => i / 40);
    const found = wagnerNelson(drawn(times), 0.15, "linear-up-log-down");
    if (!found.ok) throw new Error(found.issues[0]?.code);
    for (const { time, fraction } of found.value.points) {
      expect(Math.abs(fraction + Math.expm1(-2 * time))).toBeLessThanOrEqual(2e-4);
    }
    const rate = wagnerNelsonRate(found.value, 0, 2);
    expect(rate.ok && off(rate.value.rate, 2)).toBeLessThanOrEqual(2e-3);
  });

  it("flags a level at the time of the dose", () => {
    const found = wagnerNelson(levelsAt([1, 8, 4, 2]), 0.5, "linear");
    expect(found.ok && codes(found.value)).toContain("nca-level-at-dose");
  });

  it("what remains and does not fall has no rate", () => {
    // Levels so low between that absorption seems to run backwards.
    const found = wagnerNelson(levelsAt([0, 9, 1, 1, 9, 9]), 0.01, "linear");
    if (!found.ok) throw new Error(found.issues[0]?.code);
    const rate = wagnerNelsonRate(found.value, 1, 3);
    expect(rate.ok ? [] : rate.issues.map(({ code }) => code)).toEqual(["nca-remaining-rises"]);
  });
});
