import { sumError } from "../numerics/index.ts";
import type { AbsorptionEvents } from "./absorptionEvents.ts";
import { argumentInterval, argumentRefuse } from "./argumentCheck.ts";
import { BodyState } from "./bodyState.ts";
import { type Course, coursesCheck, type Disposition, dispositionCheck } from "./course.ts";

/** A repeating pattern at steady state: the state at the start of its period, and what happens within it. */
export interface Pattern {
  readonly events: AbsorptionEvents;
  /** mg in the body at the start of the period. */
  readonly body: number;
  /** mg in each gut at the start of the period. */
  readonly gut: Float64Array;
}

/** Where within the period absorption of each dose begins, in order. */
function eventsWithin(courses: readonly Course[], period: number): AbsorptionEvents {
  const list = courses.flatMap((course, index) =>
    course.doses.map((dose) => {
      const instant = dose.time + course.lag;
      const rest = sumError(dose.time, course.lag, instant);
      // `%` is exact. A rest that reaches back before the period belongs to its end.
      const wrapped = instant % period;
      const at = wrapped + rest < 0 ? wrapped + period : wrapped;
      return { at, rest, course: index, amount: course.bioavailability * dose.amount };
    }),
  );
  list.sort((a, b) => a.at - b.at || a.rest - b.rest);
  return {
    count: list.length,
    at: Float64Array.from(list, (event) => event.at),
    rest: Float64Array.from(list, (event) => event.rest),
    course: Int32Array.from(list, (event) => event.course),
    amount: Float64Array.from(list, (event) => event.amount),
  };
}

export function patternCheck(disposition: Disposition, courses: readonly Course[], period: number): void {
  dispositionCheck(disposition);
  coursesCheck(courses);
  argumentInterval("period", period, disposition.ke);
  for (const course of courses) argumentInterval("period", period, course.ka);
  for (const [index, course] of courses.entries()) {
    for (const [i, dose] of course.doses.entries()) {
      if (!(dose.time >= 0 && dose.time < period)) {
        argumentRefuse(`courses[${index}].doses[${i}].time`, dose.time, "h", `0 to below the period, ${period} h`);
      }
      if (dose.time + course.lag === Infinity) {
        argumentRefuse(`courses[${index}].lag`, course.lag, "h", "a finite time after the dose");
      }
    }
  }
}

/**
 * The steady state of a pattern of doses that repeats for ever.
 *
 * Formula: with (g, b) what one period's doses leave at its end when it starts empty, the gut starts at G = g/(1 − e^(−ka·P)) and
 * the body at (b + Σ G·ka·φ(P))/(1 − e^(−ke·P)). Every term is positive. A lag moves a dose within the period, past its end to
 * its start, as often as needed.
 * Arguments as in patternSteadyState, already checked.
 */
export function patternAtSteadyState(disposition: Disposition, courses: readonly Course[], period: number): Pattern {
  const events = eventsWithin(courses, period);
  const rates = courses.map((course) => course.ka);
  const state = new BodyState(disposition.ke, rates);
  patternSweep(state, events, period, () => {});
  const gut = state.gut.map((amount, i) => amount / -Math.expm1(-rates[i]! * period));
  const fromOnePeriod = state.body;
  state.set(0, gut);
  state.advance(period);
  const body = (fromOnePeriod + state.body) / -Math.expm1(-disposition.ke * period);
  // What the sweep may meet at most: all that is there and all that is given.
  const most = [...gut, ...events.amount].reduce((sum, amount) => sum + amount, body);
  if (!(most < Infinity)) {
    argumentRefuse("the steady state of courses", Infinity, "mg", "doses small enough for a finite amount");
  }
  return { events, body, gut };
}

/** Carries the state from the start of the period to its end, showing each stretch without a dose on the way. */
export function patternSweep(
  state: BodyState,
  events: AbsorptionEvents,
  period: number,
  visit: (at: number, rest: number, nextAt: number, nextRest: number) => void,
): void {
  let at = 0;
  let rest = 0;
  for (let e = 0; e <= events.count; e++) {
    const isEnd = e === events.count;
    const nextAt = isEnd ? period : events.at[e]!;
    const nextRest = isEnd ? 0 : events.rest[e]!;
    visit(at, rest, nextAt, nextRest);
    state.advance(nextAt - at + (nextRest - rest));
    if (isEnd) break;
    state.give(events.course[e]!, events.amount[e]!);
    at = nextAt;
    rest = nextRest;
  }
}
