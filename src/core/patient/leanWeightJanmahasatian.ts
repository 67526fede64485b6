import { issue } from "../result/index.ts";
import { bodyMassIndex } from "./bodyMassIndex.ts";
import type { Doubt } from "./doubt.ts";
import type { FormulaSource, Sex } from "./formulaSource.ts";

const NUMERATOR = 9270;
const BASE: Readonly<Record<Sex, number>> = { male: 6680, female: 8780 };
const PER_INDEX: Readonly<Record<Sex, number>> = { male: 216, female: 244 };

/** kg/m². Below 11.99 a man's lean weight would exceed his weight, so nothing is returned. */
export const LEAN_WEIGHT_LOWEST_INDEX = 12;
/** kg/m²: the body mass indices of the 373 people it was made in. */
const INDEX_FROM = 17.1;
const INDEX_TO = 69.9;
const ADULT_FROM_YEARS = 18;

export const leanWeightJanmahasatianSource: FormulaSource = {
  formula: "lean weight = 9270 × weight ÷ (6680 + 216 × BMI) for a man, ÷ (8780 + 244 × BMI) for a woman",
  citation:
    "Janmahasatian S et al. Quantification of lean bodyweight. Clin Pharmacokinet 2005;44(10):1051-1065 (title from memory; abstract read; coefficients as in Arch Dis Child Educ Pract, Table 2, Some size descriptors used for determining doses in obese patients)",
  basis: "seen",
};

/**
 * Lean (fat-free) weight by Janmahasatian.
 *
 * lean = 9270 · weight / (6680 + 216 · BMI) for a man, / (8780 + 244 · BMI) for a woman
 *
 * @param patient.weightKg kg, 0.5 to 700
 * @param patient.heightCm cm, 30 to 275
 * @returns kg. Made in adults with a BMI of 17.1 to 69.9 kg/m²: elsewhere the number is returned and `leanWeightQuestion` says so.
 *
 * Outside, and below a BMI of 12 kg/m²: throws RangeError. Accuracy: rounding only (relative error ≤ 1e-15).
 * Source: Janmahasatian et al., Clin Pharmacokinet 2005;44(10):1051-1065.
 * Example: man, 70 kg, 175 cm: 55.86 kg.
 */
export function leanWeightJanmahasatian(patient: {
  readonly weightKg: number;
  readonly heightCm: number;
  readonly sex: Sex;
}): number {
  const index = bodyMassIndex(patient);
  if (index < LEAN_WEIGHT_LOWEST_INDEX)
    throw new RangeError(`body mass index: ${index} kg/m2; allowed from ${LEAN_WEIGHT_LOWEST_INDEX} kg/m2`);
  return (NUMERATOR * patient.weightKg) / (BASE[patient.sex] + PER_INDEX[patient.sex] * index);
}

/** Whether the formula is used outside the people it was made in. */
export function leanWeightQuestion(patient: {
  readonly weightKg: number;
  readonly heightCm: number;
  readonly ageYears?: number;
}): Doubt | null {
  const index = bodyMassIndex(patient);
  const { ageYears } = patient;
  const isChild = ageYears !== undefined && ageYears < ADULT_FROM_YEARS;
  if (index >= INDEX_FROM && index <= INDEX_TO && !isChild) return null;
  const data = { index, from: INDEX_FROM, to: INDEX_TO, isChild };
  return { verdict: "improbable", issue: issue("lean-weight-outside", data) };
}
