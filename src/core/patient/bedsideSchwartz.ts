import type { FormulaSource } from "./formulaSource.ts";
import { requireWithin } from "./requireWithin.ts";

/** a: from the first birthday to the day before the eighteenth. */
export const SCHWARTZ_FROM_YEARS = 1;
export const SCHWARTZ_BELOW_YEARS = 18;
/** mL/min per 1.73 m², for a height in cm and a creatinine in mg/dL. */
const FACTOR = 0.413;

export const bedsideSchwartzSource: FormulaSource = {
  formula: "eGFR = 0.413 × height in cm ÷ creatinine in mg/dL",
  citation:
    "Schwartz GJ et al. New equations to estimate GFR in children with CKD. J Am Soc Nephrol 2009;20:629-637 (title from memory; formula read on the National Kidney Foundation's page)",
  basis: "seen",
};

/**
 * Glomerular filtration rate of a child by the bedside Schwartz equation, for a body surface of 1.73 m².
 *
 * eGFR = 0.413 · height / creatinine
 *
 * @param patient.ageYears a, from 1 to below 18
 * @param patient.heightCm cm, 30 to 275
 * @param patient.creatinineMgPerDl serum creatinine, mg/dL, 0.005 to 200
 * @returns mL/min per 1.73 m²: not a clearance of this patient until `clearanceDeindexed`
 *
 * Outside: throws RangeError. Accuracy: rounding only (relative error ≤ 1e-15); the estimate itself is far coarser.
 * Source: Schwartz et al., J Am Soc Nephrol 2009;20:629-637; formula as on the National Kidney Foundation's page.
 * Example: 110 cm, 0.5 mg/dL: 90.86.
 */
export function bedsideSchwartz(patient: {
  readonly ageYears: number;
  readonly heightCm: number;
  readonly creatinineMgPerDl: number;
}): number {
  const { ageYears, heightCm, creatinineMgPerDl } = patient;
  if (!(ageYears >= SCHWARTZ_FROM_YEARS && ageYears < SCHWARTZ_BELOW_YEARS)) {
    throw new RangeError(
      `ageYears: ${ageYears} a; allowed from ${SCHWARTZ_FROM_YEARS} to below ${SCHWARTZ_BELOW_YEARS} a`,
    );
  }
  requireWithin("heightCm", heightCm, "cm", 30, 275);
  requireWithin("creatinineMgPerDl", creatinineMgPerDl, "mg/dL", 0.005, 200);
  return (FACTOR * heightCm) / creatinineMgPerDl;
}
