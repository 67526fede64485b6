import { describe, expect, it } from "vitest";
import { modelProfile, modelSteadyState } from "../../../src/core/kinetics/index.ts";
import {
  doseMg,
  formulaEvaluate,
  kineticsFormulas,
  productAbsorption,
  productOf,
  recordById,
} from "../../../src/core/medicine/index.ts";

const record = recordById("phenytoin")!;
const capsule = productOf(record, "capsule-er");

function typical(weight: number) {
  const [vmax, km, volume] = kineticsFormulas(record).map(({ formula }) => {
    const value = formulaEvaluate(formula, { weight });
    if (!value.ok) throw new Error("formula");
    return value.value.value;
  });
  return { kind: "saturable", vmax: vmax!, km: km!, volume: volume! } as const;
}

function input(labelledMg: number) {
  const mg = doseMg({ value: labelledMg, unit: "mg" }, capsule);
  if (!mg.ok) throw new Error("dose");
  const doses = [{ time: 0, amount: mg.value }];
  return {
    absorption: productAbsorption(capsule),
    bioavailability: capsule.bioavailability.value,
    lag: capsule.lag.value,
    doses,
  };
}

describe("what the phenytoin record claims", () => {
  it("Vmax is 415 mg a day at 70 kg and goes with the power 0.6 of weight", () => {
    expect(Math.abs(typical(70).vmax * 24 - 415)).toBeLessThan(1e-12);
    expect(Math.abs(typical(35).vmax / typical(70).vmax - 0.5 ** 0.6)).toBeLessThan(1e-15);
  });

  it("the volume is 78.6 L at 70 kg once bioavailability is put in", () => {
    expect(Math.abs(typical(70).volume * 0.859 - 78.6)).toBeLessThan(1e-13);
  });

  it("300 mg of capsules a day, 276 mg of acid, lead to 11.3 mg/L on average: Km·R/(Vmax − R)", () => {
    // By hand from the published figures: 5.7 · 276 / (415 − 276) = 11.318. A profile that swings averages a little lower.
    const steady = modelSteadyState(typical(70), [input(300)], 24);
    if (steady.status !== "settled") throw new Error("no steady state");
    expect(Math.abs(steady.average - 11.318)).toBeLessThan(0.15);
  });

  it("450 mg of capsules a day is 414 mg, below Vmax; 500 mg is 460 mg, above: no steady state", () => {
    expect(modelSteadyState(typical(70), [input(450)], 24).status).toBe("settled");
    expect(modelSteadyState(typical(70), [input(500)], 24).status).toBe("none");
  });

  it("a capsule of 300 mg peaks after about 3 h", () => {
    const times = Array.from({ length: 241 }, (_, i) => i / 10);
    const history = {
      dispositions: [{ from: Number.NEGATIVE_INFINITY, disposition: typical(70) }],
      inputs: [input(300)],
    };
    const levels = modelProfile(history, times);
    const peakAt = times[levels.indexOf(Math.max(...levels))];
    expect(peakAt).toBeGreaterThan(2.5);
    expect(peakAt).toBeLessThan(3.5);
  });

  it("the lag and the absorption rate keep the mean time of input of the source: 1.1 h / 2 + 1 / 1.7", () => {
    const mean = capsule.lag.value + 1 / (capsule.absorptionRate?.value ?? Number.NaN);
    expect(Math.abs(mean - (1.1 / 2 + 1 / 1.7))).toBeLessThan(1e-15);
  });

  it("the salt factor is the ratio of the molar masses", () => {
    expect(Math.abs((capsule.saltFactor?.value ?? 0) - 252.27 / 274.25)).toBeLessThan(0.0005);
    for (const id of ["tablet-chewable", "suspension"]) expect(productOf(record, id).saltFactor).toBeUndefined();
  });
});
