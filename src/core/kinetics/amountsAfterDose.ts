import { decay, decayDifference, passedTwoSteps } from "../numerics/index.ts";
import { argumentFinite, argumentNotNegative } from "./argumentCheck.ts";
import { type OralKinetics, oralKineticsCheck } from "./oralKinetics.ts";

/**
 * Where a dose is, t hours after it was taken.
 *
 * Formula, with u = t − lag: gut = F·D·e^(−ka·u); body = F·D·ka·φ(u), φ(u) = (e^(−ke·u) − e^(−ka·u))/(ka − ke);
 * eliminated = ke·∫₀ᵘ body. Each has its own form without cancellation; their sum is F·D.
 * @param kinetics see OralKinetics
 * @param amount mg, 0 or more
 * @param t h since the dose was taken, any finite number
 * @returns mg in the gut (bioavailable part, open to absorption), in the body, and eliminated
 * Outside: all three are 0 while u < 0 (before the dose and during the lag). Bad arguments throw RangeError.
 * Accuracy: relative 1e-15·(1 + K·u), K = max(ka, ke) (tests/core/kinetics/gridSingleDose.test.ts).
 * Source: standard result, derived in docs/methods/one-compartment-oral.md.
 * @example amountsAfterDose({ ka: 1, ke: 0.2, volume: 30, bioavailability: 1, lag: 0 }, 100, 1)
 * // { gut: 36.79, body: 56.36, eliminated: 6.85 } (rounded)
 */
export function amountsAfterDose(
  kinetics: OralKinetics,
  amount: number,
  t: number,
): { gut: number; body: number; eliminated: number } {
  oralKineticsCheck(kinetics);
  argumentNotNegative("amount", amount, "mg");
  argumentFinite("t", t, "h");
  const { ka, ke, bioavailability, lag } = kinetics;
  const u = t - lag;
  const available = bioavailability * amount;
  if (u < 0 || available === 0) return { gut: 0, body: 0, eliminated: 0 };
  return {
    gut: available * decay(ka, u),
    body: available * (ka * decayDifference(ka, ke, u)),
    eliminated: available * passedTwoSteps(ka, ke, u),
  };
}
