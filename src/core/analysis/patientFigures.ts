import type { Case, Observation } from "../case/index.ts";
import {
  adjustedWeight,
  adjustedWeightSource,
  bodyMassIndex,
  bodyMassIndexSource,
  bodySurfaceDuBois,
  bodySurfaceDuBoisSource,
  bodySurfaceMosteller,
  bodySurfaceMostellerSource,
  clearanceWeight,
  clearanceWeightSource,
  cockcroftGault,
  cockcroftGaultSource,
  IDEAL_WEIGHT_LOWEST_CM,
  idealWeightDevine,
  idealWeightDevineSource,
  LEAN_WEIGHT_LOWEST_INDEX,
  leanWeightJanmahasatian,
  leanWeightJanmahasatianSource,
  leanWeightQuestion,
} from "../patient/index.ts";
import { issue } from "../result/index.ts";
import { quantityConvert } from "../units/index.ts";
import type { PatientFigures, Traced } from "./analysisTypes.ts";
import { filtrationRate } from "./filtrationRate.ts";
import { latestObservation, observationTraced, patientTraced } from "./patientTraced.ts";
import { phenytoinFigure } from "./phenytoinFigure.ts";

/** Age from which the adult equations hold, years (they were made in adults; see core/patient). */
const ADULT_YEARS = 18;

/** Size and kidney function of the patient at the now line; null for what can't be worked out from what is entered. */
export function patientFigures(value: Case): PatientFigures {
  const { height } = value.patient;
  const heightCm = height ? quantityConvert(height, "cm") : null;
  const weight = observationTraced(latestObservation(value, "weight"));
  const creatinine = latestObservation(value, "serumCreatinine");
  const albumin = observationTraced(latestObservation(value, "albumin"));
  const sizes = sizeFigures(value, weight?.value ?? null, heightCm);
  const clearance =
    creatinine && clearanceFigure(value, weight?.value ?? null, sizes.idealWeight?.value ?? null, creatinine);
  const known = { heightCm, weight, creatinine: observationTraced(creatinine), albumin, ...sizes };
  return {
    ...known,
    creatinineClearance: clearance,
    clearanceWeight:
      weight === null
        ? null
        : clearanceWeight({ actualKg: weight.value, idealKg: sizes.idealWeight?.value ?? null }).kind,
    filtrationRate: filtrationRate(value, known),
    phenytoinForAlbumin: phenytoinFigure(value, albumin?.value ?? null, clearance?.value ?? null),
  };
}

/** Creatinine clearance with a given creatinine, mL/min, everything else as at the now line; null when it can't be worked out. */
export function creatinineClearanceAt(value: Case, patient: PatientFigures, creatinine: Observation): number | null {
  const found = clearanceFigure(value, patient.weight?.value ?? null, patient.idealWeight?.value ?? null, creatinine);
  return found?.value ?? null;
}

type Sizes = Pick<
  PatientFigures,
  "idealWeight" | "adjustedWeight" | "bodyMassIndex" | "leanWeight" | "bodySurface" | "bodySurfaceDuBois"
>;

function sizeFigures(value: Case, weightKg: number | null, heightCm: number | null): Sizes {
  const { sex, age } = value.patient;
  const weightIn = { name: "weight", value: weightKg ?? 0, unit: "kg" } as const;
  const heightIn = { name: "height", value: heightCm ?? 0, unit: "cm" } as const;
  const ideal =
    sex !== undefined && heightCm !== null && heightCm >= IDEAL_WEIGHT_LOWEST_CM
      ? idealWeightDevine({ heightCm, sex })
      : null;
  const idealWeight =
    ideal &&
    patientTraced(
      ideal.weightKg,
      "kg",
      idealWeightDevineSource,
      [heightIn],
      ideal.belowFormulaRange ? issue("ideal-weight-short", { heightCm }) : null,
    );
  const size = weightKg === null || heightCm === null ? null : { weightKg, heightCm };
  const index = size && bodyMassIndex(size);
  return {
    idealWeight,
    adjustedWeight:
      ideal === null || weightKg === null || weightKg <= ideal.weightKg
        ? null
        : patientTraced(adjustedWeight({ actualKg: weightKg, idealKg: ideal.weightKg }), "kg", adjustedWeightSource, [
            { name: "actual", value: weightKg, unit: "kg" },
            { name: "ideal", value: ideal.weightKg, unit: "kg" },
          ]),
    bodyMassIndex: index === null ? null : patientTraced(index, "kg/m2", bodyMassIndexSource, [weightIn, heightIn]),
    leanWeight:
      size === null || index === null || index < LEAN_WEIGHT_LOWEST_INDEX || sex === undefined
        ? null
        : patientTraced(
            leanWeightJanmahasatian({ ...size, sex }),
            "kg",
            leanWeightJanmahasatianSource,
            [weightIn, { name: "BMI", value: index, unit: "kg/m2" }],
            leanWeightQuestion({ ...size, ...(age === undefined ? {} : { ageYears: age.value }) }),
          ),
    bodySurface:
      size && patientTraced(bodySurfaceMosteller(size), "m2", bodySurfaceMostellerSource, [heightIn, weightIn]),
    bodySurfaceDuBois:
      size && patientTraced(bodySurfaceDuBois(size), "m2", bodySurfaceDuBoisSource, [weightIn, heightIn]),
  };
}

function clearanceFigure(
  value: Case,
  weightKg: number | null,
  idealKg: number | null,
  creatinine: Observation,
): Traced | null {
  const { sex, age } = value.patient;
  const mgPerDl = observationTraced(creatinine)!;
  if (sex === undefined || age === undefined || age.value < ADULT_YEARS || weightKg === null) return null;
  const weight = clearanceWeight({ actualKg: weightKg, idealKg });
  const figure = patientTraced(
    cockcroftGault({ ageYears: age.value, weightKg: weight.weightKg, creatinineMgPerDl: mgPerDl.value, sex }),
    "mL/min",
    cockcroftGaultSource,
    [
      { name: "age", value: age.value, unit: "a" },
      { name: `weight (${weight.kind})`, value: weight.weightKg, unit: "kg" },
      { name: "creatinine", value: mgPerDl.value, unit: "mg/dL" },
    ],
  );
  return {
    ...figure,
    source: `${figure.source}. Weight: ${clearanceWeightSource.formula} (${clearanceWeightSource.citation})`,
  };
}
