import type { FittedParameter } from "./fitTypes.ts";

const POINTS = 81;
/** How far the grid reaches beyond what there is to show, in standard deviations. */
const REACH = 3;

/**
 * Prior and posterior density of ln(parameter) over one grid of the parameter's values, scaled together so that the higher of the two
 * peaks is 1: the areas stay comparable. Drawing only.
 * Posterior: Gaussian kernels on the draws, bandwidth 0.9·sd·n^(−1/5) with n the effective number of draws
 * (Silverman BW. Density estimation for statistics and data analysis. London: Chapman and Hall, 1986; rule from memory, unverified).
 */
export function parameterDensity(
  typical: number,
  omega: number,
  etas: Float64Array,
  weights: Float64Array,
): FittedParameter["density"] {
  let mean = 0;
  let squares = 0;
  for (let i = 0; i < etas.length; i++) {
    mean += weights[i]! * etas[i]!;
    squares += weights[i]! ** 2;
  }
  let variance = 0;
  for (let i = 0; i < etas.length; i++) variance += weights[i]! * (etas[i]! - mean) ** 2;
  const sd = Math.sqrt(variance);
  const from = Math.min(-REACH * omega, mean - REACH * sd);
  const to = Math.max(REACH * omega, mean + REACH * sd);
  // All draws in one place: a kernel a grid step wide still shows it.
  const width = Math.max(0.9 * sd * squares ** (1 / 5), (to - from) / POINTS / 2);

  const values = new Float64Array(POINTS);
  const prior = new Float64Array(POINTS);
  const posterior = new Float64Array(POINTS);
  for (let j = 0; j < POINTS; j++) {
    const eta = from + ((to - from) * j) / (POINTS - 1);
    values[j] = typical * Math.exp(eta);
    prior[j] = Math.exp(-0.5 * (eta / omega) ** 2) / omega;
    let sum = 0;
    for (let i = 0; i < etas.length; i++) sum += weights[i]! * Math.exp(-0.5 * ((eta - etas[i]!) / width) ** 2);
    posterior[j] = sum / width;
  }
  const highest = Math.max(...prior, ...posterior);
  return { values, prior: prior.map((y) => y / highest), posterior: posterior.map((y) => y / highest) };
}
