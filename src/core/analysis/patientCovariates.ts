import type { Case } from "../case/index.ts";
import type { Covariates } from "../medicine/index.ts";
import type { PatientFigures } from "./analysisTypes.ts";

/** What the record's formulas may use of this patient; the creatinine clearance (Cockcroft–Gault) is given, as it may change during the course. */
export function patientCovariates(
  value: Case,
  patient: PatientFigures,
  creatinineClearance: number | undefined,
): Covariates {
  const { sex, age } = value.patient;
  return {
    weight: patient.weight?.value,
    idealWeight: patient.idealWeight?.value,
    adjustedWeight: patient.adjustedWeight?.value,
    leanWeight: patient.leanWeight?.value,
    height: patient.heightCm ?? undefined,
    age: age?.value,
    creatinineClearance,
    albumin: patient.albumin?.value,
    bodySurface: patient.bodySurface?.value,
    isFemale: sex === undefined ? undefined : sex === "female" ? 1 : 0,
  };
}
