import { describe, expect, it } from "vitest";
import { patientCovariates } from "../../../src/core/analysis/patientCovariates.ts";
import { patientFigures } from "../../../src/core/analysis/patientFigures.ts";
import type { Case, Observation } from "../../../src/core/case/index.ts";
import { recordById } from "../../../src/core/medicine/index.ts";
import {
  bedsideSchwartz,
  bodySurfaceMosteller,
  ckdEpi2021,
  clearanceDeindexed,
  cockcroftGault,
  idealWeightDevine,
  leanWeightJanmahasatian,
} from "../../../src/core/patient/index.ts";
import { caseFixture } from "./caseFixture.ts";

const base = caseFixture();
const at = "2026-03-01T08:00:00+00:00";
const albumin = (value: number, unit: "g/L" | "g/dL" = "g/L"): Observation => ({
  id: "alb",
  at,
  kind: "albumin",
  quantity: { value, unit },
});
const withPatient = (change: Partial<Case["patient"]>): Case => ({ ...base, patient: { ...base.patient, ...change } });
const codes = (figure: { readonly remarks?: readonly { readonly code: string }[] } | null | undefined) =>
  (figure?.remarks ?? []).map((each) => each.code);

describe("patientFigures", () => {
  const figures = patientFigures(base);

  it("size: lean weight and body surface beside the others (exactly core/patient's)", () => {
    expect(figures.leanWeight).toMatchObject({
      value: leanWeightJanmahasatian({ weightKg: 58, heightCm: 162, sex: "female" }),
      unit: "kg",
    });
    expect(figures.bodySurface).toMatchObject({
      value: bodySurfaceMosteller({ weightKg: 58, heightCm: 162 }),
      unit: "m2",
    });
    expect(figures.bodySurfaceDuBois?.basis).toBe("memory");
    expect(figures.bodyMassIndex?.unit).toBe("kg/m2");
    expect(codes(figures.leanWeight)).toEqual([]);
  });

  it("the formulas' kidney estimate is Cockcroft–Gault with the ideal weight, unless the actual one is lower", () => {
    const idealKg = idealWeightDevine({ heightCm: 162, sex: "female" }).weightKg;
    const wanted = { ageYears: 64, creatinineMgPerDl: 0.94, sex: "female" as const, weightKg: Math.min(idealKg, 58) };
    expect(figures.creatinineClearance?.value).toBe(cockcroftGault(wanted));
    expect(patientCovariates(base, figures, figures.creatinineClearance?.value)).toMatchObject({
      creatinineClearance: cockcroftGault(wanted),
      leanWeight: figures.leanWeight?.value,
      bodySurface: figures.bodySurface?.value,
      albumin: undefined,
    });
  });

  it("CKD-EPI stands beside it per 1.73 m2 and de-indexed, both with a word on what they are", () => {
    const perSurface = ckdEpi2021({ ageYears: 64, creatinineMgPerDl: 0.94, sex: "female" });
    expect(figures.filtrationRate).toMatchObject({
      equation: "ckd-epi-2021",
      perSurface: { value: perSurface, unit: "mL/min/{1.73_m2}" },
      deindexed: {
        value: clearanceDeindexed({ perSurface, bodySurfaceM2: figures.bodySurface!.value }),
        unit: "mL/min",
      },
    });
    expect(codes(figures.filtrationRate?.perSurface)).toEqual(["kidney-per-surface"]);
    expect(codes(figures.filtrationRate?.deindexed)).toEqual(["kidney-for-comparison"]);
  });

  it("without a height there is no body surface, so nothing is de-indexed", () => {
    const { height: _, ...patient } = base.patient;
    const found = patientFigures({ ...base, patient });
    expect(found.filtrationRate?.perSurface.value).toBeGreaterThan(0);
    expect(found.filtrationRate?.deindexed).toBeNull();
    expect(found.leanWeight).toBeNull();
  });

  it("a child of 12 has bedside Schwartz and no Cockcroft–Gault; an infant has neither", () => {
    const child = patientFigures(withPatient({ age: { value: 12, unit: "a" } }));
    expect(child.creatinineClearance).toBeNull();
    expect(child.filtrationRate).toMatchObject({
      equation: "bedside-schwartz",
      perSurface: { value: bedsideSchwartz({ ageYears: 12, heightCm: 162, creatinineMgPerDl: 0.94 }) },
    });
    expect(codes(child.filtrationRate?.perSurface)).toContain("kidney-rate-of-child");
    expect(patientFigures(withPatient({ age: { value: 0.5, unit: "a" } })).filtrationRate).toBeNull();
  });

  it("says that a formula is used outside the people it was made in", () => {
    const short = patientFigures(withPatient({ height: { value: 150, unit: "cm" } }));
    expect(codes(short.idealWeight)).toEqual(["ideal-weight-short"]);
    const thin: Observation = { id: "w", at, kind: "weight", quantity: { value: 42, unit: "kg" } };
    expect(codes(patientFigures(withPatient({ observations: [thin] })).leanWeight)).toEqual(["lean-weight-outside"]);
    const thinner: Observation = { ...thin, quantity: { value: 30, unit: "kg" } };
    expect(patientFigures(withPatient({ observations: [thinner] })).leanWeight).toBeNull();
  });

  it("the lowest creatinine that is taken breaks nothing", () => {
    const lowest: Observation = { id: "c", at, kind: "serumCreatinine", quantity: { value: 0.005, unit: "mg/dL" } };
    const observations = [base.patient.observations[0]!, lowest];
    for (const age of [6, 64]) {
      const found = patientFigures(withPatient({ observations, age: { value: age, unit: "a" } }));
      expect(found.filtrationRate?.deindexed?.value).toBeGreaterThan(0);
    }
  });
});

