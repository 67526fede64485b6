import {
  adaptiveChain,
  type BatchLogDensity,
  hessianByDifferences,
  importanceSample,
  type Matrix,
  symmetricInverse,
} from "../numerics/index.ts";
import { type DrawOptions, drawOptionsCheck } from "./estimationDraws.ts";
import { EstimationObjective } from "./estimationObjective.ts";
import type { EstimationProblem, MapEstimate, Posterior } from "./estimationTypes.ts";
import { type Mode, mixtureSample } from "./mixtureSample.ts";

/** Above it importance weights are not to be trusted: Vehtari et al., see paretoSmoothed. */
export const LARGEST_PARETO_K = 0.7;
/** Another minimum this much above the lowest holds less than 1e-4 of the lowest one's density at its top: it is left out. */
const OTHER_WITHIN = 9.2;

type Converged = Extract<MapEstimate, { status: "converged" }>;

/**
 * Draws from what the levels leave possible.
 *
 * Formula: importance sampling from a t with 4 degrees about the most likely η with the inverse Hessian as scale (about each minimum, a
 * mixture, where there are several), weights smoothed (importanceSample, paretoSmoothed). k̂ > 0.7: an adaptive Markov chain
 * (adaptiveChain). Neither to be trusted: withheld.
 * @param problem see EstimationProblem
 * @param map of the same problem, converged
 * @param options see DrawOptions
 * @returns see Posterior; draws that no patient can be have weight 0 and are put at the most likely η
 * Outside: bad arguments throw RangeError.
 * Accuracy: 4,000 draws: means to 1 %, standard deviations to 3 %, percentiles of a trough to 2 % (tests/outside/mapPublic.test.ts).
 * Same seed, same bits, within one engine.
 * Source: docs/methods/levels-to-this-patient.md.
 */
export function estimatePosterior(problem: EstimationProblem, map: Converged, options: DrawOptions): Posterior {
  return posteriorFrom(new EstimationObjective(problem), map, options);
}

export function posteriorFrom(objective: EstimationObjective, map: Converged, options: DrawOptions): Posterior {
  drawOptionsCheck(options);
  const { draws, seed } = options;
  const logDensity = batchLogDensity(objective, map.objective);
  const modes = modesOf(objective, map);
  const sample =
    modes.length > 1
      ? mixtureSample(logDensity, modes, draws, seed)
      : importanceSample({ logDensity, mode: map.eta, hessian: modes[0]!.hessian, draws, seed });
  const paretoK = sample.status === "drawn" ? sample.paretoK : Number.POSITIVE_INFINITY;
  if (sample.status === "drawn" && paretoK <= LARGEST_PARETO_K) {
    const { points, weights, effectiveSize } = sample;
    for (let n = 0; n < draws; n++) {
      if (weights[n] === 0) for (const [i, column] of points.entries()) column[n] = map.eta[i]!;
    }
    return { status: "drawn", method: "importance", eta: points, weights, paretoK, effectiveSize, rHat: null };
  }
  const scale = symmetricInverse(modes[0]!.hessian);
  const chain = scale === null ? null : adaptiveChain({ logDensity, start: map.eta, scale, draws, seed });
  if (chain?.status === "drawn") {
    const { points, rHat, effectiveSize } = chain;
    const weights = new Float64Array(draws).fill(1 / draws);
    return { status: "drawn", method: "chain", eta: points, weights, paretoK: null, effectiveSize, rHat };
  }
  const rHat = chain?.status === "not-converged" ? chain.rHat : Number.POSITIVE_INFINITY;
  const effectiveSize = chain?.status === "not-converged" ? chain.effectiveSize : 0;
  return { status: "withheld", paretoK, rHat, effectiveSize };
}

/** −O, less its greatest value: no overflow. */
function batchLogDensity(objective: EstimationObjective, least: number): BatchLogDensity {
  const eta = objective.problem.random.map(() => 0);
  return (points) => {
    const count = points[0]!.length;
    const density = new Float64Array(count);
    for (let n = 0; n < count; n++) {
      for (let i = 0; i < eta.length; i++) eta[i] = points[i]![n]!;
      density[n] = least - objective.value(eta);
    }
    return density;
  };
}

/** The minima that matter, the lowest first, each with a positive definite curvature. */
function modesOf(objective: EstimationObjective, map: Converged): Mode[] {
  const scale = objective.problem.random.map(({ omega }) => Math.min(omega, 1));
  const curvature = (eta: readonly number[], hessian: Matrix | null) =>
    hessian !== null && symmetricInverse(hessian) !== null ? hessian : objective.expectedHessian(eta);
  const modes: Mode[] = [{ at: map.eta, objective: map.objective, hessian: curvature(map.eta, map.hessian) }];
  for (const { eta, objective: value } of map.otherMinima) {
    if (value - map.objective > OTHER_WITHIN) continue;
    const hessian = hessianByDifferences((x) => objective.gradient(x), eta, scale);
    modes.push({ at: eta, objective: value, hessian: curvature(eta, hessian) });
  }
  return modes;
}
