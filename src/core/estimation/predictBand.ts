import type { Dose } from "../kinetics/index.ts";
import { drawBand } from "./drawBand.ts";
import { ORAL_PARAMETERS, oralHistory } from "./oralProblem.ts";
import type { OralPosterior } from "./posterior.ts";

/**
 * The band of levels a posterior leaves under any doses.
 *
 * Formula: the weighted quantiles of the draws' levels at each time, without residual error (drawBand).
 * @param posterior see OralPosterior
 * @param doses h and mg, in order of time
 * @param times h, ascending
 * @param quantiles 0 to 1 each
 * @returns one array a quantile: mg/L at each time
 * Outside: bad arguments throw RangeError.
 * Accuracy: that of the draws; percentiles of a steady-state trough to 2 % with 4,000 (tests/outside/mapPublic.test.ts).
 * Source: docs/methods/levels-to-this-patient.md.
 */
export function predictBand(
  posterior: OralPosterior,
  doses: readonly Dose[],
  times: ArrayLike<number>,
  quantiles: readonly number[],
): Float64Array[] {
  const { population, weights } = posterior;
  const eta = ORAL_PARAMETERS.map((name) => posterior[name].map((value) => Math.log(value / population[name])));
  const random = ORAL_PARAMETERS.map((name) => ({ name, omega: 1 }));
  return drawBand({ history: oralHistory(population, doses), random }, { eta, weights }, times, quantiles);
}
