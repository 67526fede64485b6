import type { FormulaSource } from "./formulaSource.ts";
import { requireWithin } from "./requireWithin.ts";

export const bodyMassIndexSource: FormulaSource = {
  formula: "BMI = weight ÷ (height in metres)²",
  citation: "Definition: weight in kilograms divided by the square of the height in metres",
  basis: "common practice",
};

/**
 * Body mass index.
 *
 * BMI = weight / (height / 100)²
 *
 * @param patient.weightKg kg, 0.5 to 700
 * @param patient.heightCm cm, 30 to 275
 * @returns kg/m²
 *
 * Outside: throws RangeError. Accuracy: rounding only (relative error ≤ 1e-15). Source: definition.
 * Example: 72 kg, 180 cm: 22.22 kg/m².
 */
export function bodyMassIndex(patient: { readonly weightKg: number; readonly heightCm: number }): number {
  requireWithin("weightKg", patient.weightKg, "kg", 0.5, 700);
  requireWithin("heightCm", patient.heightCm, "cm", 30, 275);
  return (patient.weightKg * 10_000) / (patient.heightCm * patient.heightCm);
}
