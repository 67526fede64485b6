import { describe, it } from "vitest";
import { expectEndsWithin, expectInside, expectRoundsTo, expectWithin } from "./expectFigure.ts";
import { recordTypical } from "./recordTypical.ts";

/*
 * Wilensky AJ and others, Kinetics of phenobarbital in normal subjects and epileptic patients, Eur J Clin Pharmacol 1982;23:87–92, abstract:
 * normal subjects CL 3.8 mL/h/kg (SD 0.77), V 0.54 L/kg (SD 0.03), F 1.0 (SD 0.11), half-life 75–126 h;
 * epileptic patients CL 3.9 (0.76), V 0.61, half-life 77–128 h.
 */
const phenobarbital = recordTypical("phenobarbital", { weight: 70 });

describe("phenobarbital, the typical patient", () => {
  it("clearance is 3.8 mL/h/kg: 0.266 L/h at 70 kg, relative 1e-12", () => {
    expectWithin(phenobarbital.value("clearance"), 0.266, 1e-12);
  });

  it.each([
    ["tablet", { value: 90, unit: "mg" }, 24],
    ["tablet", { value: 30, unit: "mg" }, 8],
    ["elixir", { value: 22.5, unit: "mL" }, 24],
  ] as const)("90 mg a day as %s, %o every %d h, averages 14.1 mg/L within 2 %%", (product, dose, everyH) => {
    expectWithin(phenobarbital.average({ product, dose, everyH }), 14.1, 0.02);
  });

  it("the epileptic patients of the source would average 2.6 % less", () => {
    expectWithin(
      90 /
        24 /
        (0.0039 * 70) /
        phenobarbital.average({ product: "tablet", dose: { value: 90, unit: "mg" }, everyH: 24 }),
      1 - 0.0256,
      0.001,
    );
  });

  it("half-life lies inside the printed 75 to 126 h; volume is 0.54 L/kg, below the patients' 0.61", () => {
    expectInside(phenobarbital.halfLife(), 75, 126);
    expectWithin(phenobarbital.valuePerKg("volume"), 0.54, 1e-12);
  });

  it("a single dose of the tablet peaks at 3.6 h, as its note says, inside the printed 0.5 to 4 h", () => {
    expectRoundsTo(phenobarbital.peakTime("tablet"), 3.6, 0.1);
  });

  it("variation is the printed deviation over the printed mean, within rounding", () => {
    expectWithin(phenobarbital.record.variability.clearance?.value ?? Number.NaN, (100 * 0.77) / 3.8, 0.005);
    expectWithin(phenobarbital.record.variability.volume?.value ?? Number.NaN, (100 * 0.03) / 0.54, 0.01);
  });
});

describe("phenobarbital, mass and mole", () => {
  /* ASHP, Therapeutic ranges of drugs in traditional and SI units, Appendix A: factor 4.306, 10–40 mg/L is 43–172 µmol/L. */
  it("factor and range agree with the printed 4.306 and 43 to 172 umol/L within 0.5 %", () => {
    expectWithin(phenobarbital.factor("mg/L", "umol/L"), 4.306, 0.005);
    expectEndsWithin(phenobarbital.window("10-40", "umol/L"), [43, 172], 0.005);
  });
});
