import { describe, expect, it } from "vitest";
import { expectEndsRoundTo, expectEndsWithin, expectInside, expectRoundsTo, expectWithin } from "./expectFigure.ts";
import { recordTypical } from "./recordTypical.ts";

/*
 * Population-based investigation of valproic acid relative clearance using nonlinear mixed effects modeling (Yukawa and colleagues, J Clin
 * Pharmacol, abstract, 400 patients): CL (mL/h/kg) = 15.6 · weight^−0.252 · dose^0.183 · 0.898 in women, dose in mg/kg/day; 1.10 with
 * phenobarbital; 0.769 · dose^0.179 with carbamazepine. The record puts 15 mg/kg/day in.
 */
const valproate = recordTypical("valproate", { weight: 70, isFemale: 0 });

function published(weight: number, mgPerKgADay: number, isFemale: number): number {
  return (15.6 * weight ** -0.252 * mgPerKgADay ** 0.183 * 0.898 ** isFemale * weight) / 1000;
}

describe("valproate, the published population result", () => {
  it.each([
    [70, 0],
    [70, 1],
    [20, 0],
    [110, 1],
  ])("clearance at %d kg, female %d, is the published formula at 15 mg/kg/day, relative 1e-12", (weight, isFemale) => {
    expectWithin(valproate.value("clearance", { weight, isFemale }), published(weight, 15, isFemale), 1e-12);
  });

  it.each([
    [10, 0.93],
    [30, 1.14],
    [60, 1.29],
  ])("at %d mg/kg/day the source gives %d times this, as the note says", (dose, factor) => {
    expectRoundsTo(published(70, dose, 0) / published(70, 15, 0), factor, 0.01);
    expect(valproate.record.kinetics).toMatchObject({ clearance: { note: expect.stringContaining(String(factor)) } });
  });

  it("its factors with other medicines stand in the record", () => {
    expect(valproate.interaction("phenobarbital")).toBe(1.1);
    expectRoundsTo(0.769 * 15 ** 0.179, valproate.interaction("carbamazepine"), 0.01);
  });
});

describe("valproate, the typical patient", () => {
  it.each([
    ["tablet-dr", 500, 12],
    ["capsule", 250, 6],
    ["solution-acid", 500, 12],
  ])(
    "1,000 mg a day of valproic acid as %s, %d mg every %d h, averages 68.4 mg/L within 2 %%",
    (product, mg, everyH) => {
      const course = { product, dose: { value: mg, unit: "mg" }, everyH } as const;
      expectWithin(valproate.average(course), 68.4, 0.02);
    },
  );

  it("the same mass of sodium valproate gives 144.21 / 166.2 of it, relative 0.1 %", () => {
    const course = { dose: { value: 10, unit: "mL" }, everyH: 12 } as const;
    const acid = valproate.average({ product: "solution-acid", ...course });
    expectWithin(valproate.average({ product: "solution-sodium", ...course }), (acid * 144.21) / 166.2, 0.001);
  });

  it("the 24-hour tablet gives 0.9 of the gastro-resistant one", () => {
    const course = { dose: { value: 1000, unit: "mg" }, everyH: 24 } as const;
    const resistant = valproate.average({ product: "tablet-dr", ...course });
    expectWithin(valproate.average({ product: "tablet-er", ...course }), resistant * 0.9, 1e-9);
  });

  it.each([
    ["capsule-sprinkle", 4],
    ["tablet-er", 10.5],
  ])("a single dose of the %s peaks at %d h, as its note says, within 0.05 h", (product, hours) => {
    expectRoundsTo(valproate.peakTime(product), hours, 0.1);
  });

  /* Intravenous and oral valproate in six healthy volunteers, abstract (scilit 41773bec): V 12.6 L (SD 1.2); half-life 11.6 h (SD 2.3), about 4 h longer after repeated doses. */
  it("half-life lies between the printed 11.6 h of a single dose and 4 h more, volume within one printed deviation", () => {
    expectInside(valproate.halfLife(), 11.6, 15.6);
    expectWithin(valproate.value("volume"), 12.6, 1e-12);
  });
});

describe("valproate, mass and mole", () => {
  /* 1000 / 144.21; 144.2 is printed in Levy RH and others, Antiepileptic Drugs, 5th edition, chapter 84. */
  it("50 to 125 mg/L is 347 to 867 umol/L within 0.5 %", () => {
    expectEndsWithin(valproate.window("50-125", "umol/L"), [50_000 / 144.2, 125_000 / 144.2], 0.005);
  });

  /* Vancouver Hospital Pharmaceutical Sciences, Therapeutic drug concentration ranges: 350–700 µmol/L, printed to 10 or more. */
  it("50 to 100 mg/L rounds to the printed 350 to 700 umol/L, and back to what the note says", () => {
    expectEndsRoundTo(valproate.window("50-100", "umol/L"), [350, 700], 50);
    expectEndsRoundTo(valproate.window("350-700", "mg/L"), [50, 101], 1);
  });
});
