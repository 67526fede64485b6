import {
  choleskyFactor,
  hessianByDifferences,
  type MinimiseOptions,
  type Minimum,
  minimise,
} from "../numerics/index.ts";
import { EstimationObjective } from "./estimationObjective.ts";
import { estimationStarts } from "./estimationStarts.ts";
import type { EstimationProblem, MapEstimate } from "./estimationTypes.ts";
import { kinkMinimum } from "./kinkMinimum.ts";
import { residualSd } from "./residualTerm.ts";

/** Near enough to tell whether a minimum is a new one. */
const NEAR: MinimiseOptions = { gradientTolerance: 1e-2, stepTolerance: 1e-2, mostIterations: 60 };
const CLOSE: MinimiseOptions = { gradientTolerance: 1e-8, stepTolerance: 1e-9, mostIterations: 60 };
/** Two minima nearer than this, in ω (at most 1), are one. */
const ONE_PLACE = 0.02;

/**
 * The most likely η of a patient: the lowest minimum of the objective.
 *
 * Formula: from each start (estimationStarts) steps in a trust region with the expected curvature; the second derivatives by differences
 * of the analytic gradient; Newton's steps where those led nowhere; the lowest minimum is kept, the others are reported.
 * @param problem see EstimationProblem; without levels the most likely patient is the typical one
 * @param from a start of its own, tried in the place of the usual ones: where a neighbouring problem has its minimum
 * @returns see MapEstimate
 * Outside: bad arguments throw RangeError; "not-converged" where no start leads to a minimum (gradientNorm Infinity where no start
 * has a finite objective).
 * Accuracy: η to 1e-8 of ω (tests/outside/mapPublic.test.ts: 1e-5 asked for).
 * Source: docs/methods/levels-to-this-patient.md; the search: see minimise.
 * @example estimateMostLikely(problem).status // "converged"
 */
export function estimateMostLikely(problem: EstimationProblem, from?: readonly number[]): MapEstimate {
  return mostLikelyOf(new EstimationObjective(problem), from);
}

export function mostLikelyOf(objective: EstimationObjective, from?: readonly number[]): MapEstimate {
  const { problem } = objective;
  const scale = problem.random.map(({ omega }) => Math.min(omega, 1));
  const starts = from === undefined ? estimationStarts(problem) : [from];
  const functions = {
    value: (eta: readonly number[]) => objective.valueWithGradient(eta),
    gradient: (eta: readonly number[]) => objective.gradient(eta),
  };
  const isSame = (a: readonly number[], b: readonly number[]) =>
    a.every((each, i) => Math.abs(each - b[i]!) <= ONE_PLACE * scale[i]!);

  const expected = (eta: readonly number[]) => objective.expectedHessian(eta);

  /** To the minimum near by: cheap steps where they lead there, Newton's where they don't or the true curvature is not positive. */
  const finished = (start: readonly number[]): Minimum => {
    const cheap = minimise({ ...functions, start, hessian: expected, options: { ...CLOSE, scale } });
    if (cheap.status === "converged") {
      const hessian = hessianByDifferences(functions.gradient, cheap.x, scale);
      if (hessian !== null && choleskyFactor(hessian) !== null) return { ...cheap, hessian };
    }
    const newton = minimise({ ...functions, start: cheap.x, options: { ...CLOSE, scale } });
    if (newton.status === "converged") return newton;
    return kinkMinimum(objective, newton, { ...CLOSE, scale }) ?? newton;
  };

  const minima: Minimum[] = [];
  let iterations = 0;
  let leastGradient = Number.POSITIVE_INFINITY;
  for (const start of starts) {
    const near = minimise({ ...functions, start, hessian: expected, options: { ...NEAR, scale } });
    iterations += near.iterations;
    if (near.end === "not-finite" || minima.some(({ x }) => isSame(x, near.x))) continue;
    const found = finished(near.x);
    iterations += found.iterations;
    if (found.status === "converged" && found.x.every(Number.isFinite)) {
      if (!minima.some(({ x }) => isSame(x, found.x))) minima.push(found);
    } else if (found.gradientNorm < leastGradient) leastGradient = found.gradientNorm;
  }
  minima.sort((a, b) => a.value - b.value);
  const [best, ...others] = minima;
  if (best === undefined) return { status: "not-converged", iterations, gradientNorm: leastGradient };
  const predictions = objective.predictions(best.x);
  return {
    status: "converged",
    eta: best.x,
    objective: best.value,
    gradientNorm: best.gradientNorm,
    hessian: best.hessian,
    predictions,
    standardisedResiduals: problem.levels.map(({ value, kind }, j) =>
      kind === "measured" ? (value - predictions[j]!) / residualSd(problem.residual, predictions[j]!) : null,
    ),
    iterations,
    otherMinima: others.map(({ x, value }) => ({ eta: x, objective: value })),
  };
}
