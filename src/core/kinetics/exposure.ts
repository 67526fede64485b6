import { courseOf } from "./course.ts";
import type { LevelWindow } from "./exposureTally.ts";
import { type Exposure, historyExposure } from "./historyExposure.ts";
import { type Dose, type OralKinetics, oralKineticsCheck } from "./oralKinetics.ts";

/**
 * Exposure over [from, to] under any history of doses of one product.
 *
 * Formula: see historyExposure.
 * @param kinetics see OralKinetics
 * @param doses ascending in time; doses at one time add
 * @param from h
 * @param to h, after `from`
 * @param window mg/L, 0 <= low <= high; optional (without one all hours count as within)
 * @returns see Exposure
 * Outside: bad arguments throw RangeError.
 * Accuracy: levels 5e-15 of the largest, AUC relative 5e-15 (tests/core/kinetics/historyExposure.test.ts).
 * Source: standard result, derived in docs/methods/one-compartment-oral.md.
 * @example exposure({ ka: 1, ke: 0.15, volume: 30, bioavailability: 0.9, lag: 0 }, [{ time: 0, amount: 600 }], 0, 24).peak
 * // 12.878842881020658
 */
export function exposure(
  kinetics: OralKinetics,
  doses: readonly Dose[],
  from: number,
  to: number,
  window?: LevelWindow,
): Exposure {
  oralKineticsCheck(kinetics);
  const [disposition, courses] = courseOf(kinetics, doses);
  return historyExposure(disposition, courses, from, to, window);
}
