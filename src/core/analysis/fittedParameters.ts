import type { MapEstimate, Posterior } from "../estimation/index.ts";
import type { Model } from "./analysisTypes.ts";
import type { FitParameter } from "./fitProblem.ts";
import type { FittedParameter } from "./fitTypes.ts";
import { parameterDensity } from "./parameterDensity.ts";
import { spreadOf, spreadOfPrior } from "./spreadOf.ts";

type Converged = Extract<MapEstimate, { status: "converged" }>;
type Drawn = Extract<Posterior, { status: "drawn" }>;

/** Each parameter that varies between patients: what was known of it before the levels, and what with them. */
export function fittedParameters(
  typical: Model,
  parameters: readonly FitParameter[],
  map: Converged,
  posterior: Drawn,
): FittedParameter[] {
  const { weights } = posterior;
  return parameters.map(({ symbol, omega }, i): FittedParameter => {
    const named = typical.parameters.find((parameter) => parameter.symbol === symbol);
    const { value, unit, words } = named
      ? { value: named.figure.value, unit: named.figure.unit, words: named.words }
      : productParameter(typical, symbol);
    const etas = posterior.eta[i]!;
    const draws = etas.map((eta) => value * Math.exp(eta));
    const { sd: etaSd } = weightedMoments(etas, weights);
    const { mean, sd } = weightedMoments(draws, weights);
    return {
      symbol,
      words,
      unit,
      typical: value,
      omega,
      eta: map.eta[i]!,
      mostLikely: value * Math.exp(map.eta[i]!),
      prior: spreadOfPrior(value, omega),
      posterior: spreadOf(draws, weights),
      posteriorMean: mean,
      posteriorSd: sd,
      taught: 1 - etaSd / omega,
      density: parameterDensity(value, omega, etas, weights),
    };
  });
}

/** Of what belongs to the products: the first product's value stands for all, which differ by the same factor. */
function productParameter(typical: Model, symbol: string): Pick<FittedParameter, "unit" | "words"> & { value: number } {
  const product = typical.products[0]!;
  if (symbol === "F") return { value: product.bioavailability.value, unit: "1", words: "Bioavailability" };
  const rate = product.absorptionRate;
  return rate
    ? { value: rate.value, unit: rate.unit, words: "Absorption rate" }
    : // Zero-order: the factor on the rate itself.
      { value: 1, unit: "1", words: "Absorption rate, times the typical" };
}

/** Mean and standard deviation of draws whose weights add up to 1. */
export function weightedMoments(values: Float64Array, weights: Float64Array): { mean: number; sd: number } {
  let mean = 0;
  for (let i = 0; i < values.length; i++) mean += weights[i]! * values[i]!;
  let variance = 0;
  for (let i = 0; i < values.length; i++) variance += weights[i]! * (values[i]! - mean) ** 2;
  return { mean, sd: Math.sqrt(variance) };
}
