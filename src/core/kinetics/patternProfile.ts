import { BodyState } from "./bodyState.ts";
import type { Course, Disposition } from "./course.ts";
import { timesCheck } from "./historyProfile.ts";
import { patternAtSteadyState, patternCheck, patternSweep } from "./pattern.ts";

/**
 * The levels of a pattern of doses that repeats for ever.
 *
 * Formula: steady state as in patternAtSteadyState, then one sweep through each period that holds a time.
 * @param disposition see Disposition
 * @param courses see Course; doses ascending, times within [0, period)
 * @param period h, above 0
 * @param times h from the start of a period, ascending, finite; may span several periods and be negative
 * @returns mg/L at each time; at the very instant of a dose the level just before it
 * Outside: bad arguments throw RangeError. A pattern without doses gives 0.
 * Accuracy: 5e-15 of the peak (tests/core/kinetics/patternSteadyState.test.ts).
 * Source: standard result, derived in docs/methods/one-compartment-oral.md.
 * @example patternProfile({ ke: Math.LN2 / 6, volume: 30 }, [{ ka: 1, bioavailability: 1, lag: 0,
 *   doses: [{ time: 0, amount: 624 }] }], 12, [0]) // Float64Array [7.838776505201096]
 */
export function patternProfile(
  disposition: Disposition,
  courses: readonly Course[],
  period: number,
  times: ArrayLike<number>,
): Float64Array {
  patternCheck(disposition, courses, period);
  const sorted = timesCheck(times);
  // `%` is exact; only a negative remainder is rounded when moved into the period.
  const phases = sorted.map((time) => (time % period < 0 ? (time % period) + period : time % period));
  const levels = new Float64Array(sorted.length);
  const pattern = patternAtSteadyState(disposition, courses, period);
  const state = new BodyState(
    disposition.ke,
    courses.map((course) => course.ka),
  );
  let done = 0;
  while (done < phases.length) {
    // One period's share of the times: as far as the phases ascend and the times stay within one period.
    let end = done + 1;
    while (end < phases.length && phases[end]! >= phases[end - 1]! && sorted[end]! - sorted[done]! <= period) end++;
    const share = phases.subarray(done, end);
    const out = levels.subarray(done, end);
    let i = 0;
    state.set(pattern.body, pattern.gut);
    patternSweep(state, pattern.events, period, (at, rest, nextAt, nextRest) => {
      i = state.levelsInto(out, share, i, at, rest, nextAt, nextRest, disposition.volume);
    });
    done = end;
  }
  return levels;
}
