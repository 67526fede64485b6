import {
  adaptiveChain,
  type BatchLogDensity,
  hessianByDifferences,
  type Matrix,
  symmetricInverse,
} from "../numerics/index.ts";
import { drawMoments } from "./drawSummary.ts";
import { type DrawOptions, drawOptionsCheck } from "./estimationDraws.ts";
import { EstimationObjective } from "./estimationObjective.ts";
import type { EstimationProblem, MapEstimate, Posterior } from "./estimationTypes.ts";
import { type Component, mixtureSample } from "./mixtureSample.ts";
import { thinnedDraws } from "./thinnedDraws.ts";

/** Above it importance weights are not to be trusted: Vehtari et al., see paretoSmoothed. */
export const LARGEST_PARETO_K = 0.7;
/** Another minimum this much above the lowest holds less than 1e-4 of the lowest one's density at its top: it is left out. */
const OTHER_WITHIN = 9.2;

/** Part of the draws proposed by the prior. */
const PRIOR_SHARE = 0.2;

/** First draws, that only learn where to draw, and the part of the draws that comes from there. */
const PILOT_DRAWS = 1024;
const LEARNT_SHARE = 0.8;
/**
 * Its scale as a multiple of their covariance, 1 + 4.5/d in d dimensions: a skew posterior reaches farther on one side than its covariance
 * says. Chosen on the hardest case of tests/outside/mapPublic.test.ts, its trough's 5 %: at worst 2.0 % off with 2 in three dimensions, 1.6 %
 * with 2.5, 60 seeds each.
 */
const WIDENED_BY = 4.5;
/** Draws weighed for each one kept where a level costs microseconds: tails then hold their percentiles (see thinnedDraws). */
const WEIGHED_FOR_ONE = 8;

type Converged = Extract<MapEstimate, { status: "converged" }>;

/**
 * Draws from what the levels leave possible.
 *
 * Formula: importance sampling from a mixture of t distributions with 4 degrees: about each minimum with its inverse Hessian as scale, the
 * prior, and, by far the most, mean and (widened) covariance as 1,024 draws from those have found them (mixtureSample); weights smoothed
 * (paretoSmoothed). Kinds of closed form weigh 8 draws for each one kept (thinnedDraws). k̂ > 0.7: an adaptive Markov chain
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
  const first = componentsOf(objective, map);
  const pilot = mixtureSample(logDensity, first, PILOT_DRAWS, seed);
  const components = pilot.status === "drawn" ? componentsLearnt(first, pilot) : first;
  const many = draws * weighedForOne(objective);
  const sample = mixtureSample(logDensity, components, many, seed);
  const paretoK = sample.status === "drawn" ? sample.paretoK : Number.POSITIVE_INFINITY;
  if (sample.status === "drawn" && paretoK <= LARGEST_PARETO_K) {
    const { points, weights } = many === draws ? sample : thinnedDraws(sample.points, sample.weights, draws);
    for (let n = 0; n < draws; n++) {
      if (weights[n] === 0) for (const [i, column] of points.entries()) column[n] = map.eta[i]!;
    }
    const effectiveSize = 1 / weights.reduce((sum, weight) => sum + weight * weight, 0);
    return { status: "drawn", method: "importance", eta: points, weights, paretoK, effectiveSize, rHat: null };
  }
  const scale = symmetricInverse(components[0]!.hessian);
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

/** How many draws are weighed for each one kept. */
function weighedForOne({ problem }: EstimationObjective): number {
  return problem.history.dispositions[0]?.disposition.kind === "saturable" ? 1 : WEIGHED_FOR_ONE;
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

/**
 * What is drawn from: the surroundings of each minimum that matters, with its curvature, and the prior, which bounds every weight
 * by the likelihood: where the levels say little, the posterior reaches far beyond what the curvature at its top foretells.
 */
function componentsOf(objective: EstimationObjective, map: Converged): Component[] {
  const { random } = objective.problem;
  const scale = random.map(({ omega }) => Math.min(omega, 1));
  const curvature = (eta: readonly number[], hessian: Matrix | null) =>
    hessian !== null && symmetricInverse(hessian) !== null ? hessian : objective.expectedHessian(eta);
  const others = map.otherMinima.filter((other) => other.objective - map.objective <= OTHER_WITHIN);
  const share = (1 - PRIOR_SHARE) / (1 + others.length);
  return [
    { at: map.eta, hessian: curvature(map.eta, map.hessian), share },
    ...others.map(({ eta }) => ({
      at: eta,
      hessian: curvature(
        eta,
        hessianByDifferences((x) => objective.gradient(x), eta, scale),
      ),
      share,
    })),
    { at: random.map(() => 0), hessian: objective.prior.precision, share: PRIOR_SHARE },
  ];
}

/** The same, most of the draws now from where a first few have found the posterior to lie. */
function componentsLearnt(
  components: readonly Component[],
  { points, weights }: { readonly points: readonly Float64Array[]; readonly weights: Float64Array },
): readonly Component[] {
  const moments = points.map((column) => drawMoments(column, weights));
  const covariance = points.map((a, i) =>
    points.map((b, j) => {
      let sum = 0;
      for (let n = 0; n < weights.length; n++) {
        sum += weights[n]! * (a[n]! - moments[i]!.mean) * (b[n]! - moments[j]!.mean);
      }
      return (1 + WIDENED_BY / points.length) * sum;
    }),
  );
  const hessian = symmetricInverse(covariance);
  if (hessian === null) return components;
  const rest = components.map(({ share, ...each }) => ({ ...each, share: share * (1 - LEARNT_SHARE) }));
  return [{ at: moments.map(({ mean }) => mean), hessian, share: LEARNT_SHARE }, ...rest];
}
