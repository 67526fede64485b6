import { argumentRefuse } from "../argumentCheck.ts";
import type { KineticsParameter } from "./kineticsParameter.ts";
import type { ModelHistory } from "./modelHistory.ts";
import { ModelSweep } from "./modelSweep.ts";

/**
 * The levels of many patients under one history: what bands are made of.
 *
 * Formula: modelProfile of modelScaled for each draw, the history made ready once.
 * @param history of the typical patient, see ModelHistory
 * @param names see KineticsParameter; each once
 * @param eta one array a name, an η a draw; all of one length
 * @param times h, ascending (equal ones allowed), finite
 * @returns one array a time: mg/L, a level a draw
 * Outside: bad arguments, names the kind has not, and a draw whose figures leave their range throw RangeError.
 * Accuracy: linear kinds 1e-9, saturable 1e-6 of the draw's largest level against modelProfile (tests/core/kinetics/model/modelSensitivity.test.ts).
 * Source: docs/methods/levels-to-this-patient.md.
 * @example modelLevelsOfDraws({ dispositions: [{ from: -Infinity, disposition: { kind: "one-compartment", clearance: 3, volume: 30 } }],
 *   inputs: [{ absorption: { kind: "zero-order", duration: 4 }, bioavailability: 1, lag: 0, doses: [{ time: 0, amount: 300 }] }] },
 *   ["bioavailability"], [Float64Array.of(0, Math.LN2)], [4])[0] // Float64Array [8.24…, 16.48…]
 */
export function modelLevelsOfDraws(
  history: ModelHistory,
  names: readonly KineticsParameter[],
  eta: readonly ArrayLike<number>[],
  times: ArrayLike<number>,
): Float64Array[] {
  if (eta.length !== names.length) argumentRefuse("eta.length", eta.length, "", `that of names, ${names.length}`);
  const draws = eta[0]?.length ?? 0;
  for (const [i, { length }] of eta.entries()) {
    if (length !== draws) argumentRefuse(`eta[${i}].length`, length, "", `that of eta[0], ${draws}`);
  }
  const sweep = new ModelSweep(history, names, times, false);
  const levels = Array.from({ length: times.length }, () => new Float64Array(draws));
  const one = new Float64Array(names.length);
  for (let draw = 0; draw < draws; draw++) {
    for (let q = 0; q < one.length; q++) one[q] = eta[q]![draw]!;
    sweep.run(one);
    for (let i = 0; i < levels.length; i++) levels[i]![draw] = sweep.levels[i]!;
  }
  return levels;
}
