import { decay, decayDifference, rootBracketed } from "../numerics/index.ts";
import { argumentNotNegative } from "./argumentCheck.ts";
import { concentrationAfterLag } from "./concentrationAfterDose.ts";
import { type OralKinetics, oralKineticsCheck } from "./oralKinetics.ts";
import { timeOfPeakAfterLag } from "./timeOfPeak.ts";

/**
 * When the level after one dose passes a given level: on the way up and on the way down.
 *
 * Formula: the two roots of C(t) = level, bracketed on either side of the peak and refined by safeguarded Newton steps
 * (on C going up, where C is concave; on ln C going down, where it is nearly straight).
 * @param kinetics see OralKinetics
 * @param amount mg, 0 or more
 * @param level mg/L, 0 or more
 * @returns h after the dose was taken, lag included: [up, down]; [peak] when level is exactly the peak; [] when the level is
 * never reached, and for level 0, which the curve leaves but never crosses
 * Outside: bad arguments throw RangeError.
 * Accuracy: 1e-12 h or 4 units in the last place of the time, whichever is larger, as far as the curve's slope allows: close
 * to the peak an error of 1e-16 in C moves the crossing by about its square root (tests/core/kinetics/gridSingleDose.test.ts).
 * Source: standard result, derived here.
 * @example crossingsAfterDose({ ka: 1, ke: 0.15, volume: 30, bioavailability: 0.9, lag: 0 }, 600, 10) // [0.9186668437332116, 4.897466849465542]
 */
export function crossingsAfterDose(kinetics: OralKinetics, amount: number, level: number): number[] {
  oralKineticsCheck(kinetics);
  argumentNotNegative("amount", amount, "mg");
  argumentNotNegative("level", level, "mg/L");
  const { ka, ke, volume, bioavailability, lag } = kinetics;
  const top = timeOfPeakAfterLag(ka, ke);
  const peak = concentrationAfterLag(kinetics, amount, top);
  if (level === 0 || level > peak) return [];
  if (level === peak) return [lag + top];

  const height = (u: number) => concentrationAfterLag(kinetics, amount, u);
  const scale = (bioavailability * amount * ka) / volume;
  const slope = (u: number) => scale * (decay(ka, u) - ke * decayDifference(ka, ke, u));

  const up = rootBracketed((u) => height(u) - level, slope, 0, top, 0, 0);

  let far = top;
  for (let stride = 1 / Math.min(ka, ke); height(far) >= level && far < Number.MAX_VALUE; stride *= 2) {
    far = Math.min(far + stride, Number.MAX_VALUE);
  }
  if (height(far) >= level) return [lag + up.root, Infinity];
  const down = rootBracketed(
    (u) => Math.log(height(u) / level),
    (u) => slope(u) / height(u),
    top,
    far,
    far,
    0,
  );
  if (!up.converged || !down.converged) throw new Error("crossingsAfterDose: the root search did not converge");
  return [lag + up.root, lag + down.root];
}
