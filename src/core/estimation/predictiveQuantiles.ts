import { normalCdf, rootBracketed, weightedQuantiles } from "../numerics/index.ts";
import type { Residual, ResidualModel } from "./estimationTypes.ts";
import { residualSd, robustCdf, robustDensity } from "./residualTerm.ts";

/** Beyond this many s of every draw there is next to nothing: of a normal 1e-23, of the robust residual 1e-8. */
const FAR = { normal: 10, robust: 300 } as const;
/** Of the width searched. */
const NEAR = 1e-10;
const DENSITY_AT_0 = 1 / Math.sqrt(2 * Math.PI);

/**
 * What a new measurement would show: levels of draws with the residual error on top.
 *
 * Formula: the measurement y has the distribution F(y) = Σ wₙ·P((y − fₙ)/sₙ), sₙ² = a² + (b·fₙ)², P that of the residuals; its
 * quantile solves F(y) = p by Newton steps inside a bracket. No noise is drawn.
 * @param levels f, mg/L, one a draw
 * @param weights one a draw
 * @param probabilities strictly between 0 and 1 (0.00001 to 0.99999)
 * @returns mg/L, one a probability; none below 0: no measurement is
 * Outside: not checked.
 * Accuracy: 1e-9 of the spread.
 * Source: written here.
 */
export function predictiveQuantiles(
  levels: Float64Array,
  weights: Float64Array,
  residual: Residual,
  model: ResidualModel,
  probabilities: readonly number[],
): number[] {
  const sd = levels.map((level) => residualSd(residual, level));
  let low = Number.POSITIVE_INFINITY;
  let high = Number.NEGATIVE_INFINITY;
  for (let n = 0; n < levels.length; n++) {
    if (!(weights[n]! > 0)) continue;
    low = Math.min(low, levels[n]! - FAR[model] * sd[n]!);
    high = Math.max(high, levels[n]! + FAR[model] * sd[n]!);
  }
  const cdf = model === "normal" ? normalCdf : robustCdf;
  const density = model === "normal" ? (z: number) => DENSITY_AT_0 * Math.exp(-0.5 * z * z) : robustDensity;
  const starts = weightedQuantiles(levels, weights, probabilities);
  return probabilities.map((probability, p) => {
    const excess = (y: number) => {
      let sum = 0;
      for (let n = 0; n < levels.length; n++) {
        if (!(weights[n]! > 0)) continue;
        // No additive error and no level: nothing is measured, for certain.
        if (sd[n]! > 0) sum += weights[n]! * cdf((y - levels[n]!) / sd[n]!);
        else if (y >= levels[n]!) sum += weights[n]!;
      }
      return sum - probability;
    };
    const slope = (y: number) => {
      let sum = 0;
      for (let n = 0; n < levels.length; n++) {
        if (weights[n]! > 0 && sd[n]! > 0) sum += (weights[n]! / sd[n]!) * density((y - levels[n]!) / sd[n]!);
      }
      return sum;
    };
    if (!(high > low)) return Math.max(0, low);
    return Math.max(0, rootBracketed(excess, slope, low, high, starts[p]!, NEAR * (high - low)).root);
  });
}
