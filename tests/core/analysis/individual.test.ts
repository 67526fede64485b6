import { describe, expect, it, test } from "vitest";
import { omegaOfVariation } from "../../../src/core/analysis/fitProblem.ts";
import { type Analysis, derive, deriveSteps, type IndividualFit } from "../../../src/core/analysis/index.ts";
import type { Case, Level } from "../../../src/core/case/index.ts";
import { mapEstimate, type OralProblem, posterior } from "../../../src/core/estimation/index.ts";
import { demoCase } from "../../fixtures/demoCase.ts";
import { caseFixture } from "./caseFixture.ts";

const TROUGH: Level = {
  id: "l1",
  at: "2026-03-04T07:30:00+00:00",
  quantity: { value: 5, unit: "mg/L" },
  kind: "measured",
};
const SECOND: Level = { ...TROUGH, id: "l2", at: "2026-03-03T14:00:00+00:00", quantity: { value: 6.1, unit: "mg/L" } };

const relative = (found: number, wanted: number) => Math.abs(found / wanted - 1);

function fitted(value: Case): { readonly analysis: Analysis; readonly fit: IndividualFit } {
  const analysis = derive(value, { isFitted: true });
  if (analysis.fit.kind !== "fitted") throw new Error(JSON.stringify(analysis.fit));
  return { analysis, fit: analysis.fit.fit };
}

/** The record with other variation between patients; `null` takes it away. */
function varied(value: Case, change: Partial<Record<keyof Case["medicine"]["variability"], number | null>>): Case {
  const entries = Object.entries(value.medicine.variability).flatMap(([name, figure]) => {
    const wanted = change[name as keyof typeof change];
    if (wanted === null) return [];
    return [[name, wanted === undefined || Array.isArray(figure) ? figure : { ...figure, value: wanted }]];
  });
  return { ...value, medicine: { ...value.medicine, variability: Object.fromEntries(entries) } };
}

