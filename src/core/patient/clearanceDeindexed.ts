import type { FormulaSource } from "./formulaSource.ts";
import { requireWithin } from "./requireWithin.ts";

/** m²: the body surface an indexed rate stands for. */
export const STANDARD_SURFACE_M2 = 1.73;

export const clearanceDeindexedSource: FormulaSource = {
  formula: "rate of this patient = rate per 1.73 m² × body surface ÷ 1.73",
  citation: "Definition: the rate per 1.73 m² is the rate divided by the body surface, times 1.73",
  basis: "common practice",
};

/**
 * The filtration rate of this patient, from one stated per 1.73 m² of body surface.
 *
 * rate = indexed · surface / 1.73
 *
 * @param estimate.perSurface mL/min per 1.73 m², 0 to 30,000 (what the equations give at the lowest creatinine taken)
 * @param estimate.bodySurfaceM2 m², 0.05 to 6
 * @returns mL/min, comparable with a Cockcroft–Gault clearance
 *
 * Outside: throws RangeError. Accuracy: rounding only (relative error ≤ 1e-15). Source: definition.
 * Example: 95.21 per 1.73 m² at 2.0 m²: 110.07 mL/min.
 */
export function clearanceDeindexed(estimate: { readonly perSurface: number; readonly bodySurfaceM2: number }): number {
  requireWithin("perSurface", estimate.perSurface, "mL/min/{1.73_m2}", 0, 30_000);
  requireWithin("bodySurfaceM2", estimate.bodySurfaceM2, "m2", 0.05, 6);
  return (estimate.perSurface * estimate.bodySurfaceM2) / STANDARD_SURFACE_M2;
}
