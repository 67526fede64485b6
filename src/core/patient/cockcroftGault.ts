import { issue } from "../result/index.ts";
import type { Doubt } from "./doubt.ts";
import type { FormulaSource, Sex } from "./formulaSource.ts";
import { requireWithin } from "./requireWithin.ts";

/** Years: the equation was made in adults. */
const ADULT_FROM_YEARS = 18;
const FEMALE_FACTOR = 0.85;

export const cockcroftGaultSource: FormulaSource = {
  formula: "CrCl = (140 − age) × weight ÷ (72 × creatinine), × 0.85 if female",
  citation: "Cockcroft DW, Gault MH. Prediction of creatinine clearance from serum creatinine. Nephron 1976;16:31-41",
  basis: "seen",
};

/**
 * Creatinine clearance by Cockcroft and Gault.
 *
 * CrCl = (140 − age) · weight / (72 · creatinine), · 0.85 for a woman
 *
 * @param patient.ageYears a, above 0 and below 140; made for 18 and over: below, the number is returned and `clearanceQuestion` says so
 * @param patient.weightKg kg, 0.5 to 700; which weight is `clearanceWeight`'s to say
 * @param patient.creatinineMgPerDl serum creatinine, mg/dL, 0.005 to 200
 * @returns mL/min, not scaled to body surface
 *
 * Outside: throws RangeError. Accuracy: rounding only (relative error ≤ 1e-15); the estimate itself is far coarser.
 * Source: Cockcroft & Gault, Nephron 1976;16:31-41.
 * Example: man, 68 years, 72 kg, 1.3 mg/dL: 55.38 mL/min.
 */
export function cockcroftGault(patient: {
  readonly ageYears: number;
  readonly weightKg: number;
  readonly creatinineMgPerDl: number;
  readonly sex: Sex;
}): number {
  const { ageYears, weightKg, creatinineMgPerDl, sex } = patient;
  if (!(ageYears > 0 && ageYears < 140))
    throw new RangeError(`ageYears: ${ageYears} a; allowed above 0 and below 140 a`);
  requireWithin("weightKg", weightKg, "kg", 0.5, 700);
  requireWithin("creatinineMgPerDl", creatinineMgPerDl, "mg/dL", 0.005, 200);
  const male = ((140 - ageYears) * weightKg) / (72 * creatinineMgPerDl);
  return sex === "female" ? male * FEMALE_FACTOR : male;
}

/** Whether the adult equation is being used outside adults. */
export function clearanceQuestion(ageYears: number): Doubt | null {
  if (ageYears >= ADULT_FROM_YEARS) return null;
  return { verdict: "improbable", issue: issue("clearance-under-age", { ageYears, from: ADULT_FROM_YEARS }) };
}
