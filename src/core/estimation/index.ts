export { drawBand } from "./drawBand.ts";
export { type DrawSummary, drawMoments, drawSummary } from "./drawSummary.ts";
export { estimateMostLikely } from "./estimateMostLikely.ts";
export { estimatePosterior, LARGEST_PARETO_K } from "./estimatePosterior.ts";
export { type DrawOptions, type Draws, drawLevels, priorDraws } from "./estimationDraws.ts";
export { EstimationObjective } from "./estimationObjective.ts";
export type {
  EstimationLevel,
  EstimationProblem,
  MapEstimate,
  Posterior,
  RandomParameter,
  Residual,
  ResidualModel,
} from "./estimationTypes.ts";
export { type Forecast, forecastAt, forecasts } from "./forecasts.ts";
export { leaveOneOut, leaveOut } from "./leaveOneOut.ts";
export { mapEstimate, type OralMapEstimate } from "./mapEstimate.ts";
export type { OralParameter, OralProblem } from "./oralProblem.ts";
export { type OralPosterior, posterior } from "./posterior.ts";
export { predictBand } from "./predictBand.ts";
export { predictiveAtLevels } from "./predictiveAtLevels.ts";
export { predictiveQuantiles } from "./predictiveQuantiles.ts";
export { residualSd } from "./residualTerm.ts";
export { shareSlowAbsorption } from "./shareSlowAbsorption.ts";
export { taught } from "./taught.ts";
