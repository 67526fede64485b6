import { estimateMostLikely } from "./estimateMostLikely.ts";
import type { EstimationProblem, MapEstimate } from "./estimationTypes.ts";

/**
 * The most likely η without each level in turn: what each level does.
 *
 * Formula: estimateMostLikely of the problem without it, begun where the full problem has its minimum.
 * @param problem see EstimationProblem
 * @param map of the full problem
 * @returns one estimate a level, in the order of the problem; null for the only level: without it there is nothing but the prior
 * Outside: bad arguments throw RangeError.
 * Accuracy: as estimateMostLikely.
 * Source: influence by deletion, standard.
 */
export function leaveOneOut(problem: EstimationProblem, map: MapEstimate): (MapEstimate | null)[] {
  return problem.levels.map((_, left) => leaveOut(problem, map, left));
}

/** The same for one level, by its place in the problem. */
export function leaveOut(problem: EstimationProblem, map: MapEstimate, left: number): MapEstimate | null {
  const { levels } = problem;
  if (levels.length === 1) return null;
  const from = map.status === "converged" ? map.eta : undefined;
  return estimateMostLikely({ ...problem, levels: levels.filter((_, i) => i !== left) }, from);
}
