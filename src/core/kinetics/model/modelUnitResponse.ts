import type { ModelInput } from "./absorption.ts";
import type { LinearDisposition } from "./modelHistory.ts";
import { modelProfile } from "./modelProfile.ts";

/**
 * The level per mg of one dose: from it the levels of any doses follow by scaling and adding up. Only for the linear kinds; for
 * saturable elimination neither holds, and the type does not let it in.
 *
 * Formula: modelProfile of a dose of 1 mg at time 0.
 * @param disposition see LinearDisposition
 * @param product how it is absorbed
 * @param times h after the dose, ascending, finite
 * @returns mg/L per mg at each time
 * Outside: bad arguments throw RangeError.
 * Accuracy: 1e-12 of the largest (tests/core/kinetics/model/modelUnitResponse.test.ts).
 * Source: superposition, standard.
 * @example modelUnitResponse({ kind: "one-compartment", clearance: 3, volume: 30 },
 *   { absorption: { kind: "zero-order", duration: 4 }, bioavailability: 1, lag: 0 }, [4]) // Float64Array [0.0274733…]
 */
export function modelUnitResponse(
  disposition: LinearDisposition,
  product: Omit<ModelInput, "doses">,
  times: ArrayLike<number>,
): Float64Array {
  const inputs = [{ ...product, doses: [{ time: 0, amount: 1 }] }];
  return modelProfile({ dispositions: [{ from: Number.NEGATIVE_INFINITY, disposition }], inputs }, times);
}
