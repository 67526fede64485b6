import { type DrawSummary, drawSummary } from "./drawSummary.ts";
import { estimateMostLikely } from "./estimateMostLikely.ts";
import { estimatePosterior } from "./estimatePosterior.ts";
import type { DrawOptions } from "./estimationDraws.ts";
import { ORAL_PARAMETERS, type OralParameter, type OralProblem, oralEstimationProblem } from "./oralProblem.ts";

export interface OralPosterior {
  /** L/h, L, 1/h, one a draw. */
  readonly clearance: Float64Array;
  readonly volume: Float64Array;
  readonly ka: Float64Array;
  /** Add up to 1. */
  readonly weights: Float64Array;
  /** Of the importance weights; null for a chain. */
  readonly paretoK: number | null;
  readonly effectiveSize: number;
  readonly method: "importance" | "chain";
  readonly summary: Readonly<Record<OralParameter, DrawSummary>>;
  /** The typical patient the draws are of. */
  readonly population: OralProblem["population"];
}

export const DEFAULT_DRAWS: DrawOptions = { draws: 2000, seed: 1 };

/**
 * Draws of clearance, volume and absorption rate from what the levels leave possible: see estimatePosterior.
 *
 * @param problem see OralProblem
 * @param options draws (100 to 100,000) and seed; default 2,000 and 1
 * @returns see OralPosterior
 * Outside: bad arguments, and all omega 0, throw RangeError. Throws Error where the most likely values were not found or the draws are not
 * to be trusted: no figure is better than a wrong one.
 * Accuracy: 4,000 draws: means to 1 %, standard deviations to 3 % (tests/outside/mapPublic.test.ts).
 * Source: docs/methods/levels-to-this-patient.md.
 */
export function posterior(problem: OralProblem, options: Partial<DrawOptions> = {}): OralPosterior {
  const estimation = oralEstimationProblem(problem);
  const map = estimateMostLikely(estimation);
  if (map.status !== "converged") throw new Error("posterior: the most likely values were not found");
  const drawn = estimatePosterior(estimation, map, { ...DEFAULT_DRAWS, ...options });
  if (drawn.status === "withheld") {
    throw new Error(`posterior: the draws are not to be trusted (k̂ ${drawn.paretoK}, R̂ ${drawn.rHat})`);
  }
  const { weights, paretoK, effectiveSize, method } = drawn;
  const valuesOf = (name: OralParameter) => {
    const at = estimation.random.findIndex((parameter) => parameter.name === name);
    const typical = problem.population[name];
    return Float64Array.from(weights, (_, n) => (at < 0 ? typical : typical * Math.exp(drawn.eta[at]![n]!)));
  };
  const values = { clearance: valuesOf("clearance"), volume: valuesOf("volume"), ka: valuesOf("ka") };
  const summary = Object.fromEntries(ORAL_PARAMETERS.map((name) => [name, drawSummary(values[name], weights)]));
  return {
    ...values,
    weights,
    paretoK,
    effectiveSize,
    method,
    summary: summary as Record<OralParameter, DrawSummary>,
    population: problem.population,
  };
}
