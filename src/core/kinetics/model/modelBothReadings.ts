import { argumentFraction } from "../argumentCheck.ts";
import type { BothReadings } from "../bothReadings.ts";
import { type Absorption, absorptionCheck } from "./absorption.ts";
import { modelDelay } from "./modelArgument.ts";
import { type ModelDisposition, modelDispositionCheck } from "./modelHistory.ts";

/**
 * Both readings of an oral curve (see bothReadings), where exchanging absorption and elimination has a meaning: one compartment with
 * first-order absorption. Null for everything else.
 */
export function modelBothReadings(
  disposition: ModelDisposition,
  absorption: Absorption,
  bioavailability: number,
  lag: number,
): BothReadings | null {
  const kind = modelDispositionCheck("disposition", disposition);
  absorptionCheck("absorption", absorption);
  argumentFraction("bioavailability", bioavailability);
  modelDelay("lag", lag);
  return kind.bothReadings(disposition, absorption, bioavailability, lag);
}
