import { describe, it } from "vitest";
import { expectEndsWithin, expectInside, expectWithin } from "./expectFigure.ts";
import { recordTypical } from "./recordTypical.ts";

/*
 * Population pharmacokinetics of levetiracetam: a systematic review, Clin Pharmacokinet 2021, abstract: CL/F in adults 0.054 L/h/kg (median, 0.039–0.061).
 * Levetiracetam pharmacokinetics in Japanese subjects with renal impairment, Clin Drug Investig 2014;34:819–828, abstract: 52, 31, 25, 20
 * mL/min/1.73 m² with normal function, mild, moderate, severe impairment. Borders 80, 50, 30 mL/min: dose table, Browne 2004 (epilepsy.com).
 */
const levetiracetam = recordTypical("levetiracetam", { weight: 70, creatinineClearance: 100 });

describe("levetiracetam, clearance", () => {
  it.each([
    [80, 1],
    [79.9, 31 / 52],
    [50, 31 / 52],
    [49.9, 25 / 52],
    [30, 25 / 52],
    [29.9, 20 / 52],
  ])(
    "at a creatinine clearance of %d mL/min it is %d of 0.054 L/h/kg, relative 1e-12",
    (creatinineClearance, share) => {
      const found = levetiracetam.value("clearance", { weight: 70, creatinineClearance });
      expectWithin(found, 0.054 * 70 * share, 1e-12);
    },
  );
});

describe("levetiracetam, the typical patient", () => {
  it.each([
    ["tablet", { value: 1500, unit: "mg" }, 12],
    ["tablet-er", { value: 3000, unit: "mg" }, 24],
    ["solution", { value: 15, unit: "mL" }, 12],
  ] as const)("3,000 mg a day as %s, %o every %d h, averages 33.1 mg/L within 2 %%", (product, dose, everyH) => {
    expectWithin(levetiracetam.average({ product, dose, everyH }), 33.1, 0.02);
  });

  /* Labcorp, test 716936, interpretive text: half-life 6–8 h in healthy adults. V 0.5–0.7 L/kg: label, from memory, unverified. */
  it("half-life lies inside the printed 6 to 8 h, volume inside the recalled 0.5 to 0.7 L/kg", () => {
    expectInside(levetiracetam.halfLife(), 6, 8);
    expectInside(levetiracetam.valuePerKg("volume"), 0.5, 0.7);
  });

  it("with valproate clearance is 18.8 % lower, with inducers inside 9 to 22 % higher, as the review prints", () => {
    expectWithin(levetiracetam.interaction("valproate"), 1 - 0.188, 1e-12);
    expectInside(levetiracetam.interaction("inducers"), 1.09, 1.22);
  });
});

/* Mayo Clinic Laboratories, test LEVE: 10–40 mg/L; computed from 1000 / 170.21: 59–235 µmol/L. */
it("levetiracetam: 10 to 40 mg/L is 59 to 235 umol/L within 0.5 %", () => {
  expectEndsWithin(levetiracetam.window("10-40", "umol/L"), [59, 235], 0.005);
});
