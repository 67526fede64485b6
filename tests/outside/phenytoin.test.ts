import { describe, expect, it } from "vitest";
import {
  type ModelInput,
  modelHalfLife,
  modelProfile,
  modelSteadyState,
  modelTimeToSteadyState,
} from "../../src/core/kinetics/index.ts";
import { relativeError, workedExample } from "./workedExample.ts";

const DAY = 24;

/** A constant input: a day's dose given at a constant rate over the day, for ever. */
const constant = (mgADay: number, share: number): ModelInput[] => [
  {
    absorption: { kind: "zero-order", duration: DAY },
    bioavailability: share,
    lag: 0,
    doses: [{ time: 0, amount: mgADay }],
  },
];

function level(vmaxADay: number, km: number, mgADay: number, share: number): number {
  const disposition = { kind: "saturable", vmax: vmaxADay / DAY, km, volume: 45.5 } as const;
  const found = modelSteadyState(disposition, constant(mgADay, share), DAY);
  if (found.status === "none") throw new Error("there is a steady state");
  return found.average;
}

/*
 * P01. Population values Vmax 7 mg/kg/day and Km 4 mg/L as in teaching slides; 70 kg; S = 0.92 for phenytoin sodium. Css = Km·R/(Vmax − R).
 * Time to 90 %: Winter, Basic Clinical Pharmacokinetics (from memory, unverified): Km·V/(Vmax − R)²·(2.303·Vmax − 0.9·R).
 */
describe("P01 phenytoin, 70 kg", () => {
  const { inputs, computed } = workedExample("P01");
  const { Vmax_mg_per_day, Km_mg_L, S, dose_mg_per_day } = inputs as {
    Vmax_mg_per_day: number;
    Km_mg_L: number;
    S: number;
    dose_mg_per_day: number[];
  };
  const { Css, t90_days_V45p5L, doseForCss10_15_20 } = computed as Record<string, number[]>;

  it.each(dose_mg_per_day.map((dose, i) => [dose, Css![i]!]))("%d mg a day: Css %d, relative 1e-12", (dose, wanted) => {
    expect(relativeError(level(Vmax_mg_per_day, Km_mg_L, dose, S), wanted)).toBeLessThanOrEqual(1e-12);
  });

  it.each([10, 15, 20].map((css, i) => [doseForCss10_15_20![i]!, css]))(
    "%d mg a day is the dose for %d mg/L, relative 1e-12",
    (dose, wanted) => {
      expect(relativeError(level(Vmax_mg_per_day, Km_mg_L, dose, S), wanted)).toBeLessThanOrEqual(1e-12);
    },
  );

  it.each(dose_mg_per_day.map((dose, i) => [dose, t90_days_V45p5L![i]!]))(
    "%d mg a day: 90 % of steady state after %d days, to the 2e-4 by which 2.303 differs from ln 10",
    (dose, wanted) => {
      const disposition = { kind: "saturable", vmax: Vmax_mg_per_day / DAY, km: Km_mg_L, volume: 45.5 } as const;
      const product: ModelInput = {
        absorption: { kind: "first-order", ka: 0.5 },
        bioavailability: S,
        lag: 0,
        doses: [{ time: 0, amount: dose }],
      };
      const { hours } = modelTimeToSteadyState(disposition, [product], DAY);
      expect(relativeError(hours / DAY, wanted)).toBeLessThanOrEqual(2e-4);
      // And it is what the model does under a constant input from an empty body.
      const span = 40 * hours;
      const [reached] = modelProfile(
        {
          dispositions: [{ from: Number.NEGATIVE_INFINITY, disposition }],
          inputs: [
            {
              absorption: { kind: "zero-order", duration: span },
              bioavailability: S,
              lag: 0,
              doses: [{ time: 0, amount: (dose * span) / DAY }],
            },
          ],
        },
        [hours],
      );
      const css = level(Vmax_mg_per_day, Km_mg_L, dose, S);
      expect(relativeError(reached!, 0.9 * css)).toBeLessThanOrEqual(1e-10);
    },
  );

  it("no half-life is given for it", () => {
    expect(modelHalfLife({ kind: "saturable", vmax: Vmax_mg_per_day / DAY, km: Km_mg_L, volume: 45.5 })).toBeNull();
  });
});

/* P02. Bauer, Applied Clinical Pharmacokinetics, phenytoin chapter (from memory, unverified): 75 kg, target 12 mg/L, 428 mg a day. */
it("P02 the literature-based dose gives the target, relative 1e-12", () => {
  const { inputs, computed } = workedExample("P02");
  const { Vmax_mg_per_day, Km, S, target } = inputs as Record<string, number>;
  const dose = computed["dose_mg_per_day"] as number;
  expect(relativeError(level(Vmax_mg_per_day!, Km!, dose, S!), target!)).toBeLessThanOrEqual(1e-12);
  expect(Math.round(dose)).toBe(428);
});

/* P03. Invented data for the formula Km = (R2 − R1)/(R1/C1 − R2/C2), Vmax = R + Km·R/C (Ludden type). */
it("P03 Vmax and Km from two steady states give both back, relative 1e-12", () => {
  const { inputs, computed } = workedExample("P03");
  const { R1, C1, R2, C2 } = inputs as Record<string, number>;
  const { Km, Vmax } = computed as Record<string, number>;
  expect(relativeError(level(Vmax!, Km!, R1!, 1), C1!)).toBeLessThanOrEqual(1e-12);
  expect(relativeError(level(Vmax!, Km!, R2!, 1), C2!)).toBeLessThanOrEqual(1e-12);
});

/*
 * P04. Ther Drug Monit 2016;38(6):728–737, table 2 (PMC5113813): population model of phenytoin, Vmax 19.3 mg/h, Km 5 mg/L, V 78.6 L,
 * F 0.859, ka 0.459 /h, extended-release input over 1.1 h.
 */
describe("P04 published population model", () => {
  const { inputs, computed } = workedExample("P04");
  const { Vmax_mg_h, Km, V_L, F, ka_IR, zeroOrderDuration_h_ER } = inputs as Record<string, number>;
  const { dose_mg_per_day } = inputs as { dose_mg_per_day: number[] };
  const wanted = computed["Css_constantRate"] as number[];
  const disposition = { kind: "saturable", vmax: Vmax_mg_h!, km: Km!, volume: V_L! } as const;

  it.each(dose_mg_per_day.map((dose, i) => [dose, wanted[i]!]))(
    "%d mg a day: %d mg/L at a constant rate, relative 1e-12; once a day the average lies above it, twice nearer",
    (dose, css) => {
      const average = (input: ModelInput[]) => {
        const found = modelSteadyState(disposition, input, DAY);
        if (found.status === "none") throw new Error("there is a steady state");
        return found.average;
      };
      expect(relativeError(average(constant(dose, F!)), css)).toBeLessThanOrEqual(1e-12);
      for (const absorption of [
        { kind: "first-order", ka: ka_IR! },
        { kind: "zero-order", duration: zeroOrderDuration_h_ER! },
      ] as const) {
        const product = { absorption, bioavailability: F!, lag: 0 };
        const once = average([{ ...product, doses: [{ time: 0, amount: dose }] }]);
        const halves = [0, 12].map((time) => ({ time, amount: dose / 2 }));
        const twice = average([{ ...product, doses: halves }]);
        expect(once).toBeGreaterThan(twice);
        expect(twice).toBeGreaterThan(css);
      }
    },
  );
});
