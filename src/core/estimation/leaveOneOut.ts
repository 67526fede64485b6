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
  const { levels } = problem;
  if (levels.length === 1) return [null];
  const from = map.status === "converged" ? map.eta : undefined;
  return levels.map((_, left) =>
    estimateMostLikely({ ...problem, levels: levels.filter((__, i) => i !== left) }, from),
  );
}
