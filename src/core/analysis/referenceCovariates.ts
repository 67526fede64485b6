import type { Covariates } from "../medicine/index.ts";
import {
  adjustedWeight,
  bodySurfaceMosteller,
  idealWeightDevine,
  leanWeightJanmahasatian,
  type Sex,
} from "../patient/index.ts";

/** A patient thought up to look at a record; what is not stated is null. */
export interface ReferencePatient {
  readonly sex: Sex | null;
  readonly ageYears: number | null;
  readonly weightKg: number | null;
  readonly heightCm: number | null;
  readonly creatinineClearanceMlPerMin: number | null;
  readonly albuminGPerL: number | null;
}

/**
 * What a record's formulas may use of a reference patient. Derived sizes are left out where something they need is not stated or lies
 * outside their formula; a record that uses one then says what it lacks.
 */
export function referenceCovariates(patient: ReferencePatient): Covariates {
  const { sex, weightKg, heightCm } = patient;
  const size = weightKg === null || heightCm === null ? null : { weightKg, heightCm };
  const ideal =
    sex === null || heightCm === null ? undefined : inside(() => idealWeightDevine({ heightCm, sex }).weightKg);
  const isAbove = weightKg !== null && ideal !== undefined && weightKg > ideal;
  return {
    weight: weightKg ?? undefined,
    idealWeight: ideal,
    adjustedWeight: isAbove ? inside(() => adjustedWeight({ actualKg: weightKg, idealKg: ideal })) : undefined,
    leanWeight: size && sex ? inside(() => leanWeightJanmahasatian({ ...size, sex })) : undefined,
    bodySurface: size ? inside(() => bodySurfaceMosteller(size)) : undefined,
    height: heightCm ?? undefined,
    age: patient.ageYears ?? undefined,
    creatinineClearance: patient.creatinineClearanceMlPerMin ?? undefined,
    albumin: patient.albuminGPerL ?? undefined,
    isFemale: sex === null ? undefined : sex === "female" ? 1 : 0,
  };
}

/** A size formula outside its range throws, and has no value. */
function inside(formula: () => number): number | undefined {
  try {
    return formula();
  } catch (error) {
    if (error instanceof RangeError) return undefined;
    throw error;
  }
}
