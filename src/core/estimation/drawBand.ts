import { quantileRoom, weightedQuantiles } from "../numerics/index.ts";
import { type Draws, drawLevels } from "./estimationDraws.ts";
import type { EstimationProblem } from "./estimationTypes.ts";

/**
 * The band of levels that draws of a patient make.
 *
 * Formula: at each time the weighted quantiles (weightedQuantiles) of the draws' levels, without residual error.
 * @param problem the history the band is of, and the parameters the draws are in
 * @param draws see Draws
 * @param times h, ascending
 * @param probabilities 0 to 1 each
 * @returns one array a probability: mg/L at each time
 * Outside: bad arguments throw RangeError.
 * Accuracy: that of the draws.
 * Source: docs/methods/levels-to-this-patient.md.
 */
export function drawBand(
  problem: Pick<EstimationProblem, "history" | "random">,
  draws: Draws,
  times: ArrayLike<number>,
  probabilities: readonly number[],
): Float64Array[] {
  const band = probabilities.map(() => new Float64Array(times.length));
  const room = quantileRoom(draws.weights.length);
  const at = new Float64Array(probabilities.length);
  for (const [i, levels] of drawLevels(problem, draws, times).entries()) {
    weightedQuantiles(levels, draws.weights, probabilities, at, room);
    for (let p = 0; p < at.length; p++) band[p]![i] = at[p]!;
  }
  return band;
}
