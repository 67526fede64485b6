export { amountsAfterDose } from "./amountsAfterDose.ts";
export { aucAfterDose } from "./aucAfterDose.ts";
export {
  type BothReadings,
  bothReadings,
  FLIP_FLOP_SETTLED_BY,
  type FlipFlopReason,
  type Reading,
} from "./bothReadings.ts";
export { concentrationAfterDose } from "./concentrationAfterDose.ts";
export type { Course, Disposition } from "./course.ts";
export { crossingsAfterDose } from "./crossingsAfterDose.ts";
export { exposure } from "./exposure.ts";
export type { LevelWindow } from "./exposureTally.ts";
export { type Exposure, historyExposure } from "./historyExposure.ts";
export { historyProfile } from "./historyProfile.ts";
export type { Absorption, ModelInput } from "./model/absorption.ts";
export { crossCheck } from "./model/crossCheck.ts";
export { crossCheckExposure } from "./model/crossCheckExposure.ts";
export { distributionEnd } from "./model/distributionEnd.ts";
export type { KineticsParameter } from "./model/kineticsParameter.ts";
export { kineticsParametersCheck, kineticsParametersOf } from "./model/kineticsParameterNames.ts";
export { type ModelAmounts, modelAmounts } from "./model/modelAmounts.ts";
export { modelBothReadings } from "./model/modelBothReadings.ts";
export { modelExposure } from "./model/modelExposure.ts";
export { modelHalfLife } from "./model/modelHalfLife.ts";
export type { DispositionSpan, LinearDisposition, ModelDisposition, ModelHistory } from "./model/modelHistory.ts";
export { modelLevelsOfDraws } from "./model/modelLevelsOfDraws.ts";
export { modelProfile } from "./model/modelProfile.ts";
export { modelScaled } from "./model/modelScaled.ts";
export { type ModelSensitivity, modelSensitivity } from "./model/modelSensitivity.ts";
export { modelSteadyProfile } from "./model/modelSteadyProfile.ts";
export { type ModelSteadyState, modelSteadyState } from "./model/modelSteadyState.ts";
export { ModelSweep } from "./model/modelSweep.ts";
export { modelTimeToSteadyState } from "./model/modelTimeToSteadyState.ts";
export { modelUnitResponse } from "./model/modelUnitResponse.ts";
export { type TwoCompartmentConstants, twoCompartmentConstants } from "./model/twoCompartmentConstants.ts";
export type { Dose, OralKinetics } from "./oralKinetics.ts";
export { patternProfile } from "./patternProfile.ts";
export { type PatternSteadyState, patternSteadyState } from "./patternSteadyState.ts";
export { peakAfterDose } from "./peakAfterDose.ts";
export { profile } from "./profile.ts";
export { type SteadyState, steadyState } from "./steadyState.ts";
export { steadyStateConcentration } from "./steadyStateConcentration.ts";
export { timeOfPeak } from "./timeOfPeak.ts";
export { timeToSteadyState } from "./timeToSteadyState.ts";
