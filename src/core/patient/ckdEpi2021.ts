import type { FormulaSource, Sex } from "./formulaSource.ts";
import { requireWithin } from "./requireWithin.ts";

/** a. The equation was made in adults; below, see `bedsideSchwartz`. */
export const CKD_EPI_FROM_YEARS = 18;
const KAPPA: Readonly<Record<Sex, number>> = { female: 0.7, male: 0.9 };
const ALPHA: Readonly<Record<Sex, number>> = { female: -0.241, male: -0.302 };
const FEMALE_FACTOR = 1.012;

export const ckdEpi2021Source: FormulaSource = {
  formula:
    "eGFR = 142 × min(creatinine ÷ κ, 1)^α × max(creatinine ÷ κ, 1)^−1.2 × 0.9938^age, × 1.012 if female; κ 0.7 (woman) or 0.9 (man), α −0.241 or −0.302",
  citation:
    "Inker LA et al. New creatinine- and cystatin C-based equations to estimate GFR without race. N Engl J Med 2021;385:1737-1749 (title from memory; formula read on the National Kidney Foundation's page)",
  basis: "seen",
};

/**
 * Glomerular filtration rate by CKD-EPI 2021 from creatinine, for a body surface of 1.73 m².
 *
 * eGFR = 142 · min(creatinine / κ, 1)^α · max(creatinine / κ, 1)^−1.2 · 0.9938^age, · 1.012 for a woman;
 * κ = 0.7 mg/dL for a woman, 0.9 for a man; α = −0.241 for a woman, −0.302 for a man
 *
 * @param patient.ageYears a, 18 to 130
 * @param patient.creatinineMgPerDl serum creatinine, mg/dL, 0.005 to 200
 * @returns mL/min per 1.73 m²: not a clearance of this patient until `clearanceDeindexed`
 *
 * Outside: throws RangeError. Accuracy: rounding only (relative error ≤ 1e-14); the estimate itself is far coarser.
 * Source: Inker et al., N Engl J Med 2021;385:1737-1749; formula as on the National Kidney Foundation's page.
 * Example: man, 70 years, 0.8 mg/dL: 95.21; woman: 79.22.
 */
export function ckdEpi2021(patient: {
  readonly ageYears: number;
  readonly creatinineMgPerDl: number;
  readonly sex: Sex;
}): number {
  const { ageYears, creatinineMgPerDl, sex } = patient;
  requireWithin("ageYears", ageYears, "a", CKD_EPI_FROM_YEARS, 130);
  requireWithin("creatinineMgPerDl", creatinineMgPerDl, "mg/dL", 0.005, 200);
  const ratio = creatinineMgPerDl / KAPPA[sex];
  const rate = 142 * Math.min(ratio, 1) ** ALPHA[sex] * Math.max(ratio, 1) ** -1.2 * 0.9938 ** ageYears;
  return sex === "female" ? rate * FEMALE_FACTOR : rate;
}
