import type { FormulaSource, Sex } from "./formulaSource.ts";
import { requireWithin } from "./requireWithin.ts";

const BASE_KG: Readonly<Record<Sex, number>> = { male: 50, female: 45.5 };
const KG_PER_INCH = 2.3;
const FORMULA_FROM_INCHES = 60;
const CM_PER_INCH = 2.54;

/** cm. Further down the line runs into weights that no body has (0 kg at 97 cm for a man), so nothing is returned. */
export const IDEAL_WEIGHT_LOWEST_CM = 120;
const IDEAL_WEIGHT_HIGHEST_CM = 275;

export const idealWeightDevineSource: FormulaSource = {
  formula: "ideal weight = 50 (man) or 45.5 (woman) + 2.3 × (height in inches − 60)",
  citation:
    "Devine BJ. Gentamicin therapy. Drug Intell Clin Pharm 1974;8:650-655 (citation from memory; formula read in D. W. A. Bourne, PHAR 7632/7633 course notes, University of Oklahoma, ch. 27, after Murphy 2001)",
  basis: "seen",
};

export interface IdealWeight {
  readonly weightKg: number;
  /** The height is below 60 in (152.4 cm), where the line was not made; the number is its continuation, not clamped. */
  readonly belowFormulaRange: boolean;
}

/**
 * Ideal body weight by Devine.
 *
 * weight = 50 (man) or 45.5 (woman) + 2.3 · (height / 2.54 − 60)
 *
 * @param patient.heightCm cm, 120 to 275
 * @returns kg, and whether the height lies below the 60 inches the formula starts from: there the line is continued and flagged, not clamped
 *
 * Outside: throws RangeError (see IDEAL_WEIGHT_LOWEST_CM). Accuracy: rounding only (relative error ≤ 1e-14).
 * Source: Devine, Drug Intell Clin Pharm 1974;8:650-655 (from memory); formula as in Bourne's course notes, ch. 27, after Murphy 2001.
 * Example: woman, 165 cm: 56.91 kg; woman, 150 cm: 43.33 kg, flagged.
 */
export function idealWeightDevine(patient: { readonly heightCm: number; readonly sex: Sex }): IdealWeight {
  requireWithin("heightCm", patient.heightCm, "cm", IDEAL_WEIGHT_LOWEST_CM, IDEAL_WEIGHT_HIGHEST_CM);
  const inches = patient.heightCm / CM_PER_INCH;
  return {
    weightKg: BASE_KG[patient.sex] + KG_PER_INCH * (inches - FORMULA_FROM_INCHES),
    // Compared in cm: 152.4 / 2.54 is not 60 in double arithmetic on every path.
    belowFormulaRange: patient.heightCm < FORMULA_FROM_INCHES * CM_PER_INCH,
  };
}
