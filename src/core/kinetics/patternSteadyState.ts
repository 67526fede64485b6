import { CompensatedSum, passedTwoSteps } from "../numerics/index.ts";
import { argumentRefuse } from "./argumentCheck.ts";
import { BodyState } from "./bodyState.ts";
import type { Course, Disposition } from "./course.ts";
import { patternAtSteadyState, patternCheck, patternSweep } from "./pattern.ts";
import { SegmentTally } from "./segmentTally.ts";

export interface PatternSteadyState {
  /** mg/L */
  peak: number;
  /** h from the start of the period, in [0, period). */
  timeOfPeak: number;
  /** mg/L; not always just before a dose. */
  lowest: number;
  /** h from the start of the period, in [0, period). */
  timeOfLowest: number;
  /** mg/L */
  average: number;
  /** Over one period, mg·h/L. */
  auc: number;
  /** (peak − lowest)/lowest */
  swing: number;
  /** (peak − lowest)/average */
  fluctuation: number;
  /** AUC over one period at steady state / AUC over the first period. */
  accumulation: number;
}

/**
 * The readings of a pattern of doses (unequal amounts at unequal times, of any number of products) that repeats for ever.
 *
 * Formula: steady state as in patternAtSteadyState; readings segment by segment as in historyExposure;
 * auc = Σ F·D/(ke·V); average = auc/period; accumulation = auc/Σ AUC of each dose from its time to the end of the first period.
 * @param disposition see Disposition
 * @param courses see Course; doses ascending, times within [0, period)
 * @param period h, above 0
 * @returns see PatternSteadyState
 * Outside: lags that leave the first period empty give an accumulation of Infinity, a lowest level below the smallest double a
 * swing of Infinity. A pattern without any dose that is absorbed and other bad arguments throw RangeError.
 * Accuracy: 5e-15 of the peak for levels (tests/core/kinetics/patternSteadyState.test.ts).
 * Source: standard result, derived in docs/methods/one-compartment-oral.md.
 * @example patternSteadyState({ ke: 0.1, volume: 30 }, [{ ka: 1, bioavailability: 1, lag: 0,
 *   doses: [{ time: 8, amount: 200 }, { time: 22, amount: 300 }] }], 24).average // 6.944444444444445
 */
export function patternSteadyState(
  disposition: Disposition,
  courses: readonly Course[],
  period: number,
): PatternSteadyState {
  patternCheck(disposition, courses, period);
  const { ke, volume } = disposition;
  const total = new CompensatedSum();
  const first = new CompensatedSum();
  for (const { ka, bioavailability, lag, doses } of courses) {
    for (const { time, amount } of doses) {
      const available = bioavailability * amount;
      total.add(available);
      const open = period - time - lag;
      if (open > 0 && available > 0) first.add(available * passedTwoSteps(ka, ke, open));
    }
  }
  const absorbed = total.value;
  if (!(absorbed > 0)) argumentRefuse("the sum of absorbed doses in the period", absorbed, "mg", "above 0");

  const pattern = patternAtSteadyState(disposition, courses, period);
  const state = new BodyState(
    ke,
    courses.map((course) => course.ka),
  );
  state.set(pattern.body, pattern.gut);
  const tally = new SegmentTally();
  patternSweep(state, pattern.events, period, (at, rest, nextAt, nextRest) => {
    const length = nextAt - at + (nextRest - rest);
    if (length > 0) tally.segment(state, at, rest, length);
  });

  const { peak: peakMg, lowest: lowestMg } = tally;
  const swingMg = peakMg - lowestMg;
  const auc = absorbed / ke / volume;
  return {
    peak: peakMg / volume,
    timeOfPeak: tally.timeOfPeak % period,
    lowest: lowestMg / volume,
    timeOfLowest: tally.timeOfLowest % period,
    average: auc / period,
    auc,
    swing: swingMg === 0 ? 0 : swingMg / lowestMg,
    fluctuation: (swingMg / absorbed) * (ke * period),
    accumulation: absorbed / first.value,
  };
}
