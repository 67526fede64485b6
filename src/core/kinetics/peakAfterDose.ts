import { argumentNotNegative } from "./argumentCheck.ts";
import { concentrationAfterLag } from "./concentrationAfterDose.ts";
import { type OralKinetics, oralKineticsCheck } from "./oralKinetics.ts";
import { timeOfPeakAfterLag } from "./timeOfPeak.ts";

/**
 * The highest level after one dose.
 *
 * Formula: C at timeOfPeak.
 * @param kinetics see OralKinetics
 * @param amount mg, 0 or more
 * @returns mg/L
 * Outside: bad arguments throw RangeError.
 * Accuracy: relative 1e-15·(1 + K·tmax), K = max(ka, ke) (tests/core/kinetics/gridSingleDose.test.ts).
 * Source: standard result, derived in docs/methods/one-compartment-oral.md.
 * @example peakAfterDose({ ka: 1, ke: 0.15, volume: 30, bioavailability: 0.9, lag: 0 }, 600) // 12.878842881020658
 */
export function peakAfterDose(kinetics: OralKinetics, amount: number): number {
  oralKineticsCheck(kinetics);
  argumentNotNegative("amount", amount, "mg");
  return concentrationAfterLag(kinetics, amount, timeOfPeakAfterLag(kinetics.ka, kinetics.ke));
}
