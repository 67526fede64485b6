import { describe, expect, it } from "vitest";
import {
  adjustedWeight,
  bodyMassIndex,
  bodySurfaceDuBois,
  bodySurfaceMosteller,
  IDEAL_WEIGHT_LOWEST_CM,
  idealWeightDevine,
  leanWeightJanmahasatian,
  leanWeightQuestion,
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

describe("leanWeightJanmahasatian", () => {
  it("its example: 55.86 kg (to the digits shown); less than the weight wherever it answers", () => {
    expect(leanWeightJanmahasatian({ weightKg: 70, heightCm: 175, sex: "male" }).toFixed(2)).toBe("55.86");
    for (const sex of ["female", "male"] as const) {
      for (const index of [12.001, 17, 25, 40, 70]) {
        const weightKg = index * 1.75 ** 2;
        expect(leanWeightJanmahasatian({ weightKg, heightCm: 175, sex })).toBeLessThan(weightKg);
      }
    }
  });

  it("throws below a body mass index of 12 kg/m2, where it would exceed the weight", () => {
    expect(() => leanWeightJanmahasatian({ weightKg: 36, heightCm: 175, sex: "male" })).toThrow(/^body mass index: /);
    expect(() => leanWeightJanmahasatian({ weightKg: 0, heightCm: 175, sex: "male" })).toThrow(/^weightKg: /);
  });

  it("says when it is used outside the people it was made in", () => {
    expect(leanWeightQuestion({ weightKg: 70, heightCm: 175, ageYears: 40 })).toBeNull();
    expect(leanWeightQuestion({ weightKg: 50, heightCm: 175 })?.issue.code).toBe("lean-weight-outside");
    expect(leanWeightQuestion({ weightKg: 220, heightCm: 175 })?.issue.code).toBe("lean-weight-outside");
    expect(leanWeightQuestion({ weightKg: 45, heightCm: 150, ageYears: 12 })?.issue.code).toBe("lean-weight-outside");
  });
});

describe("body surface", () => {
  it("80 kg at 180 cm is 2 m2 by Mosteller (exactly); Du Bois lies within 7 % of it from 50 to 160 kg", () => {
    expect(bodySurfaceMosteller({ weightKg: 80, heightCm: 180 })).toBe(2);
    for (const weightKg of [50, 80, 120, 160]) {
      const ratio = bodySurfaceDuBois({ weightKg, heightCm: 170 }) / bodySurfaceMosteller({ weightKg, heightCm: 170 });
      expect(Math.abs(ratio - 1)).toBeLessThanOrEqual(0.07);
    }
  });

  it.each([
    ["weightKg", 0],
    ["weightKg", Number.NaN],
    // A height in metres by mistake.
    ["heightCm", 1.8],
    ["heightCm", 276],
  ])("%s of %d throws, naming it", (argument, value) => {
    expect(() => bodySurfaceMosteller({ weightKg: 80, heightCm: 180, [argument]: value })).toThrow(
      new RegExp(`^${argument}: `),
    );
    expect(() => bodySurfaceDuBois({ weightKg: 80, heightCm: 180, [argument]: value })).toThrow(
      new RegExp(`^${argument}: `),
    );
  });
});
