import { describe, it } from "vitest";
import { expectEndsRoundTo, expectInside, expectRoundsTo, expectWithin } from "./expectFigure.ts";
import { recordTypical } from "./recordTypical.ts";

/*
 * Ethosuximide, Swiss product information, kinetics (ch.oddb.org, 26777): V 0.7 L/kg, half-life 50–60 h in adults.
 * StandardOfCare, ethosuximide entry: bioavailability 0.93. Clearance is ln 2 · 0.7 / 55 L/h/kg.
 */
const ethosuximide = recordTypical("ethosuximide", { weight: 70 });

describe("ethosuximide, the typical patient", () => {
  it("clearance is ln 2 · V / 55 h, within its rounding (0.5 %)", () => {
    expectWithin(ethosuximide.valuePerKg("clearance"), (Math.LN2 * 0.7) / 55, 0.005);
  });

  it.each([
    ["capsule", { value: 500, unit: "mg" }, 12],
    ["solution", { value: 20, unit: "mL" }, 24],
  ] as const)(
    "1,000 mg a day as %s, %o every %d h, averages 62.9 mg/L (F 0.93) within 2 %%",
    (product, dose, everyH) => {
      expectWithin(ethosuximide.average({ product, dose, everyH }), 62.9, 0.02);
    },
  );

  it("a single dose of the capsule peaks at 4.4 h, as its note says, within 0.05 h", () => {
    expectRoundsTo(ethosuximide.peakTime("capsule"), 4.4, 0.1);
  });

  it("half-life lies inside the printed 50 to 60 h; volume is the printed 0.7 L/kg", () => {
    expectInside(ethosuximide.halfLife(), 50, 60);
    expectWithin(ethosuximide.valuePerKg("volume"), 0.7, 1e-12);
  });
});

describe("ethosuximide, mass and mole", () => {
  /* ASHP, Therapeutic ranges of drugs in traditional and SI units, Appendix A: factor 7.084, 40–100 mg/L is 280–710 µmol/L, printed to 10. */
  it("the factor agrees with the printed 7.084 within 0.5 %, and the range rounds to the printed one", () => {
    expectWithin(ethosuximide.factor("mg/L", "umol/L"), 7.084, 0.005);
    expectEndsRoundTo(ethosuximide.window("40-100", "umol/L"), [280, 710], 10);
  });

  /* Taranaki Medlab, New Zealand, Anticonvulsant drugs, table: 300–700 µmol/L. The record's note says 42 to 99 mg/L. */
  it("300 to 700 umol/L is 42 to 99 mg/L as the note says", () => {
    expectEndsRoundTo(ethosuximide.window("300-700", "mg/L"), [42, 99], 1);
  });
});
