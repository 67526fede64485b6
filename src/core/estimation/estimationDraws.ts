import { modelLevelsOfDraws } from "../kinetics/index.ts";
import { normalQuantile, sobolPoints } from "../numerics/index.ts";
import { estimationCheck, estimationCount } from "./estimationCheck.ts";
import type { EstimationProblem } from "./estimationTypes.ts";
import { priorOf } from "./prior.ts";

export interface DrawOptions {
  /** 100 to 100,000; a power of 2 fills evenly. */
  readonly draws: number;
  /** Whole number, 0 to 2^32 − 1. */
  readonly seed: number;
}

/** Patients drawn from the prior or from a posterior. */
export interface Draws {
  /** η of each draw, one array a random parameter. */
  readonly eta: readonly Float64Array[];
  /** Add up to 1. */
  readonly weights: Float64Array;
}

export function drawOptionsCheck({ draws, seed }: DrawOptions): void {
  estimationCount("draws", draws, 100, 100_000);
  estimationCount("seed", seed, 0, 2 ** 32 - 1);
}

/**
 * Patients such as the prior has them, before any level.
 *
 * Formula: η = L·z, L·Lᵀ = Ω, z standard normal by its quantiles from scrambled Sobol points.
 * @param problem see EstimationProblem; levels and residual do not matter
 * @param options see DrawOptions
 * @returns see Draws; all of one weight
 * Outside: bad arguments throw RangeError.
 * Accuracy: same seed, same bits, within one engine.
 * Source: see sobolPoints, normalQuantile.
 */
export function priorDraws(problem: EstimationProblem, options: DrawOptions): Draws {
  estimationCheck(problem);
  drawOptionsCheck(options);
  const { draws, seed } = options;
  const { factor } = priorOf(problem);
  const z = sobolPoints(factor.length, draws, seed).map((column) => column.map(normalQuantile));
  const eta = factor.map((row) => {
    const column = new Float64Array(draws);
    for (let n = 0; n < draws; n++) for (let j = 0; j < row.length; j++) column[n]! += row[j]! * z[j]![n]!;
    return column;
  });
  return { eta, weights: new Float64Array(draws).fill(1 / draws) };
}

/** mg/L of every draw at each time, h, ascending: one array a time. Without residual error. */
export function drawLevels(
  { history, random }: Pick<EstimationProblem, "history" | "random">,
  { eta }: Draws,
  times: ArrayLike<number>,
): Float64Array[] {
  return modelLevelsOfDraws(
    history,
    random.map(({ name }) => name),
    eta,
    times,
  );
}
