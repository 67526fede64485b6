export {
  adaptiveChain,
  type ChainProblem,
  type ChainSample,
  LARGEST_R_HAT,
  SMALLEST_EFFECTIVE_SIZE,
} from "./adaptiveChain.ts";
export { type ChainDiagnostics, chainDiagnostics } from "./chainDiagnostics.ts";
export { chiSquareQuantile } from "./chiSquareQuantile.ts";
export { choleskyFactor, type Matrix } from "./choleskyFactor.ts";
export { choleskySolve } from "./choleskySolve.ts";
export { CompensatedSum } from "./compensatedSum.ts";
export { decay } from "./decay.ts";
export { decayChain } from "./decayChain.ts";
export { decayDifference } from "./decayDifference.ts";
export { decayIntegral } from "./decayIntegral.ts";
export { type Derivative, DormandPrince } from "./dormandPrince.ts";
export { expm1Excess } from "./expm1Excess.ts";
export { type GeneralisedPareto, generalisedParetoFit } from "./generalisedParetoFit.ts";
export { hessianByDifferences } from "./hessianByDifferences.ts";
export {
  type BatchLogDensity,
  type ImportanceProblem,
  type ImportanceSample,
  importanceSample,
  PROPOSAL_DEGREES,
} from "./importanceSample.ts";
export { logDeterminant } from "./logDeterminant.ts";
export { logGamma } from "./logGamma.ts";
export { type MinimiseEnd, type MinimiseOptions, type MinimiseProblem, type Minimum, minimise } from "./minimise.ts";
export { normalCdf } from "./normalCdf.ts";
export { normalLogCdf, normalLogCdfSlope } from "./normalLogCdf.ts";
export { normalQuantile } from "./normalQuantile.ts";
export { paretoSmoothed, type SmoothedWeights } from "./paretoSmoothed.ts";
export { passedTwoSteps } from "./passedTwoSteps.ts";
export { productError } from "./productError.ts";
export { rankNormalised } from "./rankNormalised.ts";
export { type Root, rootBracketed } from "./rootBracketed.ts";
export { type SeededRandom, seededRandom } from "./seededRandom.ts";
export { signChanges } from "./signChanges.ts";
export { sobolPoints } from "./sobolPoints.ts";
export { studentTLogDensity } from "./studentTLogDensity.ts";
export { sumError } from "./sumError.ts";
export { type SymmetricEigen, symmetricEigen } from "./symmetricEigen.ts";
export { symmetricInverse } from "./symmetricInverse.ts";
export { type QuantileRoom, quantileRoom, weightedQuantiles } from "./weightedQuantiles.ts";
