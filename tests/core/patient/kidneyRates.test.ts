import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  bedsideSchwartz,
  ckdEpi2021,
  clearanceDeindexed,
  STANDARD_SURFACE_M2,
} from "../../../src/core/patient/index.ts";

const man = { ageYears: 70, creatinineMgPerDl: 0.8, sex: "male" } as const;
const relative = (a: number, b: number) => Math.abs(a - b) / b;

describe("ckdEpi2021", () => {
  it("its examples: 95.21 and 79.22 (to the digits shown)", () => {
    expect(ckdEpi2021(man).toFixed(2)).toBe("95.21");
    expect(ckdEpi2021({ ...man, sex: "female" }).toFixed(2)).toBe("79.22");
  });

  it.each([
    ["male", 0.9],
    ["female", 0.7],
  ] as const)(
    "has no jump where its two slopes meet: %s, %d mg/dL (relative 2e-9 for a step of 1e-9)",
    (sex, kappa) => {
      const at = (creatinineMgPerDl: number) => ckdEpi2021({ ageYears: 40, creatinineMgPerDl, sex });
      expect(relative(at(kappa * (1 - 1e-9)), at(kappa))).toBeLessThanOrEqual(2e-9);
      expect(relative(at(kappa * (1 + 1e-9)), at(kappa))).toBeLessThanOrEqual(2e-9);
    },
  );

  it("falls with age and with creatinine over its whole range", () => {
    const patients = fc.record({
      ageYears: fc.double({ min: 18, max: 110, noNaN: true }),
      creatinineMgPerDl: fc.double({ min: 0.2, max: 15, noNaN: true }),
      sex: fc.constantFrom("female" as const, "male" as const),
    });
    fc.assert(
      fc.property(patients, (patient) => {
        const rate = ckdEpi2021(patient);
        expect(rate).toBeGreaterThan(0);
        expect(ckdEpi2021({ ...patient, ageYears: patient.ageYears + 1 })).toBeLessThan(rate);
        expect(ckdEpi2021({ ...patient, creatinineMgPerDl: patient.creatinineMgPerDl * 1.1 })).toBeLessThan(rate);
      }),
      { seed: 20260304, numRuns: 200 },
    );
  });

  it.each([
    ["ageYears", 17.99],
    ["ageYears", 131],
    ["ageYears", Number.NaN],
    ["creatinineMgPerDl", 0],
    ["creatinineMgPerDl", 201],
  ])("%s of %d throws, naming it", (argument, value) => {
    expect(() => ckdEpi2021({ ...man, [argument]: value })).toThrow(new RegExp(`^${argument}: `));
  });
});

describe("bedsideSchwartz", () => {
  const child = { ageYears: 6, heightCm: 110, creatinineMgPerDl: 0.5 };

  it("its example, and its proportions (exactly)", () => {
    expect(bedsideSchwartz(child)).toBe(90.86);
    expect(bedsideSchwartz({ ...child, creatinineMgPerDl: 1 })).toBe(45.43);
  });

  it("answers from the first birthday to before the eighteenth", () => {
    expect(bedsideSchwartz({ ...child, ageYears: 1 })).toBe(90.86);
    expect(bedsideSchwartz({ ...child, ageYears: 17.99 })).toBe(90.86);
  });

  it.each([
    ["ageYears", 0.99],
    ["ageYears", 18],
    ["ageYears", Number.NaN],
    ["heightCm", 29],
    ["creatinineMgPerDl", 0],
  ])("%s of %d throws, naming it", (argument, value) => {
    expect(() => bedsideSchwartz({ ...child, [argument]: value })).toThrow(new RegExp(`^${argument}: `));
  });
});

describe("clearanceDeindexed", () => {
  it("changes nothing at 1.73 m2 (exactly), and doubles at twice that", () => {
    expect(clearanceDeindexed({ perSurface: 95, bodySurfaceM2: STANDARD_SURFACE_M2 })).toBe(95);
    expect(clearanceDeindexed({ perSurface: 95, bodySurfaceM2: 2 * STANDARD_SURFACE_M2 })).toBe(190);
  });

  it.each([
    ["perSurface", -1],
    ["perSurface", 30_001],
    ["bodySurfaceM2", 0],
    ["bodySurfaceM2", Number.NaN],
  ])("%s of %d throws, naming it", (argument, value) => {
    expect(() => clearanceDeindexed({ perSurface: 95, bodySurfaceM2: 1.9, [argument]: value })).toThrow(
      new RegExp(`^${argument}: `),
    );
  });
});
