import type { Quantity } from "../units/index.ts";

/**
 * umol/L in one mg/dL of creatinine, as laboratories round it (molar mass 113.12 g/mol gives 88.40).
 * Source: the usual factor, common practice; the one in the checks of docs/methods/patient-size-and-kidney.md.
 */
export const CREATININE_UMOL_PER_L_PER_MG_PER_DL = 88.4;

/** A serum creatinine in mg/dL. Only mg/dL and umol/L are taken. Example: 160 umol/L is 1.810 mg/dL. */
export function creatinineMgPerDl(creatinine: Quantity<"mg/dL" | "umol/L">): number {
  return creatinine.unit === "mg/dL" ? creatinine.value : creatinine.value / CREATININE_UMOL_PER_L_PER_MG_PER_DL;
}
