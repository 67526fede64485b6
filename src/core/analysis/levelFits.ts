import {
  type Draws,
  drawLevels,
  type EstimationProblem,
  forecastAt,
  leaveOut,
  type MapEstimate,
  predictiveQuantiles,
  priorDraws,
  residualSd,
} from "../estimation/index.ts";
import type { LevelResult } from "./analysisTypes.ts";
import type { FitParameter, FitProblem } from "./fitProblem.ts";
import type { LevelFit } from "./fitTypes.ts";
import { SPREAD_PROBABILITIES, spread, spreadOf } from "./spreadOf.ts";

type Converged = Extract<MapEstimate, { status: "converged" }>;

export interface LevelFitInput {
  readonly fit: FitProblem;
  readonly map: Converged;
  readonly posterior: Draws;
  readonly draws: number;
  readonly seed: number;
}

/** Of the typical patient's band outside of which a level asks a question. */
const PRIOR_PROBABILITIES = [0.025, 0.5, 0.975] as const;
/** A fit a level: of the latest so many, the forecast made before it and what leaving it out would do. */
export const LATEST_LOOKED_AT = 12;

/**
 * What the fit says of every level drawn after the first dose, those left out too: prediction, residual, whether the typical patient could
 * have had it, what it does to the estimate, and whether the forecast made before it held. Yields between the refits how far it is, in levels.
 */
export function* levelFits(
  levels: readonly LevelResult[],
  { fit, map, posterior, draws, seed }: LevelFitInput,
): Generator<number, readonly LevelResult[]> {
  const { problem, parameters, used } = fit;
  const shown = levels.filter((level) => level.afterDoseH !== null);
  const times = shown.map((level) => level.atH);
  const prior = priorDraws(problem, { draws, seed });
  const own = drawLevels(problem, posterior, times);
  yield 0.5;
  const typical = drawLevels(problem, prior, times);
  yield 1;
  const measurement = (values: Float64Array, weights: Float64Array, probabilities: readonly number[]) =>
    predictiveQuantiles(values, weights, problem.residual, problem.residualModel, probabilities);

  const found = new Map<string, LevelFit>();
  for (const [i, level] of shown.entries()) {
    const at = used.indexOf(level);
    const predicted = spreadOf(own[i]!, posterior.weights);
    const [low, median, high] = measurement(typical[i]!, prior.weights, PRIOR_PROBABILITIES);
    const predictive = spread(measurement(own[i]!, posterior.weights, SPREAD_PROBABILITIES));
    yield i + 1;
    const isLookedAt = at >= used.length - LATEST_LOOKED_AT;
    const left = at >= 0 && isLookedAt ? leaveOut(problem, map, at) : null;
    yield i + 1.3;
    const forecast =
      at >= 0 && isLookedAt ? forecastAt(problem, level.atH, { draws, seed }, SPREAD_PROBABILITIES) : null;
    yield i + 1.9;
    found.set(level.id, {
      predicted,
      predictive,
      standardised: at >= 0 ? map.standardisedResiduals[at]! : standardisedOf(level, predicted.q50, problem),
      priorPredictive: { low: low!, median: median!, high: high! },
      isOutsidePrior: level.measured < low! || (!level.belowLimit && level.measured > high!),
      influence: left?.status === "converged" ? influenceOf(map, left, parameters) : null,
      forecast: forecast?.quantiles
        ? heldForecast(level, { quantiles: forecast.quantiles, levelsKnown: forecast.levelsKnown })
        : null,
    });
  }
  return levels.map((level) => ({ ...level, fit: found.get(level.id) ?? null }));
}

/** Of a level that was left out: against the median of the draws. */
function standardisedOf(level: LevelResult, predicted: number, { residual }: EstimationProblem): number | null {
  return level.belowLimit ? null : (level.measured - predicted) / residualSd(residual, predicted);
}

function influenceOf(
  map: Converged,
  without: Converged,
  parameters: readonly FitParameter[],
): NonNullable<LevelFit["influence"]> {
  return parameters.map(({ symbol }, i) => ({ symbol, ratio: Math.exp(map.eta[i]! - without.eta[i]!) }));
}

/** Held: the measurement lies inside the 90 % interval; of one below the limit, the interval reaches below it. */
function heldForecast(
  level: LevelResult,
  { quantiles, levelsKnown }: { readonly quantiles: readonly number[]; readonly levelsKnown: number },
): NonNullable<LevelFit["forecast"]> {
  const predictive = spread(quantiles);
  const held = level.measured >= predictive.q05 && (level.belowLimit || level.measured <= predictive.q95);
  return { predictive, levelsKnown, held };
}
