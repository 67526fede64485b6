import type { Case, Observation } from "../case/index.ts";
import {
  adjustedWeight,
  adjustedWeightSource,
  bodyMassIndex,
  bodyMassIndexSource,
  clearanceWeight,
  clearanceWeightSource,
  cockcroftGault,
  cockcroftGaultSource,
  creatinineMgPerDl,
  type FormulaSource,
  IDEAL_WEIGHT_LOWEST_CM,
  idealWeightDevine,
  idealWeightDevineSource,
} from "../patient/index.ts";
import { instantMs } from "../time/index.ts";
import { quantityConvert } from "../units/index.ts";
import type { PatientFigures, Traced } from "./analysisTypes.ts";

/** Age from which the adult equations hold, years (they were made in adults; see core/patient). */
const ADULT_YEARS = 18;

/** The latest observation of a kind at or before the now line; null when there is none. */
export function latestObservation(value: Case, kind: Observation["kind"]): Observation | null {
  const nowMs = instantMs(value.now);
  return value.patient.observations
    .filter((observation) => observation.kind === kind && instantMs(observation.at) <= nowMs)
    .reduce<Observation | null>(
      (latest, observation) =>
        latest === null || instantMs(observation.at) >= instantMs(latest.at) ? observation : latest,
      null,
    );
}

/** Size and kidney function of the patient at the now line; null for what can't be worked out from what is entered. */
export function patientFigures(value: Case): PatientFigures {
  const { sex, age, height } = value.patient;
  const heightCm = height ? quantityConvert(height, "cm") : null;
  const weight = entered(latestObservation(value, "weight"), "kg");
  const weightKg = weight?.value ?? null;
  const creatinine = latestObservation(value, "serumCreatinine");

  const idealKg =
    sex !== undefined && heightCm !== null && heightCm >= IDEAL_WEIGHT_LOWEST_CM
      ? idealWeightDevine({ heightCm, sex }).weightKg
      : null;
  const forClearance = weightKg === null ? null : clearanceWeight({ actualKg: weightKg, idealKg });
  return {
    heightCm,
    weight,
    creatinine: creatinine && {
      ...entered(creatinine, "mg/dL")!,
      inputs: [{ name: "as reported", value: creatinine.quantity.value, unit: creatinine.quantity.unit }],
    },
    idealWeight:
      idealKg === null
        ? null
        : traced(idealKg, "kg", idealWeightDevineSource, [{ name: "height", value: heightCm!, unit: "cm" }]),
    adjustedWeight:
      idealKg === null || weightKg === null || weightKg <= idealKg
        ? null
        : traced(adjustedWeight({ actualKg: weightKg, idealKg }), "kg", adjustedWeightSource, [
            { name: "actual", value: weightKg, unit: "kg" },
            { name: "ideal", value: idealKg, unit: "kg" },
          ]),
    bodyMassIndex:
      heightCm === null || weightKg === null
        ? null
        : traced(bodyMassIndex({ weightKg, heightCm }), "1", bodyMassIndexSource, [
            { name: "weight", value: weightKg, unit: "kg" },
            { name: "height", value: heightCm, unit: "cm" },
          ]),
    creatinineClearance:
      sex === undefined || age === undefined || age.value < ADULT_YEARS || forClearance === null || creatinine === null
        ? null
        : clearance(sex, age.value, forClearance, creatinine),
    clearanceWeight: forClearance?.kind ?? null,
  };
}

/** Creatinine clearance with a given creatinine, mL/min, everything else as at the now line; null when it can't be worked out. */
export function creatinineClearanceAt(value: Case, patient: PatientFigures, creatinine: Observation): number | null {
  const { sex, age } = value.patient;
  if (sex === undefined || age === undefined || age.value < ADULT_YEARS || patient.weight === null) return null;
  const forClearance = clearanceWeight({ actualKg: patient.weight.value, idealKg: patient.idealWeight?.value ?? null });
  return clearance(sex, age.value, forClearance, creatinine).value;
}

function clearance(
  sex: "female" | "male",
  ageYears: number,
  weight: { readonly weightKg: number; readonly kind: "actual" | "ideal" },
  creatinine: Observation,
): Traced {
  const mgPerDl = quantityAsMgPerDl(creatinine);
  const figure = traced(
    cockcroftGault({ ageYears, weightKg: weight.weightKg, creatinineMgPerDl: mgPerDl, sex }),
    "mL/min",
    cockcroftGaultSource,
    [
      { name: "age", value: ageYears, unit: "a" },
      { name: `weight (${weight.kind})`, value: weight.weightKg, unit: "kg" },
      { name: "creatinine", value: mgPerDl, unit: "mg/dL" },
    ],
  );
  return {
    ...figure,
    source: `${figure.source}. Weight: ${clearanceWeightSource.formula} (${clearanceWeightSource.citation})`,
  };
}

function quantityAsMgPerDl(observation: Observation): number {
  if (observation.kind !== "serumCreatinine")
    throw new RangeError(`observation: "${observation.kind}"; allowed serumCreatinine`);
  return creatinineMgPerDl(observation.quantity);
}

function entered(observation: Observation | null, unit: "kg" | "mg/dL"): Traced | null {
  if (!observation) return null;
  const value =
    observation.kind === "serumCreatinine"
      ? quantityAsMgPerDl(observation)
      : quantityConvert(observation.quantity, unit);
  return { value, unit, formula: "", inputs: [], source: "entered", basis: "entered" };
}

function traced(value: number, unit: Traced["unit"], source: FormulaSource, inputs: Traced["inputs"]): Traced {
  return { value, unit, formula: source.formula, inputs, source: source.citation, basis: source.basis };
}
