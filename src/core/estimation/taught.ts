import { drawMoments } from "./drawSummary.ts";
import type { Draws } from "./estimationDraws.ts";
import type { RandomParameter } from "./estimationTypes.ts";

/**
 * How much the levels taught of each parameter.
 *
 * Formula: 1 − standard deviation of the posterior η/ω, both on the ln scale.
 * @param random the problem's parameters
 * @param posterior draws of their η
 * @returns one a parameter: 0 taught nothing, near 1 taught all; can be a little below 0
 * Source: shrinkage of the posterior, standard.
 */
export function taught(random: readonly RandomParameter[], { eta, weights }: Draws): number[] {
  return random.map(({ omega }, i) => 1 - drawMoments(eta[i]!, weights).sd / omega);
}
