import type { FormulaSource } from "./formulaSource.ts";
import { requireWithin } from "./requireWithin.ts";

const FACTOR = 0.4;

export const adjustedWeightSource: FormulaSource = {
  formula: "adjusted weight = ideal + 0.4 × (actual − ideal)",
  citation:
    "Arch Dis Child Educ Pract, Table 2, Some size descriptors used for determining doses in obese patients (ideal + factor × (total − ideal)); factor 0.4: common practice",
  basis: "seen",
};

/**
 * Body weight between ideal and actual, for people heavier than ideal. Shown beside the clearance, never put into it silently.
 *
 * adjusted = ideal + 0.4 · (actual − ideal)
 *
 * @param weights.actualKg kg, 0.5 to 700
 * @param weights.idealKg kg, 0.5 to 700
 * @returns kg. Meant for actual above ideal; below, the same line is followed (a number between the two).
 *
 * Outside: throws RangeError. Accuracy: rounding only (relative error ≤ 1e-15).
 * Source: Arch Dis Child Educ Pract, Table 2 of size descriptors; the factor 0.4 is common practice.
 * Example: actual 120 kg, ideal 74.99 kg: 93.00 kg.
 */
export function adjustedWeight(weights: { readonly actualKg: number; readonly idealKg: number }): number {
  requireWithin("actualKg", weights.actualKg, "kg", 0.5, 700);
  requireWithin("idealKg", weights.idealKg, "kg", 0.5, 700);
  return weights.idealKg + FACTOR * (weights.actualKg - weights.idealKg);
}
