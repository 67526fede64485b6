import { argumentRefuse } from "../argumentCheck.ts";
import type { ModelInput } from "./absorption.ts";
import type { ModelDisposition } from "./modelHistory.ts";
import { steadyPatternOf } from "./modelSteadyRun.ts";

/**
 * How long until regular dosing has come a given part of the way to steady state: the usual rule, of any kind of model.
 *
 * Formula: the longest of what each process alone would take: elimination ln(1/(1 − fraction))/rate, with ke, or the terminal rate
 * of two compartments; absorption ln(1/(1 − fraction))/ka, or fraction × duration of a zero-order input.
 * Saturable elimination: Km·V/(Vmax − R)² · (ln(1/(1 − fraction))·Vmax − fraction·R), R = Σ F·D/period: exact for a constant
 * input into an empty body, and 2.303·Vmax − 0.9·R at 0.9.
 * It neglects every process but the slowest, the lag, and where in the dosing interval one looks; a loading dose makes it meaningless.
 * @param disposition see ModelDisposition
 * @param inputs see ModelInput
 * @param period h, above 0
 * @param fraction of the way to steady state, above 0, below 1
 * @returns h from the first dose, and which process is the slowest ("elimination" when they are equal); Infinity at a dose rate at
 * which there is no steady state
 * Outside: bad arguments throw RangeError.
 * Accuracy: relative 1e-15 of the rule; 1e-9 where the dose rate is within 1e-6 of Vmax.
 * Source: linear kinds common practice; saturable: Winter, Basic Clinical Pharmacokinetics (from memory, unverified), derived in
 * docs/methods/saturable-elimination.md.
 * @example modelTimeToSteadyState({ kind: "one-compartment", clearance: 3, volume: 30 }, [], 12) // { hours: 23.02585092994046, slower: "elimination" }
 */
export function modelTimeToSteadyState(
  disposition: ModelDisposition,
  inputs: readonly ModelInput[],
  period: number,
  fraction = 0.9,
): { hours: number; slower: "absorption" | "elimination" } {
  const { kind, parts, absorbed } = steadyPatternOf(disposition, inputs, period);
  if (!(fraction > 0 && fraction < 1)) argumentRefuse("fraction", fraction, "", "above 0 and below 1");
  const doseRate = absorbed / period;
  if (doseRate >= kind.capacity(disposition)) return { hours: Infinity, slower: "elimination" };
  const elimination = kind.hoursToSteady(disposition, doseRate, fraction);
  let absorption = 0;
  for (const { release, doses } of parts) {
    if (!doses.some(({ amount }) => amount > 0)) continue;
    const hours = release.kind === "first-order" ? -Math.log1p(-fraction) / release.ka : fraction * release.duration;
    absorption = Math.max(absorption, hours);
  }
  return absorption > elimination
    ? { hours: absorption, slower: "absorption" }
    : { hours: elimination, slower: "elimination" };
}
