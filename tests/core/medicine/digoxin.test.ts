import { describe, expect, it } from "vitest";
import { modelHalfLife, modelSteadyState } from "../../../src/core/kinetics/index.ts";
import {
  doseMg,
  formulaEvaluate,
  kineticsFormulas,
  productAbsorption,
  productOf,
  recordById,
} from "../../../src/core/medicine/index.ts";
import { quantityConvert, type UnitCode } from "../../../src/core/units/index.ts";

const record = recordById("digoxin")!;
const covariates = { weight: 60, creatinineClearance: 70 };
const [clearance, volume, exchange, peripheralVolume] = kineticsFormulas(record).map(({ formula }) => {
  const value = formulaEvaluate(formula, covariates);
  if (!value.ok) throw new Error("formula");
  return value.value.value;
}) as [number, number, number, number];
const typical = { kind: "two-compartment", clearance, volume, exchange, peripheralVolume } as const;

describe("what the digoxin record claims", () => {
  it("at 60 kg and 70 mL/min: CL 10 L/h, V1 109.8 L, Q 37.74 L/h, V2 1356 L, by hand from the published figures", () => {
    for (const [found, wanted] of [
      [clearance, 10],
      [volume, 109.8],
      [exchange, 37.74],
      [peripheralVolume, 1356],
    ] as const) {
      expect(Math.abs(found / wanted - 1)).toBeLessThan(1e-15);
    }
  });

  it("the terminal half-life is about 125 h there", () => {
    expect(Math.abs((modelHalfLife(typical) ?? 0) - 125)).toBeLessThan(1);
  });

  it("125 microgram a day averages dose / (CL · 24 h): 0.521 nanogram per mL", () => {
    const tablet = productOf(record, "tablet");
    const mg = doseMg({ value: 125, unit: "ug" }, tablet);
    if (!mg.ok) throw new Error("dose");
    const doses = [{ time: 0, amount: mg.value }];
    const steady = modelSteadyState(
      typical,
      [{ absorption: productAbsorption(tablet), bioavailability: tablet.bioavailability.value, lag: 0, doses }],
      24,
    );
    if (steady.status !== "settled") throw new Error("no steady state");
    const average = quantityConvert({ value: steady.average, unit: "mg/L" }, "ng/mL");
    expect(Math.abs(average / (125 / 240) - 1)).toBeLessThan(1e-12);
  });

  it("windows and limits are the published nanograms per mL", () => {
    const ng = ({ value, unit }: { value: number; unit: UnitCode }) => quantityConvert({ value, unit }, "ng/mL");
    expect(record.windows.map(({ low, high }) => [ng(low), ng(high)])).toEqual([
      [0.5, 0.8],
      [0.5, 1],
      [0.6, 1.2],
      [0.8, 2],
    ]);
    expect(ng(record.toxicFrom!)).toBe(2.4);
  });

  it("the molar mass agrees with the printed factor of 1.281 from nanogram per mL to nmol per L", () => {
    const nmol = quantityConvert({ value: 1, unit: "ng/mL" }, "nmol/L", record.molarMass.value);
    expect(Math.abs(nmol - 1.281)).toBeLessThan(0.001);
  });
});
