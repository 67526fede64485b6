import { absorptionEventsGap, absorptionEventsOf } from "./absorptionEvents.ts";
import { argumentFinite, argumentRefuse } from "./argumentCheck.ts";
import { BodyState } from "./bodyState.ts";
import { type Course, coursesCheck, type Disposition, dispositionCheck } from "./course.ts";

/** Checks that times are finite and in ascending order, and gives them as a typed array. */
export function timesCheck(times: ArrayLike<number>): Float64Array {
  const checked = times instanceof Float64Array ? times : Float64Array.from(times);
  let before = -Infinity;
  for (let i = 0; i < checked.length; i++) {
    const time = checked[i]!;
    // One comparison a time: NaN fails it, and an infinite time can only be the first or the last.
    if (!(time >= before)) {
      argumentFinite(`times[${i}]`, time, "h");
      argumentRefuse(`times[${i}]`, time, "h", `not before the time before it, ${before} h`);
    }
    before = time;
  }
  if (checked.length > 0) {
    argumentFinite("times[0]", checked[0]!, "h");
    argumentFinite(`times[${checked.length - 1}]`, before, "h");
  }
  return checked;
}

/**
 * The levels from any history of doses of any number of products of one medicine.
 *
 * Formula: one sweep over the instants at which absorption of a dose begins, the state carried exactly from one to the next
 * (see BodyState); each level from the state at the instant before it. O(doses + times).
 * @param disposition see Disposition
 * @param courses see Course; each has its own gut
 * @param times h, ascending (equal ones allowed), finite
 * @returns mg/L at each time; 0 before the first dose; at the very instant of a dose the level just before it
 * Outside: bad arguments throw RangeError.
 * Accuracy: 5e-15 of the largest level (tests/core/kinetics/historyProfile.test.ts).
 * Source: standard result, derived in docs/methods/one-compartment-oral.md.
 * @example historyProfile({ ke: 0.15, volume: 30 }, [{ ka: 1, bioavailability: 0.9, lag: 0, doses: [{ time: 0, amount: 600 }] }], [6])
 * // Float64Array [8.557219219000931]
 */
export function historyProfile(
  disposition: Disposition,
  courses: readonly Course[],
  times: ArrayLike<number>,
): Float64Array {
  dispositionCheck(disposition);
  coursesCheck(courses);
  const at = timesCheck(times);
  const levels = new Float64Array(at.length);
  const events = absorptionEventsOf(courses);
  if (events.count === 0 || at.length === 0) return levels;

  const span = at[at.length - 1]! - events.at[0]!;
  if (span === Infinity)
    argumentRefuse("the time from the first dose to the last of times", span, "h", "a finite number");

  const state = new BodyState(
    disposition.ke,
    courses.map((course) => course.ka),
  );
  let i = 0;
  // Before the first event every level stays 0.
  while (i < at.length && !(at[i]! - events.at[0]! - events.rest[0]! > 0)) i++;
  for (let e = 0; e < events.count && i < at.length; e++) {
    if (e > 0) state.advance(absorptionEventsGap(events, e));
    state.give(events.course[e]!, events.amount[e]!);
    const isLast = e + 1 === events.count;
    const until = isLast ? Infinity : events.at[e + 1]!;
    const untilRest = isLast ? 0 : events.rest[e + 1]!;
    i = state.levelsInto(levels, at, i, events.at[e]!, events.rest[e]!, until, untilRest, disposition.volume);
  }
  return levels;
}