describe("phenytoin for albumin", () => {
  const phenytoin = (change: Partial<Case> = {}): Case => ({
    ...withPatient({ observations: [...base.patient.observations, albumin(2.5, "g/dL")] }),
    medicine: recordById("phenytoin")!,
    levels: [{ id: "l", at: "2026-03-03T07:30:00+00:00", quantity: { value: 8, unit: "mg/L" }, kind: "measured" }],
    ...change,
  });

  it("R08: 8 mg/L at 2.5 g/dL is 13.33 mg/L, with its warning", () => {
    const found = patientFigures(phenytoin()).phenytoinForAlbumin;
    expect(found).toMatchObject({ levelId: "l", form: "usual" });
    expect(found?.figure.value.toFixed(2)).toBe("13.33");
    expect(codes(found?.figure)).toEqual(["phenytoin-albumin-warning"]);
  });

  it("in kidney failure the other form, from memory", () => {
    const failing: Observation = { id: "c", at, kind: "serumCreatinine", quantity: { value: 6, unit: "mg/dL" } };
    const observations = [base.patient.observations[0]!, failing, albumin(30)];
    const found = patientFigures(phenytoin({ patient: { ...base.patient, observations } })).phenytoinForAlbumin;
    expect(found).toMatchObject({ form: "kidney-failure", figure: { basis: "memory" } });
    // 8 / (0.1 · 3 + 0.1), to the digits shown.
    expect(found?.figure.value.toFixed(2)).toBe("20.00");
  });

  it("says that kidney function is unknown, that albumin is normal, that valproate displaces", () => {
    const value = phenytoin({
      patient: {
        observations: [albumin(45)],
        factors: [{ kind: "interacting-medicine", from: at, detail: "Valproate started" }],
      },
    });
    expect(codes(patientFigures(value).phenytoinForAlbumin?.figure)).toEqual([
      "phenytoin-albumin-warning",
      "phenytoin-albumin-normal",
      "phenytoin-albumin-kidney-unknown",
      "phenytoin-albumin-displaced",
    ]);
  });

  it("is not there without an albumin, for a level left out, or for another medicine", () => {
    expect(patientFigures(phenytoin({ patient: base.patient })).phenytoinForAlbumin).toBeNull();
    const [level] = phenytoin().levels;
    expect(
      patientFigures(phenytoin({ levels: [{ ...level!, excluded: "haemolysed" }] })).phenytoinForAlbumin,
    ).toBeNull();
    expect(patientFigures(phenytoin({ medicine: base.medicine })).phenytoinForAlbumin).toBeNull();
  });
});
