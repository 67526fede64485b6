import { type Absorption, absorptionCheck } from "./absorption.ts";
import { type ModelDisposition, modelDispositionCheck } from "./modelHistory.ts";

/**
 * How long after the start of absorption of a dose a level still tells more of distribution than of elimination: the earliest
 * sensible sampling time.
 *
 * Formula: two compartments: see twoCompartmentDistributionEnd. Every other kind has no distribution phase: 0.
 * @param disposition see ModelDisposition
 * @param absorption see Absorption
 * @returns h after the start of absorption (add the lag), 0 or more
 * Outside: bad arguments throw RangeError.
 * Accuracy: 1e-9 h.
 * Source: defined here, docs/methods/two-compartment-oral.md.
 * @example distributionEnd({ kind: "one-compartment", clearance: 3, volume: 30 }, { kind: "first-order", ka: 1 }) // 0
 */
export function distributionEnd(disposition: ModelDisposition, absorption: Absorption): number {
  const kind = modelDispositionCheck("disposition", disposition);
  absorptionCheck("absorption", absorption);
  return kind.distributionEnd(disposition, absorption);
}
