import { describe, expect, it } from "vitest";
import {
  adjustedWeight,
  bodyMassIndex,
  IDEAL_WEIGHT_LOWEST_CM,
  idealWeightDevine,
} from "../../../src/core/patient/index.ts";

describe("idealWeightDevine", () => {
  it("is the base weight at 60 inches exactly, not flagged", () => {
    expect(idealWeightDevine({ heightCm: 152.4, sex: "male" })).toEqual({ weightKg: 50, belowFormulaRange: false });
    expect(idealWeightDevine({ heightCm: 152.4, sex: "female" })).toEqual({ weightKg: 45.5, belowFormulaRange: false });
  });

  it("goes on below 60 inches without a clamp, flagged", () => {
    const short = idealWeightDevine({ heightCm: 150, sex: "female" });
    expect(short.belowFormulaRange).toBe(true);
    expect(short.weightKg).toBeLessThan(45.5);
  });

  it("adds 2.3 kg an inch (absolute 1e-12 kg)", () => {
    const gain =
      idealWeightDevine({ heightCm: 182.54, sex: "male" }).weightKg -
      idealWeightDevine({ heightCm: 180, sex: "male" }).weightKg;
    expect(Math.abs(gain - 2.3)).toBeLessThanOrEqual(1e-12);
  });

  it("is above 0 wherever it answers, and throws elsewhere", () => {
    expect(idealWeightDevine({ heightCm: IDEAL_WEIGHT_LOWEST_CM, sex: "female" }).weightKg).toBeGreaterThan(0);
    for (const heightCm of [119.9, 276, 0, Number.NaN]) {
      expect(() => idealWeightDevine({ heightCm, sex: "female" })).toThrow(/^heightCm: /);
    }
  });
});

describe("adjustedWeight", () => {
  it("is ideal at ideal and lies 40 % of the way to actual (relative 2e-16)", () => {
    expect(adjustedWeight({ actualKg: 70, idealKg: 70 })).toBe(70);
    expect(adjustedWeight({ actualKg: 120, idealKg: 70 })).toBe(90);
    expect(adjustedWeight({ actualKg: 60, idealKg: 70 })).toBe(66);
  });
  it.each([0, 701, Number.NaN])("%d kg throws", (kg) => {
    expect(() => adjustedWeight({ actualKg: kg, idealKg: 70 })).toThrow(RangeError);
    expect(() => adjustedWeight({ actualKg: 70, idealKg: kg })).toThrow(RangeError);
  });
});

describe("bodyMassIndex", () => {
  it("72 kg at 180 cm: 22.22 kg/m² (to the digits shown); 81 kg at 180 cm: 25 exactly", () => {
    expect(Math.round(bodyMassIndex({ weightKg: 72, heightCm: 180 }) * 100) / 100).toBe(22.22);
    expect(bodyMassIndex({ weightKg: 81, heightCm: 180 })).toBe(25);
  });
  it.each([
    [0, 180],
    [72, 0],
    [72, Number.NaN],
  ])("%d kg at %d cm throws", (weightKg, heightCm) => {
    expect(() => bodyMassIndex({ weightKg, heightCm })).toThrow(RangeError);
  });
});