describe("one level of a theophylline case", () => {
  const value = caseFixture({ levels: [TROUGH] });
  const { analysis, fit } = fitted(value);
  const typical = analysis.typical!;
  const product = typical.products.find((each) => each.product === "tablet-12h")!;
  const problem: OralProblem = {
    population: {
      clearance: typical.clearance!.value,
      volume: typical.volume.value,
      ka: product.absorptionRate!.value,
      bioavailability: product.bioavailability.value,
      lag: product.lag.value,
    },
    omega: {
      clearance: omegaOfVariation(0.335),
      volume: omegaOfVariation(0.125),
      ka: omegaOfVariation(0.19),
    },
    residual: { additive: 0, proportional: 0.143 },
    doses: analysis.given.map((mark) => ({ time: mark.atH, amount: mark.countedMg })),
    levels: [{ time: analysis.levels[0]!.atH, value: 5, kind: "measured" }],
  };

  it("is the fit of the simple door with the record's figures put in", () => {
    const map = mapEstimate(problem);
    if (map.status !== "converged") throw new Error(map.status);
    const [clearance, volume, ka] = fit.parameters;
    expect([clearance!.symbol, volume!.symbol, ka!.symbol]).toEqual(["CL", "V", "ka"]);
    expect(relative(clearance!.mostLikely, map.clearance)).toBeLessThan(1e-9);
    expect(relative(volume!.mostLikely, map.volume)).toBeLessThan(1e-9);
    expect(relative(ka!.mostLikely, map.ka)).toBeLessThan(1e-9);
    const drawn = posterior(problem, { draws: fit.draws, seed: fit.seed });
    expect(relative(clearance!.posterior.q50, drawn.summary.clearance!.q50)).toBeLessThan(1e-9);
    expect(relative(clearance!.posteriorSd, drawn.summary.clearance!.sd)).toBeLessThan(1e-9);
  });

  it("pulls the prediction from the typical patient's towards the level, and says how much was taught of what", () => {
    const [level] = analysis.levels;
    const { predicted } = level!.fit!;
    const typicalAt = level!.predicted!;
    expect(Math.abs(predicted.q50 - 5)).toBeLessThan(Math.abs(typicalAt - 5));
    expect(predicted.q05).toBeLessThan(predicted.q50);
    expect(predicted.q50).toBeLessThan(predicted.q95);
    const [clearance, , ka] = fit.parameters;
    expect(clearance!.taught).toBeGreaterThan(0.4);
    expect(ka!.taught).toBeLessThan(0.1);
    expect(level!.fit!.influence).toBeNull();
    expect(level!.fit!.forecast!.levelsKnown).toBe(0);
  });

  it("gives every option a band and readings, the typical patient's left as they are", () => {
    const [option] = analysis.options;
    const plain = derive(value).options[0]!;
    expect(option!.typical).toEqual(plain.typical);
    expect(plain.individual).toBeNull();
    const { individual, band } = option!;
    expect(individual!.steadyState!.lowest.q05).toBeLessThan(individual!.steadyState!.lowest.q95);
    const { below, within, above } = individual!.steadyChance!;
    expect(below + within + above).toBeCloseTo(1, 12);
    const { timesH, q05, q25, q50, q75, q95 } = band!;
    for (const [i] of timesH.entries()) {
      expect([q05[i], q25[i], q50[i], q75[i], q95[i]]).toEqual(
        [q05[i]!, q25[i]!, q50[i]!, q75[i]!, q95[i]!].sort((a, b) => a - b),
      );
    }
    expect([timesH[0], timesH.at(-1)]).toEqual([analysis.clock.nowH, analysis.clock.toH]);
  });

  it("carries the whole spread of the clearance into the readings", () => {
    const { posterior: clearance } = fit.parameters[0]!;
    const { average } = analysis.options[0]!.individual!.steadyState!;
    const doseRate = clearance.q50 * average.q50;
    expect(relative(clearance.q05 * average.q95, doseRate)).toBeLessThan(0.01);
    expect(relative(clearance.q95 * average.q05, doseRate)).toBeLessThan(0.01);
  });

  it("is the same bits again, and can be sent from a worker", () => {
    const again = derive(value, { isFitted: true });
    expect(again).toEqual(analysis);
    expect(structuredClone(analysis)).toEqual(analysis);
  });

  it("is pending until it is asked for, and tells how far it is", () => {
    expect(derive(value).fit).toEqual({ kind: "pending" });
    const parts = [...deriveSteps(value, { isFitted: true })];
    expect(parts.length).toBeGreaterThan(200);
    expect(parts).toEqual([...parts].sort((a, b) => a - b));
    expect(parts.at(-1)).toBeLessThanOrEqual(1);
  });
});

describe("two levels", () => {
  const { analysis, fit } = fitted(caseFixture({ levels: [TROUGH, SECOND] }));

  it("are used in time order; each forecast rests on those before it", () => {
    expect(fit.levelsUsed).toEqual(["l2", "l1"]);
    expect(analysis.levels.map((level) => level.fit!.forecast!.levelsKnown)).toEqual([0, 1]);
    expect(analysis.levels.every((level) => level.fit!.influence!.length === 3)).toBe(true);
  });

  it("one left out gives the fit without it, and what was predicted for it stays in sight", () => {
    const leftOut = fitted(caseFixture({ levels: [TROUGH, { ...SECOND, excluded: "line not flushed" }] }));
    const without = fitted(caseFixture({ levels: [TROUGH] }));
    expect(leftOut.fit.parameters).toEqual(without.fit.parameters);
    expect(leftOut.fit.levelsLeftOut).toEqual(["l2"]);
    const level = leftOut.analysis.levels.find(({ id }) => id === "l2")!;
    expect(level.fit!.predicted.q50).toBeGreaterThan(0);
    expect([level.fit!.influence, level.fit!.forecast]).toEqual([null, null]);
    // The influence of the level left in is what taking it out does.
    const [ratio] = analysis.levels.find(({ id }) => id === "l2")!.fit!.influence!;
    const [withIt, withoutIt] = [fit.parameters[0]!.mostLikely, without.fit.parameters[0]!.mostLikely];
    expect(relative(ratio!.ratio, withIt / withoutIt)).toBeLessThan(1e-6);
  });
});

