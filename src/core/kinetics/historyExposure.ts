import { absorptionEventsGap, absorptionEventsOf } from "./absorptionEvents.ts";
import { argumentFinite, argumentNotNegative, argumentRefuse } from "./argumentCheck.ts";
import { BodyState } from "./bodyState.ts";
import { type Course, coursesCheck, type Disposition, dispositionCheck } from "./course.ts";
import type { LevelWindow } from "./exposureTally.ts";
import { SegmentTally } from "./segmentTally.ts";

export interface Exposure {
  /** mg/L */
  peak: number;
  /** h, the first time the peak is reached. */
  timeOfPeak: number;
  /** mg/L */
  lowest: number;
  /** h, the first time the lowest level is reached. */
  timeOfLowest: number;
  /** mg·h/L */
  auc: number;
  /** mg/L */
  average: number;
  /** h strictly below the window's low. */
  hoursBelow: number;
  /** h within the window, its edges included; all hours when no window was given. */
  hoursWithin: number;
  /** h strictly above the window's high. */
  hoursAbove: number;
}

function windowCheck(window: LevelWindow): void {
  argumentNotNegative("window.low", window.low, "mg/L");
  argumentNotNegative("window.high", window.high, "mg/L");
  if (window.low > window.high) {
    argumentRefuse("window.low", window.low, "mg/L", `at most window.high, ${window.high} mg/L`);
  }
}

/**
 * Exposure over [from, to] under any history of doses of any number of products of one medicine.
 *
 * Formula: segment by segment between the instants at which absorption of a dose begins: stationary point in closed form (one
 * product) or as a bracketed root, window edges as bracketed roots, area in closed form. No grid.
 * @param disposition see Disposition
 * @param courses see Course
 * @param from h
 * @param to h, after `from`
 * @param window mg/L, 0 <= low <= high; optional
 * @returns see Exposure; hoursBelow + hoursWithin + hoursAbove = to − from
 * Outside: bad arguments throw RangeError.
 * Accuracy: levels 5e-15 of the largest, AUC relative 5e-15, times of crossings as in crossingsAfterDose
 * (tests/core/kinetics/historyExposure.test.ts).
 * Source: standard result, derived in docs/methods/one-compartment-oral.md.
 * @example historyExposure({ ke: 0.15, volume: 30 }, [{ ka: 1, bioavailability: 0.9, lag: 0, doses: [{ time: 0, amount: 600 }] }], 0, 24).timeOfPeak
 * // 2.231905864571625
 */
export function historyExposure(
  disposition: Disposition,
  courses: readonly Course[],
  from: number,
  to: number,
  window?: LevelWindow,
): Exposure {
  dispositionCheck(disposition);
  coursesCheck(courses);
  argumentFinite("from", from, "h");
  argumentFinite("to", to, "h");
  if (!(to > from && to - from < Infinity)) argumentRefuse("to", to, "h", `after from, ${from} h, by a finite time`);
  if (window !== undefined) windowCheck(window);

  const events = absorptionEventsOf(courses);
  if (events.count > 0 && from - events.at[0]! === Infinity) {
    argumentRefuse("from", from, "h", "a finite time after the first dose");
  }
  const state = new BodyState(
    disposition.ke,
    courses.map((course) => course.ka),
  );
  let e = 0;
  while (e < events.count && !(events.at[e]! - from + events.rest[e]! > 0)) {
    if (e > 0) state.advance(absorptionEventsGap(events, e));
    state.give(events.course[e]!, events.amount[e]!);
    e++;
  }
  if (e > 0) state.advance(from - events.at[e - 1]! - events.rest[e - 1]!);

  const { volume } = disposition;
  const tally = new SegmentTally(window && { low: window.low * volume, high: window.high * volume });
  let at = from;
  let rest = 0;
  for (;;) {
    const isEnd = !(e < events.count && events.at[e]! - to + events.rest[e]! < 0);
    const nextAt = isEnd ? to : events.at[e]!;
    const nextRest = isEnd ? 0 : events.rest[e]!;
    const length = nextAt - at + (nextRest - rest);
    if (length > 0) tally.segment(state, at, rest, length);
    state.advance(length);
    if (isEnd) break;
    state.give(events.course[e]!, events.amount[e]!);
    at = nextAt;
    rest = nextRest;
    e++;
  }
  tally.level(state.body, to);

  // The tally is in mg and mg·h.
  const auc = tally.area / volume;
  return {
    peak: tally.peak / volume,
    timeOfPeak: tally.timeOfPeak,
    lowest: tally.lowest / volume,
    timeOfLowest: tally.timeOfLowest,
    auc,
    average: auc / (to - from),
    ...tally.hours(to - from),
  };
}
