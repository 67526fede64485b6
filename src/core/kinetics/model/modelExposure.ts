import { argumentNotNegative, argumentRefuse } from "../argumentCheck.ts";
import type { LevelWindow } from "../exposureTally.ts";
import { type Exposure, historyExposure } from "../historyExposure.ts";
import { modelTime } from "./modelArgument.ts";
import type { ModelHistory } from "./modelHistory.ts";
import { modelPlanCourses, modelPlanOf, modelPlanRun } from "./modelPlan.ts";
import { StretchTally } from "./stretchTally.ts";

/** Throws a RangeError for a stretch of time or a window out of range. */
export function exposureArgumentsCheck(from: number, to: number, window?: LevelWindow): void {
  modelTime("from", from);
  modelTime("to", to);
  if (!(to > from)) argumentRefuse("to", to, "h", `after from, ${from} h`);
  if (window === undefined) return;
  argumentNotNegative("window.low", window.low, "mg/L");
  argumentNotNegative("window.high", window.high, "mg/L");
  if (window.low > window.high) {
    argumentRefuse("window.low", window.low, "mg/L", `at most window.high, ${window.high} mg/L`);
  }
}

/**
 * Exposure over [from, to] under any history of any kind of model.
 *
 * Formula: stretch by stretch between events: every turn of the level and every crossing of the window's edges a bracketed root,
 * the area in closed form (saturable: the integral of the power series the level is computed from). No grid.
 * @param history see ModelHistory
 * @param from h
 * @param to h, after `from`
 * @param window mg/L, 0 <= low <= high; optional
 * @returns see Exposure; hoursBelow + hoursWithin + hoursAbove = to − from. Where the volume changes the level jumps; both sides
 * count for peak and lowest
 * Outside: bad arguments throw RangeError.
 * Accuracy: as modelProfile for levels; AUC relative 1e-12, saturable 1e-9 (tests/core/kinetics/model/modelExposure.test.ts).
 * Source: docs/methods.
 * @example modelExposure({ dispositions: [{ from: -Infinity, disposition: { kind: "one-compartment", clearance: 3, volume: 30 } }],
 *   inputs: [{ absorption: { kind: "zero-order", duration: 4 }, bioavailability: 1, lag: 0, doses: [{ time: 0, amount: 300 }] }] }, 0, 24).timeOfPeak // 4
 */
export function modelExposure(history: ModelHistory, from: number, to: number, window?: LevelWindow): Exposure {
  const plan = modelPlanOf(history);
  const plain = modelPlanCourses(plan);
  if (plain !== undefined) return historyExposure(plain.disposition, plain.courses, from, to, window);
  exposureArgumentsCheck(from, to, window);
  const tally = new StretchTally(window);
  const run = modelPlanRun(plan, from);
  // Should the volume change at this very instant, the level before it is one of the two.
  tally.level(run.level, from);
  run.go({ at: from, rest: 0 }, { at: to, rest: 0 }, (seen) => tally.add(seen));
  const { peak, timeOfPeak, lowest, timeOfLowest, area: auc } = tally;
  return { peak, timeOfPeak, lowest, timeOfLowest, auc, average: auc / (to - from), ...tally.hours(to - from) };
}
