import { describe, expect, it } from "vitest";
import { expectEndsRoundTo, expectInside, expectWithin } from "./expectFigure.ts";
import { recordTypical } from "./recordTypical.ts";

/*
 * Grasela TH and others, Steady-state pharmacokinetics of phenytoin from routinely collected patient data, Clin Pharmacokinet 1983;8:355–364,
 * abstract: Vmax 415 mg a day at 70 kg with the power 0.6 of weight, Km 5.7 mg/L.
 * Css = Km·R/(Vmax − R), R mg of acid a day. The sodium salt holds 0.92 of its mass.
 */
const phenytoin = recordTypical("phenytoin", { weight: 70 });

function level(acidMgADay: number, weight: number): number {
  const vmax = 415 * (weight / 70) ** 0.6;
  return (5.7 * acidMgADay) / (vmax - acidMgADay);
}

describe("phenytoin, the published population result", () => {
  it.each([
    [50, 415 * (50 / 70) ** 0.6],
    [70, 415],
    [90, 415 * (90 / 70) ** 0.6],
  ])("Vmax at %d kg is %d mg a day, relative 1e-12; Km 5.7 mg/L whatever the weight", (weight, wanted) => {
    expectWithin(phenytoin.value("maximumRate", { weight }) * 24, wanted, 1e-12);
    expect(phenytoin.value("halfMaximum", { weight })).toBe(5.7);
  });
});

describe("phenytoin, the typical patient", () => {
  it("300 mg of capsules a day, 100 mg every 8 h, averages 11.3 mg/L within 2 %", () => {
    expectWithin(phenytoin.average({ product: "capsule-er", dose: { value: 100, unit: "mg" }, everyH: 8 }), 11.3, 0.02);
  });

  it.each([
    ["capsule-er", 100, 8, 276, 70],
    ["capsule-er", 100, 12, 184, 70],
    ["capsule-er", 100, 8, 276, 90],
    ["tablet-chewable", 100, 8, 300, 70],
    ["suspension", 125, 12, 250, 70],
  ])(
    "%s, %d mg every %d h: %d mg of acid a day at %d kg, Km·R/(Vmax − R) within 2 %%",
    (product, mg, everyH, acid, weight) => {
      const course = { product, dose: { value: mg, unit: "mg" }, everyH } as const;
      expectWithin(phenytoin.average(course, "mg/L", { weight }), level(acid, weight), 0.02);
    },
  );

  it("a tenth more of the dose gives a third as much again: 300 to 330 mg of capsules, from 11.3 to above 15 mg/L", () => {
    expectWithin(
      phenytoin.average({ product: "capsule-er", dose: { value: 110, unit: "mg" }, everyH: 8 }),
      level(303.6, 70),
      0.02,
    );
    expect(level(303.6, 70)).toBeGreaterThan(15);
  });

  /* Ther Drug Monit 2016;38:728–737, table 2 (PMC5113813): 78.6 L at a bioavailability of 0.859; published values 35–109.2 L. */
  it("volume lies inside the published 35 to 109.2 L", () => {
    const litres = phenytoin.value("volume") * 0.859;
    expectWithin(litres, 78.6, 1e-12);
    expectInside(litres, 35, 109.2);
  });

  /* Label, section 12 (2019 copy): apparent half-life 22 h (7–42). ln 2 · V · (Km + C) / Vmax is the local half-life at a level C. */
  it("the local half-life at low levels, 20.9 h, lies inside the printed 7 to 42 h and lengthens with the level", () => {
    const volume = phenytoin.value("volume");
    const vmax = phenytoin.value("maximumRate");
    const localHalfLife = (at: number) => (Math.LN2 * volume * (phenytoin.value("halfMaximum") + at)) / vmax;
    expectWithin(localHalfLife(0), 20.9, 0.005);
    expectWithin(localHalfLife(10) / localHalfLife(0), 15.7 / 5.7, 1e-12);
  });
});

describe("phenytoin, mass and mole", () => {
  /* ASHP, Therapeutic ranges of drugs in traditional and SI units, Appendix A: factor 3.964, 10–20 mg/L is 40–80 µmol/L. */
  it("the factor agrees with the printed 3.964 within 0.5 %: the molar mass is the acid's, not the salt's", () => {
    expectWithin(phenytoin.factor("mg/L", "umol/L"), 3.964, 0.005);
  });

  it("10 to 20 mg/L rounds to the printed 40 to 80 umol/L", () => {
    expectEndsRoundTo(phenytoin.window("10-20", "umol/L"), [40, 80], 2);
  });
});
