import { describe, expect, it } from "vitest";
import { expectEndsRoundTo, expectEndsWithin, expectInside, expectWithin } from "./expectFigure.ts";
import { recordTypical } from "./recordTypical.ts";

/*
 * Theophylline: a review of population pharmacokinetic analyses, Journal of Clinical Pharmacy and Therapeutics, abstract: median in adults
 * 0.053 L/h per kg of ideal or lean weight; between adults 33.5 %, residual 14.3 %.
 */
const theophylline = recordTypical("theophylline", { weight: 70, idealWeight: 70 });

describe("theophylline, the published population result", () => {
  it.each([
    [70, 70, 3.71],
    [100, 70, 3.71],
    [60, 70, 3.18],
  ])("clearance at %d kg (ideal %d kg) is %d L/h, relative 1e-12", (weight, idealWeight, wanted) => {
    expectWithin(theophylline.value("clearance", { weight, idealWeight }), wanted, 1e-12);
  });

  /*
   * Yano I and others, Population pharmacokinetics of theophylline II, Biol Pharm Bull 1993;16:501–505, abstract, 55 adults, intravenous:
   * CL exp(−3.78 + 0.0233·PaCO2) L/h/kg without liver dysfunction, V exp(−1.12 + 0.00934·PaCO2) L/kg. At a PaCO2 of 40 mmHg.
   */
  it("another population model gives the same within 10 % for clearance and 3 % for volume", () => {
    expectWithin(theophylline.valuePerKg("clearance"), Math.exp(-3.78 + 0.0233 * 40), 0.1);
    expectWithin(theophylline.valuePerKg("volume"), Math.exp(-1.12 + 0.00934 * 40), 0.03);
  });

  it("variability and error are the printed ones", () => {
    const { clearance, residualProportional } = theophylline.record.variability;
    expect([clearance?.value, residualProportional?.value]).toEqual([33.5, 14.3]);
  });
});

describe("theophylline, the typical patient", () => {
  it.each([
    [300, 12],
    [600, 24],
  ])(
    "600 mg a day as 12-hour tablets, %d mg every %d h, averages 6.74 mg/L (dose rate / CL) within 2 %%",
    (mg, everyH) => {
      const course = { product: "tablet-12h", dose: { value: mg, unit: "mg" }, everyH } as const;
      expectWithin(theophylline.average(course), 6.74, 0.02);
    },
  );

  /* Absolute bioavailability of oral theophylline, abstract (scilit): tablet 0.96, solution 0.99. */
  it.each([
    ["tablet", 0.96],
    ["solution", 0.99],
  ])("the %s gives %d of that", (product, share) => {
    expectWithin(theophylline.average({ product, dose: { value: 200, unit: "mg" }, everyH: 8 }), 6.74 * share, 0.005);
  });

  /* Bioavailability and pharmacokinetics in man of orally administered theophylline, abstract (scilit): half-life 3–16 h, V 0.394–0.616 L/kg. */
  it("half-life and volume lie inside the printed 3 to 16 h and 0.394 to 0.616 L/kg", () => {
    expectInside(theophylline.halfLife(), 3, 16);
    expectInside(theophylline.valuePerKg("volume"), 0.394, 0.616);
  });
});

describe("theophylline, mass and mole", () => {
  /* 1000 / 180.17; the molar mass is printed in a label (Teva, extended-release tablets, DailyMed, Description). */
  it.each([
    ["10-20", 55.5, 111],
    ["5-15", 27.75, 83.25],
  ])("%s mg/L is %d to %d umol/L within 0.5 %%", (id, low, high) => {
    expectEndsWithin(theophylline.window(id, "umol/L"), [low, high], 0.005);
    expectWithin(theophylline.factor("mg/L", "umol/L"), 1000 / 180.17, 1e-12);
  });

  /* Vancouver Hospital Pharmaceutical Sciences, Therapeutic drug concentration ranges: 55–110 µmol/L, printed to 5. */
  it("10 to 20 mg/L rounds to the printed 55 to 110 umol/L", () => {
    expectEndsRoundTo(theophylline.window("10-20", "umol/L"), [55, 110], 5);
  });
});
