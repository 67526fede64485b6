import { estimateMostLikely } from "./estimateMostLikely.ts";
import { estimatePosterior } from "./estimatePosterior.ts";
import { type DrawOptions, type Draws, drawLevels, priorDraws } from "./estimationDraws.ts";
import type { EstimationProblem } from "./estimationTypes.ts";
import { predictiveQuantiles } from "./predictiveQuantiles.ts";

export interface Forecast {
  /** How many levels were drawn before it. */
  readonly levelsKnown: number;
  /** mg/L a probability, the residual error in it; null where the earlier levels gave no draws to be trusted. */
  readonly quantiles: readonly number[] | null;
}

/**
 * What would have been forecast of each level before it was known.
 *
 * Formula: the posterior from the levels drawn strictly earlier (the prior where there are none) and predictiveQuantiles at its time.
 * @param problem see EstimationProblem
 * @param options see DrawOptions: of each posterior
 * @param probabilities strictly between 0 and 1
 * @returns one a level, in the order of the problem
 * Outside: bad arguments throw RangeError.
 * Accuracy: that of the draws.
 * Source: prequential forecasts (Dawid, Statistical theory: the prequential approach, J R Stat Soc A 1984;147:278–292, from memory,
 * unverified).
 */
export function forecasts(
  problem: EstimationProblem,
  options: DrawOptions,
  probabilities: readonly number[],
): Forecast[] {
  const made = new Map<number, Forecast>();
  return problem.levels.map(({ time }) => {
    const forecast = made.get(time) ?? forecastAt(problem, time, options, probabilities);
    made.set(time, forecast);
    return forecast;
  });
}

/** The same for one time, h: from the levels drawn strictly before it. */
export function forecastAt(
  problem: EstimationProblem,
  time: number,
  options: DrawOptions,
  probabilities: readonly number[],
): Forecast {
  const { levels, residual, residualModel } = problem;
  const known = levels.filter((level) => level.time < time);
  const draws = drawsFrom({ ...problem, levels: known }, options);
  if (draws === null) return { levelsKnown: known.length, quantiles: null };
  const [at] = drawLevels(problem, draws, [time]);
  return {
    levelsKnown: known.length,
    quantiles: predictiveQuantiles(at!, draws.weights, residual, residualModel, probabilities),
  };
}

function drawsFrom(problem: EstimationProblem, options: DrawOptions): Draws | null {
  if (problem.levels.length === 0) return priorDraws(problem, options);
  const map = estimateMostLikely(problem);
  if (map.status !== "converged") return null;
  const posterior = estimatePosterior(problem, map, options);
  return posterior.status === "drawn" ? posterior : null;
}
