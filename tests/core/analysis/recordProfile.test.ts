import { describe, expect, test } from "vitest";
import {
  RECORD_DOSE_MOST_MG,
  type ReferencePatient,
  recordProfile,
  referenceCovariates,
} from "../../../src/core/analysis/index.ts";
import { BUILT_IN_RECORDS, type MedicineRecord, recordById } from "../../../src/core/medicine/index.ts";

const PATIENT: ReferencePatient = {
  sex: "male",
  ageYears: 40,
  weightKg: 80,
  heightCm: 178,
  creatinineClearanceMlPerMin: 100,
  albuminGPerL: 42,
};

function profileOf(record: MedicineRecord, doseMg: number, intervalH: number, patient = PATIENT) {
  const found = recordProfile(record, patient, { product: record.products[0]!.id, doseMg, intervalH });
  if (!found.ok) throw new Error(JSON.stringify(found.issues));
  return found.value;
}

describe("recordProfile", () => {
  test.each(
    BUILT_IN_RECORDS.filter(({ kinetics }) => kinetics.kind !== "saturable-oral").map(
      (each) => [each.id, each] as const,
    ),
  )("%s: the average at steady state is salt × F × dose ÷ (CL × interval)", (_, record) => {
    const { readings, parameters, halfLifeH } = profileOf(record, 0.25, 24);
    const product = record.products[0]!;
    const clearance = parameters.find(({ symbol }) => symbol === "CL")!.value;
    const wanted = ((product.saltFactor?.value ?? 1) * product.bioavailability.value * 0.25) / (clearance * 24);
    // The closed form against the swept one: relative 1e-9.
    expect(Math.abs(readings!.average / wanted - 1)).toBeLessThan(1e-9);
    expect(readings!.auc24).toBeCloseTo(readings!.average * 24, 12);
    expect(halfLifeH).toBeGreaterThan(0);
    expect(readings!.lowest).toBeLessThanOrEqual(readings!.average);
    expect(readings!.peak).toBeGreaterThanOrEqual(readings!.average);
  });

  test("the course is drawn from the first dose until it has settled, and ends near the steady curve's end", () => {
    const { course, steady, readings } = profileOf(recordById("lamotrigine")!, 100, 12);
    expect(course.timesH[0]).toBe(0);
    expect(course.timesH.at(-1)!).toBeGreaterThanOrEqual(readings!.timeTo90H + 24);
    expect(steady!.timesH.at(-1)).toBe(12);
    // A tenth of the way is left at 90 %.
    expect(course.values.at(-1)! / steady!.values.at(-1)!).toBeGreaterThan(0.9);
    expect(course.values.at(-1)! / steady!.values.at(-1)!).toBeLessThan(1);
  });

  test("above Vmax there is a curve that rises, and no steady state", () => {
    const { steady, readings, course, halfLifeH } = profileOf(recordById("phenytoin")!, 2_000, 12);
    expect([steady, readings, halfLifeH]).toEqual([null, null, null]);
    expect(course.values.at(-1)!).toBeGreaterThan(course.values.at(-100)!);
  });

  test("what the patient lacks is said once, and a course that can't be with its bounds", () => {
    const record = recordById("theophylline")!;
    const course = { product: record.products[0]!.id, doseMg: 0, intervalH: 0.5 };
    const found = recordProfile(record, { ...PATIENT, weightKg: null }, course);
    if (found.ok) throw new Error("a profile without a weight");
    expect(found.issues.map(({ code }) => code)).toEqual(
      [
        "record-course-amount",
        "record-course-interval",
        ...(found.issues.some(({ data }) => data.name === "idealWeight") ? ["formula-needs"] : []),
        "formula-needs",
      ].slice(0, found.issues.length),
    );
    expect(new Set(found.issues.map((each) => JSON.stringify(each))).size).toBe(found.issues.length);
    expect(found.issues[0]!.data).toMatchObject({ found: 0, most: RECORD_DOSE_MOST_MG });
  });

  test("figures far outside what the kinetics take are refused, not drawn", () => {
    const record = recordById("theophylline")!;
    const product = record.products[0]!;
    const absurd = { ...record, products: [{ ...product, lag: { ...product.lag, value: -1 } }] };
    expect(recordProfile(absurd, PATIENT, { product: product.id, doseMg: 200, intervalH: 12 })).toMatchObject({
      ok: false,
      issues: [{ code: "record-profile-failed" }],
    });
  });
});

describe("referenceCovariates", () => {
  test("derives the sizes; what can't be derived is left out", () => {
    const all = referenceCovariates(PATIENT);
    // Devine: 50 kg + 2.3 kg × (178 cm ÷ 2.54 cm − 60) = 73.18 kg; Mosteller: √(178 × 80 ÷ 3600) = 1.989 m2.
    expect(all.idealWeight).toBeCloseTo(73.181, 2);
    expect(all.bodySurface).toBeCloseTo(1.9889, 3);
    expect(all.adjustedWeight).toBeCloseTo(73.181 + 0.4 * (80 - 73.181), 2);
    expect(all).toMatchObject({ weight: 80, age: 40, creatinineClearance: 100, albumin: 42, isFemale: 0 });
    expect(referenceCovariates({ ...PATIENT, sex: null, heightCm: 20 })).toMatchObject({
      idealWeight: undefined,
      leanWeight: undefined,
      bodySurface: undefined,
      isFemale: undefined,
    });
  });
});
