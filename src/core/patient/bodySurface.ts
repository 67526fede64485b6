import type { FormulaSource } from "./formulaSource.ts";
import { requireWithin } from "./requireWithin.ts";

interface Size {
  readonly weightKg: number;
  readonly heightCm: number;
}

export const bodySurfaceMostellerSource: FormulaSource = {
  formula: "surface = √(height in cm × weight in kg ÷ 3600)",
  citation:
    "Mosteller RD. Simplified calculation of body-surface area. N Engl J Med 1987;317:1098 (title from memory; formula read in Arch Dis Child Educ Pract, Table 2, Some size descriptors used for determining doses in obese patients)",
  basis: "seen",
};

export const bodySurfaceDuBoisSource: FormulaSource = {
  formula: "surface = 0.007184 × weight^0.425 × height^0.725, kg and cm",
  citation:
    "Du Bois D, Du Bois EF. A formula to estimate the approximate surface area if height and weight be known. Arch Intern Med 1916;17:863-871 (title and coefficients from memory, unverified)",
  basis: "memory",
};

/**
 * Body surface by Mosteller.
 *
 * surface = √(height · weight / 3600)
 *
 * @param size.weightKg kg, 0.5 to 700
 * @param size.heightCm cm, 30 to 275
 * @returns m²
 *
 * Outside: throws RangeError. Accuracy: rounding only (relative error ≤ 1e-15).
 * Source: Mosteller, N Engl J Med 1987;317:1098, as in the size table of Arch Dis Child Educ Pract.
 * Example: 80 kg, 180 cm: 2 m².
 */
export function bodySurfaceMosteller({ weightKg, heightCm }: Size): number {
  requireSize(weightKg, heightCm);
  return Math.sqrt((heightCm * weightKg) / 3600);
}

/**
 * Body surface by Du Bois and Du Bois.
 *
 * surface = 0.007184 · weight^0.425 · height^0.725
 *
 * @param size.weightKg kg, 0.5 to 700
 * @param size.heightCm cm, 30 to 275
 * @returns m²
 *
 * Outside: throws RangeError. Accuracy: rounding only (relative error ≤ 1e-14).
 * Source: Du Bois & Du Bois, Arch Intern Med 1916;17:863-871; coefficients from memory, unverified.
 * Example: 70 kg, 170 cm: 1.810 m².
 */
export function bodySurfaceDuBois({ weightKg, heightCm }: Size): number {
  requireSize(weightKg, heightCm);
  return 0.007184 * weightKg ** 0.425 * heightCm ** 0.725;
}

function requireSize(weightKg: number, heightCm: number): void {
  requireWithin("weightKg", weightKg, "kg", 0.5, 700);
  requireWithin("heightCm", heightCm, "cm", 30, 275);
}
