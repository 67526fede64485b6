import { CrossCheckRun } from "./crossCheckRun.ts";
import { modelTimes } from "./modelArgument.ts";
import type { ModelHistory } from "./modelHistory.ts";

/**
 * The levels once more, by another road: plain numerical integration of the model's differential equations.
 *
 * Formula: gut, body and area as one system, by Dormand–Prince steps with error control from one event or time to the next; no closed
 * form, no event list and no code of modelProfile.
 * @param history see ModelHistory
 * @param times h, ascending, finite
 * @returns mg/L at each time, as modelProfile
 * Outside: bad arguments throw RangeError; a history that would take more than a million steps throws Error.
 * Accuracy: 1e-8 of the largest level (tests/core/kinetics/model/crossCheck.test.ts).
 * Source: see DormandPrince.
 * @example crossCheck({ dispositions: [{ from: -Infinity, disposition: { kind: "one-compartment", clearance: 3, volume: 30 } }],
 *   inputs: [{ absorption: { kind: "zero-order", duration: 4 }, bioavailability: 1, lag: 0, doses: [{ time: 0, amount: 300 }] }] }, [4])
 * // Float64Array [8.241998849…]
 */
export function crossCheck(history: ModelHistory, times: ArrayLike<number>): Float64Array {
  const run = new CrossCheckRun(history);
  return modelTimes(times).map((time) => {
    run.goTo(time);
    return run.level;
  });
}
