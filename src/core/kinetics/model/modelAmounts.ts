import { modelTimes } from "./modelArgument.ts";
import type { ModelPart } from "./modelEvents.ts";
import type { ModelHistory } from "./modelHistory.ts";
import { modelPlanOf, modelPlanRun } from "./modelPlan.ts";
import type { ModelRun, RunStretch } from "./modelRun.ts";

/** Where the medicine is, mg at each time. Only what reaches the circulation is counted: F × dose. */
export interface ModelAmounts {
  /** Taken and not yet absorbed, whatever waits for its lag included. */
  readonly gut: Float64Array;
  /** In the central compartment. */
  readonly body: Float64Array;
  /** In the peripheral compartment; 0 in a model without one. */
  readonly peripheral: Float64Array;
  readonly eliminated: Float64Array;
}

/** Adds what is taken and still waits for its lag. */
function waitingAdd(gut: Float64Array, times: Float64Array, { share, lag, doses }: ModelPart): void {
  let taken = 0;
  let begun = 0;
  for (const [i, time] of times.entries()) {
    while (taken < doses.length && doses[taken]!.time < time) taken++;
    // The same comparison as the run's, so that no dose is counted twice or not at all.
    while (begun < taken && time - doses[begun]!.time - lag > 0) begun++;
    for (let d = begun; d < taken; d++) gut[i] = gut[i]! + share * doses[d]!.amount;
  }
}

/** mg not yet absorbed u h into the stretch, of doses whose lag is over. */
function gutAt({ inflow, length }: RunStretch, run: ModelRun, u: number): number {
  let amount = Math.max(0, run.zeroOrderLeft - inflow.rate * Math.min(u, length));
  for (const [i, ka] of inflow.ka.entries()) amount += inflow.gut[i]! * Math.exp(-ka * u);
  return amount;
}

/**
 * Where the medicine is under any history of any kind of model: gut, body, eliminated.
 *
 * Formula: gut and body as carried by modelProfile; eliminated = clearance × area under the level (saturable: the integral of
 * Vmax·C/(Km + C)), computed apart, so that the sum is a check and not a definition.
 * @param history see ModelHistory
 * @param times h, ascending, finite
 * @returns see ModelAmounts; the four add up to F × all doses taken before that time
 * Outside: bad arguments throw RangeError.
 * Accuracy: the sum to 1e-13 of all doses, saturable 1e-12 (tests/core/kinetics/model/modelAmounts.test.ts).
 * Source: docs/methods.
 * @example modelAmounts({ dispositions: [{ from: -Infinity, disposition: { kind: "one-compartment", clearance: 3, volume: 30 } }],
 *   inputs: [{ absorption: { kind: "zero-order", duration: 4 }, bioavailability: 1, lag: 0, doses: [{ time: 0, amount: 300 }] }] }, [1]).gut
 * // Float64Array [225]
 */
export function modelAmounts(history: ModelHistory, times: ArrayLike<number>): ModelAmounts {
  const plan = modelPlanOf(history);
  const at = modelTimes(times);
  const gut = new Float64Array(at.length);
  const body = new Float64Array(at.length);
  const peripheral = new Float64Array(at.length);
  const eliminated = new Float64Array(at.length);
  for (const part of plan.parts) waitingAdd(gut, at, part);
  const first = plan.events[0];
  if (first === undefined || at.length === 0) return { gut, body, peripheral, eliminated };
  let i = 0;
  while (i < at.length && !(at[i]! - first.at - first.rest > 0)) i++;
  if (i === at.length) return { gut, body, peripheral, eliminated };
  const start = { at: first.at, rest: 0 };
  modelPlanRun(plan, first.at, true).go(start, { at: at[at.length - 1]!, rest: 0 }, (seen, run) => {
    for (; i < at.length; i++) {
      const time = at[i]!;
      if (time >= seen.nextAt && time - seen.nextAt - seen.nextRest > 0) break;
      const u = time - seen.at - seen.rest;
      const amounts = seen.stretch.bodyAt(u);
      gut[i] = gut[i]! + gutAt(seen, run, u);
      body[i] = amounts[0]!;
      peripheral[i] = amounts[1] ?? 0;
      eliminated[i] = run.eliminated + seen.stretch.eliminatedTo(u);
    }
  });
  return { gut, body, peripheral, eliminated };
}
