import { historyProfile } from "../historyProfile.ts";
import { modelTimes } from "./modelArgument.ts";
import type { ModelHistory } from "./modelHistory.ts";
import { modelPlanCourses, modelPlanOf, modelPlanRun } from "./modelPlan.ts";

/**
 * The levels under any history of any kind of model.
 *
 * Formula: the state is carried exactly from event to event (a dose begins to be absorbed, a zero-order input begins or ends, the
 * disposition changes); each level from the state at the event before it. O(doses + times). See the kind's page in docs/methods.
 * @param history see ModelHistory
 * @param times h, ascending (equal ones allowed), finite
 * @returns mg/L in the central compartment at each time; 0 before the first dose; at the very instant of an event the level just
 * before it
 * Outside: bad arguments, and dispositions of different kinds, throw RangeError.
 * Accuracy: linear kinds 1e-12 of the largest level, saturable 1e-8 (tests/outside/odePublic.test.ts); one compartment with
 * first-order absorption and no change is historyProfile itself.
 * Source: docs/methods.
 * @example modelProfile({ dispositions: [{ from: -Infinity, disposition: { kind: "one-compartment", clearance: 3, volume: 30 } }],
 *   inputs: [{ absorption: { kind: "zero-order", duration: 4 }, bioavailability: 1, lag: 0, doses: [{ time: 0, amount: 300 }] }] }, [4])
 * // Float64Array [8.24199884910…] = 300/(4·3)·(1 − e^(−0.4))
 */
export function modelProfile(history: ModelHistory, times: ArrayLike<number>): Float64Array {
  const plan = modelPlanOf(history);
  const plain = modelPlanCourses(plan);
  if (plain !== undefined) return historyProfile(plain.disposition, plain.courses, times);
  const at = modelTimes(times);
  const levels = new Float64Array(at.length);
  const first = plan.events[0];
  if (first === undefined || at.length === 0) return levels;
  let i = 0;
  // Before the first event every level stays 0.
  while (i < at.length && !(at[i]! - first.at - first.rest > 0)) i++;
  if (i === at.length) return levels;
  const end = { at: at[at.length - 1]!, rest: 0 };
  modelPlanRun(plan, first.at).go({ at: first.at, rest: 0 }, end, ({ stretch, at: from, rest, nextAt, nextRest }) => {
    for (; i < at.length; i++) {
      const time = at[i]!;
      if (time >= nextAt && time - nextAt - nextRest > 0) break;
      levels[i] = stretch.levelAt(time - from - rest);
    }
  });
  return levels;
}