test("without variation to speak of this patient is the typical one", () => {
  const { analysis } = fitted(
    varied(caseFixture({ levels: [TROUGH] }), { clearance: 0.001, volume: 0.001, absorptionRate: 0.001 }),
  );
  const { typical, individual, band } = analysis.options[0]!;
  for (const name of ["peak", "lowest", "average"] as const) {
    // Read from a grid of a quarter of an hour.
    expect(relative(individual!.span[name].q50, typical!.span[name])).toBeLessThan(2e-3);
    expect(relative(individual!.steadyState![name].q05, typical!.steadyState![name])).toBeLessThan(1e-4);
  }
  expect(Math.max(...band!.q95.map((high, i) => high - band!.q05[i]!))).toBeLessThan(1e-3);
});

const UNPRICED = { excluded: "haemolysed" } as const;
test.each<[string, Case, string]>([
  ["no level", caseFixture(), "no-levels"],
  ["all left out", caseFixture({ levels: [{ ...TROUGH, ...UNPRICED }] }), "all-left-out"],
  [
    "the patient's weight missing",
    caseFixture({
      levels: [TROUGH],
      patient: { ...caseFixture().patient, observations: [] },
    }),
    "no-model",
  ],
  [
    "no variation between patients",
    varied(caseFixture({ levels: [TROUGH] }), { clearance: null, volume: null, absorptionRate: null }),
    "no-variability",
  ],
  [
    "no residual error",
    varied(caseFixture({ levels: [TROUGH] }), { residualProportional: null, residualAdditive: null }),
    "no-residual",
  ],
  [
    "drawn before the first dose",
    caseFixture({ levels: [{ ...TROUGH, at: "2026-03-01T07:00:00+00:00" }] }),
    "before-first-dose",
  ],
])("%s: nothing is fitted, and it is said", (_, value, reason) => {
  const analysis = derive(value, { isFitted: true });
  expect(analysis.fit).toEqual({ kind: "none", reason });
  expect(analysis.options[0]!.individual).toBeNull();
  expect(analysis.givenBand).toBeNull();
});

test("an option that many draws never settle under is said to lie above the window, not below it for today's level", () => {
  const { analysis } = fitted(demoCase("saturable"));
  const [, b, c] = analysis.options;
  for (const option of [b!, c!]) {
    const { shareNeverSteady, steadyChance, steadyState } = option.individual!;
    expect(shareNeverSteady).toBeGreaterThan(0.05);
    expect(steadyState).toBeNull();
    expect(steadyChance!.above).toBeGreaterThan(0.5);
    const codes = analysis.concerns.filter(({ about }) => about.id === option.id).map(({ code }) => code);
    expect(codes).toContain("option-chance-above");
    expect(codes).toContain("never-steady-chance");
    expect(codes).not.toContain("never-steady");
    expect(codes).not.toContain("option-toxic");
    // A level that rises without end reaches any limit.
    expect(option.individual!.toxicChance).toBeGreaterThanOrEqual(shareNeverSteady);
    expect(codes).not.toContain("option-chance-below");
  }
});

test("the lowest of the days shown is today's level where the option only raises it, and is known to be", () => {
  const { analysis } = fitted(demoCase("saturable"));
  for (const { individual } of analysis.options) expect(individual!.span.lowestBeforeOption).toBeGreaterThan(0.95);
  // Less than before: the level falls to its lowest under the option.
  const saturable = demoCase("saturable");
  const line = saturable.options[0]!.lines[0]!;
  const less = [{ ...line, amount: { value: 30, unit: "mg" as const } }];
  const falling = fitted({ ...saturable, options: [{ ...saturable.options[0]!, lines: less }] }).analysis;
  expect(falling.options[0]!.individual!.span.lowestBeforeOption).toBeLessThan(0.05);
});
