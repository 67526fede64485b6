import { courseOf } from "./course.ts";
import { historyProfile } from "./historyProfile.ts";
import { type Dose, type OralKinetics, oralKineticsCheck } from "./oralKinetics.ts";

/**
 * The levels from any history of doses of one product.
 *
 * Formula: see historyProfile.
 * @param kinetics see OralKinetics
 * @param doses ascending in time; doses at one time add
 * @param times h, ascending (equal ones allowed), finite
 * @returns mg/L at each time; 0 before the first dose; at the very instant of a dose the level just before it
 * Outside: bad arguments throw RangeError.
 * Accuracy: 5e-15 of the largest level (tests/core/kinetics/historyProfile.test.ts).
 * Source: standard result, derived in docs/methods/one-compartment-oral.md.
 * @example profile({ ka: 1, ke: 0.15, volume: 30, bioavailability: 0.9, lag: 0 }, [{ time: 0, amount: 600 }], [6])
 * // Float64Array [8.557219219000931]
 */
export function profile(kinetics: OralKinetics, doses: readonly Dose[], times: ArrayLike<number>): Float64Array {
  oralKineticsCheck(kinetics);
  const [disposition, courses] = courseOf(kinetics, doses);
  return historyProfile(disposition, courses, times);
}
