import { decayDifference } from "../numerics/index.ts";
import { argumentFinite, argumentNotNegative } from "./argumentCheck.ts";
import { type OralKinetics, oralKineticsCheck } from "./oralKinetics.ts";

/** The formula alone, u h after absorption began; for callers that have checked their arguments. mg/L. */
export function concentrationAfterLag(kinetics: OralKinetics, amount: number, u: number): number {
  if (!(u > 0)) return 0;
  const { ka, ke, volume, bioavailability } = kinetics;
  return (bioavailability * amount * (ka * decayDifference(ka, ke, u))) / volume;
}

/**
 * The level t hours after one dose.
 *
 * Formula: C(t) = F·D·ka/V · φ(t − lag), φ(u) = (e^(−ke·u) − e^(−ka·u))/(ka − ke), u·e^(−ka·u) when ka = ke.
 * @param kinetics see OralKinetics
 * @param amount mg, 0 or more
 * @param t h since the dose was taken, any finite number
 * @returns mg/L
 * Outside: 0 for t <= lag. Bad arguments throw RangeError.
 * Accuracy: relative 1e-15·(1 + K·(t − lag)), K = max(ka, ke), wherever the result is a normal double
 * (tests/core/kinetics/gridSingleDose.test.ts).
 * Source: standard result, derived in docs/methods/one-compartment-oral.md.
 * @example concentrationAfterDose({ ka: 1, ke: 0.15, volume: 30, bioavailability: 0.9, lag: 0 }, 600, 6) // 8.557219219000931
 */
export function concentrationAfterDose(kinetics: OralKinetics, amount: number, t: number): number {
  oralKineticsCheck(kinetics);
  argumentNotNegative("amount", amount, "mg");
  argumentFinite("t", t, "h");
  return concentrationAfterLag(kinetics, amount, t - kinetics.lag);
}
