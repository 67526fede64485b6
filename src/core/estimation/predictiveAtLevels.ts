import { type Draws, drawLevels } from "./estimationDraws.ts";
import type { EstimationProblem } from "./estimationTypes.ts";
import { predictiveQuantiles } from "./predictiveQuantiles.ts";

/**
 * What measurements at the levels' times would show, by draws of the patient: of the prior the typical patients' range, of the posterior
 * this patient's.
 *
 * Formula: predictiveQuantiles of the draws' levels: the residual error is in it.
 * @param problem see EstimationProblem
 * @param draws see Draws
 * @param probabilities strictly between 0 and 1
 * @returns for each level, in the order of the problem, mg/L a probability
 * Outside: bad arguments throw RangeError.
 * Accuracy: that of the draws.
 * Source: prior and posterior predictive check, standard (Gelman et al., Bayesian data analysis, from memory, unverified).
 */
export function predictiveAtLevels(
  problem: EstimationProblem,
  draws: Draws,
  probabilities: readonly number[],
): number[][] {
  const { levels, residual, residualModel } = problem;
  const times = [...new Set(levels.map(({ time }) => time))].sort((a, b) => a - b);
  const byTime = new Map(
    drawLevels(problem, draws, times).map((each, i) => [
      times[i]!,
      predictiveQuantiles(each, draws.weights, residual, residualModel, probabilities),
    ]),
  );
  return levels.map(({ time }) => [...byTime.get(time)!]);
}
