import { argumentRefuse } from "../argumentCheck.ts";
import { patternProfile } from "../patternProfile.ts";
import type { ModelInput } from "./absorption.ts";
import { modelTimes } from "./modelArgument.ts";
import type { ModelDisposition } from "./modelHistory.ts";
import { modelPlanCourses } from "./modelPlan.ts";
import { steadyPatternOf, steadyRun } from "./modelSteadyRun.ts";

/**
 * The levels of a pattern of doses that repeats for ever, of any kind of model.
 *
 * Formula: steady state as in modelSteadyState, each time moved into the one period.
 * @param disposition see ModelDisposition
 * @param inputs see ModelInput; doses ascending, times within [0, period)
 * @param period h, above 0
 * @param times h from the start of a period, ascending, finite; may span several periods and be negative
 * @returns mg/L at each time; 0 for a pattern without doses
 * Outside: bad arguments, and a dose rate at which there is no steady state, throw RangeError.
 * Accuracy: as modelSteadyState.
 * Source: docs/methods.
 * @example modelSteadyProfile({ kind: "one-compartment", clearance: 3, volume: 30 }, [{ absorption: { kind: "zero-order", duration: 12 },
 *   bioavailability: 1, lag: 0, doses: [{ time: 0, amount: 360 }] }], 12, [5]) // Float64Array [10]
 */
export function modelSteadyProfile(
  disposition: ModelDisposition,
  inputs: readonly ModelInput[],
  period: number,
  times: ArrayLike<number>,
): Float64Array {
  const pattern = steadyPatternOf(disposition, inputs, period);
  const { kind, absorbed, parts } = pattern;
  const plain = modelPlanCourses({ parts, spans: [{ from: -Infinity, disposition }] });
  if (plain !== undefined) return patternProfile(plain.disposition, plain.courses, period, times);
  const sorted = modelTimes(times);
  const levels = new Float64Array(sorted.length);
  if (!(absorbed > 0)) return levels;
  const capacity = kind.capacity(disposition);
  if (absorbed / period >= capacity) {
    argumentRefuse(
      "the dose rate",
      absorbed / period,
      "mg/h",
      `below Vmax, ${capacity} mg/h: there is no steady state`,
    );
  }
  const { stretches } = steadyRun(pattern);
  let s = 0;
  for (const [i, time] of sorted.entries()) {
    // `%` is exact; only a negative remainder is rounded when moved into the period.
    const remainder = time % period;
    const phase = remainder < 0 ? remainder + period : remainder;
    if (phase - stretches[s]!.at - stretches[s]!.rest <= 0) s = 0;
    while (s + 1 < stretches.length && phase - stretches[s]!.nextAt - stretches[s]!.nextRest > 0) s++;
    const { stretch, at, rest } = stretches[s]!;
    levels[i] = stretch.levelAt(Math.max(0, phase - at - rest));
  }
  return levels;
}
