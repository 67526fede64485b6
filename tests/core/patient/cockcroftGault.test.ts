import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { issueMessage } from "../../../src/core/messages/index.ts";
import {
  clearanceQuestion,
  clearanceWeight,
  cockcroftGault,
  cockcroftGaultSource,
  creatinineMgPerDl,
} from "../../../src/core/patient/index.ts";

const man = { ageYears: 68, weightKg: 72, creatinineMgPerDl: 1.3, sex: "male" } as const;

describe("cockcroftGault", () => {
  it("its example: 55.38 mL/min (to the digits shown)", () => {
    expect(Math.round(cockcroftGault(man) * 100) / 100).toBe(55.38);
  });

  it("a woman has 0.85 of a man's; weight scales it, creatinine divides it (relative 4e-16)", () => {
    const relative = (a: number, b: number) => Math.abs(a - b) / b;
    expect(relative(cockcroftGault({ ...man, sex: "female" }), 0.85 * cockcroftGault(man))).toBeLessThanOrEqual(4e-16);
    expect(relative(cockcroftGault({ ...man, weightKg: 144 }), 2 * cockcroftGault(man))).toBeLessThanOrEqual(4e-16);
    expect(relative(cockcroftGault({ ...man, creatinineMgPerDl: 2.6 }), cockcroftGault(man) / 2)).toBeLessThanOrEqual(
      4e-16,
    );
  });

  it("falls with age and with creatinine, rises with weight, and is positive, over its whole range", () => {
    const patients = fc.record({
      ageYears: fc.double({ min: 18, max: 110, noNaN: true }),
      weightKg: fc.double({ min: 30, max: 200, noNaN: true }),
      creatinineMgPerDl: fc.double({ min: 0.2, max: 15, noNaN: true }),
      sex: fc.constantFrom("female" as const, "male" as const),
    });
    fc.assert(
      fc.property(patients, (patient) => {
        const clearance = cockcroftGault(patient);
        expect(clearance).toBeGreaterThan(0);
        expect(cockcroftGault({ ...patient, ageYears: patient.ageYears + 1 })).toBeLessThan(clearance);
        expect(cockcroftGault({ ...patient, weightKg: patient.weightKg + 1 })).toBeGreaterThan(clearance);
        expect(cockcroftGault({ ...patient, creatinineMgPerDl: patient.creatinineMgPerDl * 1.1 })).toBeLessThan(
          clearance,
        );
      }),
      { seed: 20260304, numRuns: 300 },
    );
  });

  it.each([
    ["ageYears", 0],
    ["ageYears", 140],
    ["ageYears", Number.NaN],
    ["weightKg", 0],
    ["weightKg", 701],
    ["weightKg", Number.POSITIVE_INFINITY],
    ["creatinineMgPerDl", 0],
    ["creatinineMgPerDl", -1],
    ["creatinineMgPerDl", 201],
  ])("%s of %d throws, naming it", (argument, value) => {
    expect(() => cockcroftGault({ ...man, [argument]: value })).toThrow(new RegExp(`^${argument}: `));
  });

  it("under 18 it still answers, and a question says that it was made in adults", () => {
    expect(cockcroftGault({ ...man, ageYears: 12 })).toBeGreaterThan(0);
    const question = clearanceQuestion(12);
    expect(question?.verdict).toBe("improbable");
    expect(question && issueMessage(question.issue)).toBe(
      "The creatinine clearance formula was made in adults of 18\u00a0years and over; this patient is 12\u00a0years old.",
    );
    expect(clearanceQuestion(18)).toBeNull();
  });

  it("names its source", () => {
    expect(cockcroftGaultSource.citation).toContain("Nephron 1976;16:31-41");
  });
});

describe("clearanceWeight: ideal, unless actual is lower", () => {
  it.each([
    [95, 56.9, 56.9, "ideal"],
    [50, 56.9, 50, "actual"],
    [56.9, 56.9, 56.9, "ideal"],
    [95, null, 95, "actual"],
  ])("actual %d kg, ideal %s kg: %d kg, %s", (actualKg, idealKg, weightKg, kind) => {
    expect(clearanceWeight({ actualKg, idealKg })).toEqual({ weightKg, kind });
  });
  it.each([
    [0, 60],
    [60, 0],
    [Number.NaN, null],
  ])("actual %d, ideal %s throws", (actualKg, idealKg) => {
    expect(() => clearanceWeight({ actualKg, idealKg })).toThrow(RangeError);
  });
});

describe("creatinineMgPerDl", () => {
  it("takes mg/dL as it is and divides umol/L by 88.4", () => {
    expect(creatinineMgPerDl({ value: 1.1, unit: "mg/dL" })).toBe(1.1);
    expect(creatinineMgPerDl({ value: 88.4, unit: "umol/L" })).toBe(1);
  });
});
