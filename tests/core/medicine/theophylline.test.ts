import { describe, expect, it } from "vitest";
import { timeOfPeak } from "../../../src/core/kinetics/index.ts";
import { formulaEvaluate, kineticsFormulas, productOf, recordById } from "../../../src/core/medicine/index.ts";

const record = recordById("theophylline")!;

/** The typical patient whose actual weight is the ideal weight. */
function typical(productId: string) {
  const covariates = { weight: 70, idealWeight: 70 };
  const [cl, v] = kineticsFormulas(record).map(({ formula }) => formulaEvaluate(formula, covariates));
  if (!cl?.ok || !v?.ok) throw new Error("formulas");
  const { absorptionRate, lag, bioavailability } = productOf(record, productId);
  return {
    ka: absorptionRate?.value ?? Number.NaN,
    ke: cl.value.value / v.value.value,
    volume: v.value.value,
    bioavailability: bioavailability.value,
    lag: lag.value,
  };
}

describe("what the notes of the theophylline record claim", () => {
  it("the 12-hour tablet peaks at 6 h in the typical patient", () => {
    // Absolute tolerance 0.01 h: 0.241 is rounded to three digits (0.2409 would be 6.000).
    expect(Math.abs(timeOfPeak(typical("tablet-12h")) - 6)).toBeLessThan(0.01);
  });

  it("4 h and 8 h would take 0.478 and 0.142 /h", () => {
    const kinetics = typical("tablet-12h");
    expect(Math.abs(timeOfPeak({ ...kinetics, ka: 0.478 }) - 4)).toBeLessThan(0.01);
    expect(Math.abs(timeOfPeak({ ...kinetics, ka: 0.142 }) - 8)).toBeLessThan(0.01);
  });

  it("the immediate-release tablet peaks at 2.2 h", () => {
    expect(Math.abs(timeOfPeak(typical("tablet")) - 2.2)).toBeLessThan(0.01);
  });

  it("the elimination rate is 0.1095 /h", () => {
    expect(Math.abs(typical("tablet").ke - 0.1095)).toBeLessThan(0.00005);
  });

  it("offers two windows and chooses neither", () => {
    expect(record.windows.map(({ low, high }) => [low.value, high.value])).toEqual([
      [10, 20],
      [5, 15],
    ]);
  });
});
