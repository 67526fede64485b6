import type { Draws } from "./estimationDraws.ts";
import { exchangeableRates } from "./estimationStarts.ts";
import type { EstimationProblem } from "./estimationTypes.ts";

/**
 * The share of the draws whose absorption is slower than their elimination (flip-flop).
 *
 * Formula: Σ of the weights with ka < CL/V, under the last disposition and the first product that is given.
 * @returns 0 to 1; null where exchanging the two has no meaning (another kind, no first-order absorption)
 */
export function shareSlowAbsorption(problem: EstimationProblem, { eta, weights }: Draws): number | null {
  const rates = exchangeableRates(problem);
  if (rates === null) return null;
  const gap = Math.log(rates.ka) - Math.log(rates.ke);
  const sign = problem.random.map(({ name }) => SIGN_IN_GAP[name] ?? 0);
  let share = 0;
  for (let n = 0; n < weights.length; n++) {
    let own = gap;
    for (let i = 0; i < sign.length; i++) own += sign[i]! * eta[i]![n]!;
    if (own < 0) share += weights[n]!;
  }
  return share;
}

/** ln ka − ln(CL/V). */
const SIGN_IN_GAP: Readonly<Record<string, number>> = { ka: 1, clearance: -1, volume: 1 };
