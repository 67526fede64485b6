import { argumentRefuse } from "../argumentCheck.ts";
import { type PatternSteadyState, patternSteadyState } from "../patternSteadyState.ts";
import type { ModelInput } from "./absorption.ts";
import { modelExposure } from "./modelExposure.ts";
import type { ModelDisposition } from "./modelHistory.ts";
import { modelPlanCourses } from "./modelPlan.ts";
import { steadyPatternOf, steadyRun } from "./modelSteadyRun.ts";
import { StretchTally } from "./stretchTally.ts";

export type ModelSteadyState =
  | ({ readonly status: "settled" } & PatternSteadyState)
  /** More is taken than can ever be eliminated: the level rises without end. Both in mg/h. */
  | {
      readonly status: "none";
      readonly reason: "dose-rate-at-or-above-vmax";
      readonly doseRate: number;
      readonly vmax: number;
    };

/**
 * The readings of a pattern of doses that repeats for ever, of any kind of model.
 *
 * Formula: the amounts that one period gives back unchanged (linear kinds in closed form; saturable by Newton steps on the balance
 * of one period); readings stretch by stretch as in modelExposure. Linear kinds: auc = Σ F·D/CL.
 * Saturable: no steady state at a dose rate Σ F·D/period >= Vmax.
 * @param disposition see ModelDisposition
 * @param inputs see ModelInput; doses ascending, times within [0, period)
 * @param period h, above 0
 * @returns see PatternSteadyState, or why there is none
 * Outside: a pattern without any dose that is absorbed and other bad arguments throw RangeError.
 * Accuracy: levels 1e-12 of the peak for linear kinds, relative 1e-9 for saturable (tests/core/kinetics/model/modelSteadyState.test.ts).
 * Source: docs/methods.
 * @example modelSteadyState({ kind: "one-compartment", clearance: 3, volume: 30 }, [{ absorption: { kind: "zero-order", duration: 4 },
 *   bioavailability: 1, lag: 0, doses: [{ time: 0, amount: 300 }] }], 12) // { status: "settled", average: 8.33…, … }
 */
export function modelSteadyState(
  disposition: ModelDisposition,
  inputs: readonly ModelInput[],
  period: number,
): ModelSteadyState {
  const pattern = steadyPatternOf(disposition, inputs, period);
  const { kind, absorbed, parts } = pattern;
  if (!(absorbed > 0)) argumentRefuse("the sum of absorbed doses in the period", absorbed, "mg", "above 0");
  const doseRate = absorbed / period;
  const vmax = kind.capacity(disposition);
  if (doseRate >= vmax) return { status: "none", reason: "dose-rate-at-or-above-vmax", doseRate, vmax };

  const spans = [{ from: -Infinity, disposition }];
  const plain = modelPlanCourses({ parts, spans });
  if (plain !== undefined) {
    return { status: "settled", ...patternSteadyState(plain.disposition, plain.courses, period) };
  }
  const tally = new StretchTally();
  for (const seen of steadyRun(pattern).stretches) tally.add(seen);
  const { peak, lowest, area: auc } = tally;
  const average = auc / period;
  return {
    status: "settled",
    peak,
    timeOfPeak: tally.timeOfPeak % period,
    lowest,
    timeOfLowest: tally.timeOfLowest % period,
    average,
    auc,
    swing: peak > lowest ? (peak - lowest) / lowest : 0,
    fluctuation: peak > lowest ? (peak - lowest) / average : 0,
    accumulation: auc / modelExposure({ dispositions: spans, inputs }, 0, period).auc,
  };
}
