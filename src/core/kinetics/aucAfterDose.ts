import { passedTwoSteps } from "../numerics/index.ts";
import { argumentNotNegative, argumentRefuse } from "./argumentCheck.ts";
import { type OralKinetics, oralKineticsCheck } from "./oralKinetics.ts";

/**
 * The area under the level from a single dose to t hours after it.
 *
 * Formula: F·D/(ke·V) · the part eliminated by then (passedTwoSteps), which is 1 for t = Infinity.
 * @param kinetics see OralKinetics
 * @param amount mg, 0 or more
 * @param t h since the dose was taken, any number; Infinity (the default) for the whole area
 * @returns mg·h/L
 * Outside: 0 for t <= lag. Bad arguments throw RangeError.
 * Accuracy: relative 1e-15·(1 + K·(t − lag)), K = max(ka, ke) (tests/core/kinetics/gridSingleDose.test.ts).
 * Source: standard result, derived in docs/methods/one-compartment-oral.md.
 * @example aucAfterDose({ ka: 1, ke: 0.15, volume: 30, bioavailability: 0.9, lag: 0 }, 600) // 120
 */
export function aucAfterDose(kinetics: OralKinetics, amount: number, t = Infinity): number {
  oralKineticsCheck(kinetics);
  argumentNotNegative("amount", amount, "mg");
  if (Number.isNaN(t) || t === -Infinity) argumentRefuse("t", t, "h", "any finite number, or Infinity");
  const { ka, ke, volume, bioavailability, lag } = kinetics;
  const available = bioavailability * amount;
  const u = t - lag;
  if (!(u > 0) || available === 0) return 0;
  return (available * passedTwoSteps(ka, ke, u)) / ke / volume;
}
