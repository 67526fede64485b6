import { type OralKinetics, oralKineticsCheck } from "./oralKinetics.ts";

/** The formula alone, without the lag; for callers that have checked their arguments. h. */
export function timeOfPeakAfterLag(ka: number, ke: number): number {
  const slow = Math.min(ka, ke);
  const gap = Math.max(ka, ke) - slow;
  // A gap so small against the rate leaves log1p(x)/x at 1.
  if (gap / slow < Number.EPSILON / 4) return 1 / slow;
  return Math.log1p(gap / slow) / gap;
}

/**
 * When the level after one dose is highest.
 *
 * Formula: lag + ln(1 + Δ/k)/Δ, k = min(ka, ke), Δ = |ka − ke|; lag + 1/k when Δ = 0.
 * @param kinetics see OralKinetics
 * @returns h after the dose was taken, lag included
 * Outside: bad arguments throw RangeError.
 * Accuracy: relative 5e-16 (tests/core/kinetics/gridSingleDose.test.ts).
 * Source: standard result, derived in docs/methods/one-compartment-oral.md.
 * @example timeOfPeak({ ka: 1, ke: 0.15, volume: 30, bioavailability: 0.9, lag: 0 }) // 2.231905864571625
 */
export function timeOfPeak(kinetics: OralKinetics): number {
  oralKineticsCheck(kinetics);
  return kinetics.lag + timeOfPeakAfterLag(kinetics.ka, kinetics.ke);
}
