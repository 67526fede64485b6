import { expect, it } from "vitest";
import { modelSteadyState } from "../../src/core/kinetics/index.ts";
import { relativeError, workedExample } from "./workedExample.ts";

/*
 * D. W. A. Bourne, PHAR 7632/7633 pharmacokinetics course notes (University of Oklahoma), chapter 19, page Ch1907: the dose for an
 * average level at steady state in a two-compartment model, printed as 600 mg every 12 hours. Example W16.
 */
const example = workedExample("W16");
const { CssAvg, V1_L, k10, F, tau_h } = example.inputs as Record<string, number>;
const dose = example.computed["dose_mg"] as number;

it("W16: 600 mg every 12 h gives an average of 20 mg/L, whatever the exchange and the absorption", () => {
  for (const exchange of [0.5, 8]) {
    for (const absorption of [
      { kind: "first-order", ka: 0.9 },
      { kind: "zero-order", duration: 15 },
    ] as const) {
      const found = modelSteadyState(
        { kind: "two-compartment", clearance: k10! * V1_L!, volume: V1_L!, exchange, peripheralVolume: 40 },
        [{ absorption, bioavailability: F!, lag: 0.5, doses: [{ time: 0, amount: dose }] }],
        tau_h!,
      );
      if (found.status === "none") throw new Error("a linear model has a steady state");
      expect(relativeError(found.average, CssAvg!)).toBeLessThanOrEqual(1e-14);
    }
  }
  expect(dose).toBe(600);
});
