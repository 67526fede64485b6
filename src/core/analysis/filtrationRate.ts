import type { Case } from "../case/index.ts";
import {
  bedsideSchwartz,
  bedsideSchwartzSource,
  CKD_EPI_FROM_YEARS,
  ckdEpi2021,
  ckdEpi2021Source,
  clearanceDeindexed,
  clearanceDeindexedSource,
  SCHWARTZ_BELOW_YEARS,
  SCHWARTZ_FROM_YEARS,
} from "../patient/index.ts";
import { issue } from "../result/index.ts";
import type { FiltrationRate, PatientFigures, Traced } from "./analysisTypes.ts";
import { patientTraced } from "./patientTraced.ts";

type Known = Pick<PatientFigures, "heightCm" | "creatinine" | "bodySurface">;

/** The filtration rate by the equation of the patient's age, beside the Cockcroft–Gault clearance: for comparison, in no formula. */
export function filtrationRate(value: Case, known: Known): FiltrationRate | null {
  const found = perSurface(value, known);
  return found && { ...found, deindexed: deindexed(found.perSurface, known.bodySurface) };
}

function perSurface(
  { patient: { sex, age } }: Case,
  { heightCm, creatinine }: Known,
): Pick<FiltrationRate, "equation" | "perSurface"> | null {
  if (age === undefined || creatinine === null) return null;
  const ageYears = age.value;
  const creatinineMgPerDl = creatinine.value;
  const ageIn = { name: "age", value: ageYears, unit: "a" } as const;
  const creatinineIn = { name: "creatinine", value: creatinineMgPerDl, unit: "mg/dL" } as const;
  const unit = "mL/min/{1.73_m2}";
  const indexed = issue("kidney-per-surface");
  if (ageYears >= CKD_EPI_FROM_YEARS && sex !== undefined) {
    const rate = ckdEpi2021({ ageYears, creatinineMgPerDl, sex });
    return {
      equation: "ckd-epi-2021",
      perSurface: patientTraced(rate, unit, ckdEpi2021Source, [creatinineIn, ageIn], indexed),
    };
  }
  if (ageYears >= SCHWARTZ_FROM_YEARS && ageYears < SCHWARTZ_BELOW_YEARS && heightCm !== null) {
    const rate = bedsideSchwartz({ ageYears, heightCm, creatinineMgPerDl });
    const heightIn = { name: "height", value: heightCm, unit: "cm" } as const;
    return {
      equation: "bedside-schwartz",
      perSurface: patientTraced(
        rate,
        unit,
        bedsideSchwartzSource,
        [heightIn, creatinineIn],
        issue("kidney-rate-of-child"),
        indexed,
      ),
    };
  }
  return null;
}

function deindexed(rate: Traced, surface: Traced | null): Traced | null {
  if (surface === null) return null;
  return patientTraced(
    clearanceDeindexed({ perSurface: rate.value, bodySurfaceM2: surface.value }),
    "mL/min",
    clearanceDeindexedSource,
    [
      { name: "rate per 1.73 m²", value: rate.value, unit: rate.unit },
      { name: "body surface", value: surface.value, unit: "m2" },
    ],
    issue("kidney-for-comparison"),
  );
}
