import type { FormulaSource } from "./formulaSource.ts";
import { requireWithin } from "./requireWithin.ts";

export const clearanceWeightSource: FormulaSource = {
  formula: "ideal weight, unless the actual weight is lower",
  citation: "D. W. A. Bourne, PHAR 7632/7633 course notes, University of Oklahoma, ch. 27, after Murphy 2001",
  basis: "seen",
};

export interface ClearanceWeight {
  readonly weightKg: number;
  readonly kind: "actual" | "ideal";
}

/**
 * The weight that goes into the Cockcroft–Gault clearance: the ideal weight, unless the actual weight is lower.
 * Without an ideal weight (height or sex unknown, or too short for the formula) the actual weight.
 *
 * @param weights.actualKg kg, 0.5 to 700
 * @param weights.idealKg kg, 0.5 to 700, or null
 * @returns kg, and which of the two it is
 *
 * Outside: throws RangeError. Source: Bourne's course notes, ch. 27, after Murphy 2001.
 * Example: actual 95 kg, ideal 56.91 kg: 56.91 kg, ideal; actual 50 kg: 50 kg, actual.
 */
export function clearanceWeight(weights: {
  readonly actualKg: number;
  readonly idealKg: number | null;
}): ClearanceWeight {
  const { actualKg, idealKg } = weights;
  requireWithin("actualKg", actualKg, "kg", 0.5, 700);
  if (idealKg === null) return { weightKg: actualKg, kind: "actual" };
  requireWithin("idealKg", idealKg, "kg", 0.5, 700);
  return actualKg < idealKg ? { weightKg: actualKg, kind: "actual" } : { weightKg: idealKg, kind: "ideal" };
}
