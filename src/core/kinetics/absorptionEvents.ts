import { sumError } from "../numerics/index.ts";
import { argumentRefuse } from "./argumentCheck.ts";
import type { Course } from "./course.ts";

/**
 * The instants at which absorption of a dose begins, of all courses in one order.
 * An instant is dose time + lag as an unrounded pair `at` + `rest`: rounding it would shift a dose by up to half a unit in the
 * last place of its time, which after hundreds of hours is far more than the accuracy stated for a level.
 */
export interface AbsorptionEvents {
  readonly count: number;
  /** h */
  readonly at: Float64Array;
  /** h, at most half a unit in the last place of `at`. */
  readonly rest: Float64Array;
  /** Index of the course. */
  readonly course: Int32Array;
  /** mg that will be absorbed (bioavailability × dose). */
  readonly amount: Float64Array;
}

/** From the event before to event `e`, h. */
export function absorptionEventsGap(events: AbsorptionEvents, e: number): number {
  return events.at[e]! - events.at[e - 1]! + (events.rest[e]! - events.rest[e - 1]!);
}

/** Merges the doses of all courses; O(doses × courses). */
export function absorptionEventsOf(courses: readonly Course[]): AbsorptionEvents {
  const count = courses.reduce((sum, course) => sum + course.doses.length, 0);
  const events = {
    count,
    at: new Float64Array(count),
    rest: new Float64Array(count),
    course: new Int32Array(count),
    amount: new Float64Array(count),
  };
  const next = new Int32Array(courses.length);
  for (let i = 0; i < count; i++) {
    const c = courses.length === 1 ? 0 : earliest(courses, next);
    const { bioavailability, lag, doses } = courses[c]!;
    const dose = doses[next[c]!]!;
    const at = dose.time + lag;
    events.at[i] = at;
    events.rest[i] = sumError(dose.time, lag, at);
    events.course[i] = c;
    events.amount[i] = bioavailability * dose.amount;
    next[c] = next[c]! + 1;
  }
  if (count > 0 && !(events.at[count - 1]! - events.at[0]! < Infinity)) {
    argumentRefuse("the time from the first dose to the last, lag included", Infinity, "h", "a finite number");
  }
  return events;
}

/** The course whose next dose begins to be absorbed first. */
function earliest(courses: readonly Course[], next: Int32Array): number {
  let first = -1;
  let firstAt = 0;
  let firstRest = 0;
  for (let c = 0; c < courses.length; c++) {
    const { lag, doses } = courses[c]!;
    const dose = doses[next[c]!];
    if (dose === undefined) continue;
    const at = dose.time + lag;
    const rest = sumError(dose.time, lag, at);
    if (first < 0 || at < firstAt || (at === firstAt && rest < firstRest)) {
      first = c;
      firstAt = at;
      firstRest = rest;
    }
  }
  return first;
}
