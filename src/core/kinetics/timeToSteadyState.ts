import { argumentRefuse } from "./argumentCheck.ts";
import { type OralKinetics, oralKineticsCheck } from "./oralKinetics.ts";

/**
 * How long until regular dosing has come a given part of the way to steady state: the usual rule.
 *
 * Formula: ln(1/(1 − fraction))/min(ka, ke).
 * It looks at the slower of the two rates only. It neglects the faster rate (which adds up to about 1/max(ka, ke)), the lag,
 * and where in the dosing interval one looks; a loading dose makes it meaningless.
 * @param kinetics see OralKinetics
 * @param fraction of the way to steady state, above 0, below 1
 * @returns h from the first dose, and which rate is the slower ("elimination" when they are equal)
 * Outside: bad arguments throw RangeError.
 * Accuracy: relative 5e-16 of the rule.
 * Source: common practice; 90 % takes 3.32 half-lives of the slower process.
 * @example timeToSteadyState({ ka: 1, ke: 0.1, volume: 30, bioavailability: 1, lag: 0 }) // { hours: 23.02585092994046, slower: "elimination" }
 */
export function timeToSteadyState(
  kinetics: OralKinetics,
  fraction = 0.9,
): { hours: number; slower: "absorption" | "elimination" } {
  oralKineticsCheck(kinetics);
  if (!(fraction > 0 && fraction < 1)) argumentRefuse("fraction", fraction, "", "above 0 and below 1");
  const { ka, ke } = kinetics;
  return { hours: -Math.log1p(-fraction) / Math.min(ka, ke), slower: ka < ke ? "absorption" : "elimination" };
}
