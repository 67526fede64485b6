import type { KineticsParameter } from "./kineticsParameter.ts";
import type { ModelHistory } from "./modelHistory.ts";
import { ModelSweep } from "./modelSweep.ts";

export interface ModelSensitivity {
  /** mg/L at each time. */
  readonly levels: Float64Array;
  /** ∂ level/∂ ln parameter, mg/L, one array a name. */
  readonly derivatives: readonly Float64Array[];
}

/**
 * The levels under a history and how they answer to each parameter.
 *
 * Formula: ∂C(t)/∂ ln p at η = 0 of modelScaled, the derivatives carried with the state from event to event: linear kinds in closed
 * form (a derivative by a rate repeats it in a chain of decays), saturable by the derived differential equation.
 * @param history see ModelHistory
 * @param times h, ascending (equal ones allowed), finite
 * @param names see KineticsParameter; each once
 * @returns see ModelSensitivity; 0 before the first dose; at the very instant of an event what holds just before it
 * Outside: bad arguments and names the kind has not throw RangeError.
 * Accuracy: levels and derivatives 1e-9 of the largest (tests/core/kinetics/model/modelSensitivity.test.ts).
 * Source: derived in docs/methods/levels-to-this-patient.md.
 * @example modelSensitivity({ dispositions: [{ from: -Infinity, disposition: { kind: "one-compartment", clearance: 3, volume: 30 } }],
 *   inputs: [{ absorption: { kind: "zero-order", duration: 4 }, bioavailability: 1, lag: 0, doses: [{ time: 0, amount: 300 }] }] }, [4],
 *   ["bioavailability"]).derivatives[0] // Float64Array [8.24199884910…], the level itself
 */
export function modelSensitivity(
  history: ModelHistory,
  times: ArrayLike<number>,
  names: readonly KineticsParameter[],
): ModelSensitivity {
  const sweep = new ModelSweep(history, names, times, true);
  sweep.run(names.map(() => 0));
  return { levels: sweep.levels, derivatives: sweep.derivatives };
}
