import { concentrationFactor, concentrationUnit } from "../medicine/index.ts";
import type { Concern, Gravity } from "./analysisTypes.ts";
import type { ConcernContext, ConcernRule } from "./concernRule.ts";
import { autoinduction } from "./concerns/autoinduction.ts";
import { doseAboveLimit } from "./concerns/doseAboveLimit.ts";
import { doseNotMakeable } from "./concerns/doseNotMakeable.ts";
import { dosesAfterNow } from "./concerns/dosesAfterNow.ts";
import { dosesSameTime } from "./concerns/dosesSameTime.ts";
import { estimatesPieced } from "./concerns/estimatesPieced.ts";
import { factorsUnused } from "./concerns/factorsUnused.ts";
import { firstDoseClose } from "./concerns/firstDoseClose.ts";
import { fitSetAside } from "./concerns/fitSetAside.ts";
import { fitWithheld } from "./concerns/fitWithheld.ts";
import { flipFlop } from "./concerns/flipFlop.ts";
import { flipFlopAmbiguous } from "./concerns/flipFlopAmbiguous.ts";
import { forecastMissed } from "./concerns/forecastMissed.ts";
import { formulaStep } from "./concerns/formulaStep.ts";
import { historyAssumed } from "./concerns/historyAssumed.ts";
import { interactionKnown } from "./concerns/interactionKnown.ts";
import { inventedMedicine } from "./concerns/inventedMedicine.ts";
import { kidneyUnknown } from "./concerns/kidneyUnknown.ts";
import { kineticsChange } from "./concerns/kineticsChange.ts";
import { levelFarOff } from "./concerns/levelFarOff.ts";
import { levelLeftOut } from "./concerns/levelLeftOut.ts";
import { levelNotSteady } from "./concerns/levelNotSteady.ts";
import { levelOutlier } from "./concerns/levelOutlier.ts";
import { levelOutOfRange } from "./concerns/levelOutOfRange.ts";
import { levelOutsidePrior } from "./concerns/levelOutsidePrior.ts";
import { levelOutsideWindow } from "./concerns/levelOutsideWindow.ts";
import { levelResidual } from "./concerns/levelResidual.ts";
import { levelsAbsorptionOnly } from "./concerns/levelsAbsorptionOnly.ts";
import { levelsAllLeftOut } from "./concerns/levelsAllLeftOut.ts";
import { levelsBeforeChange } from "./concerns/levelsBeforeChange.ts";
import { levelsBeforeSteady } from "./concerns/levelsBeforeSteady.ts";
import { levelsBelowLimit } from "./concerns/levelsBelowLimit.ts";
import { levelsSameTime } from "./concerns/levelsSameTime.ts";
import { levelsTaughtLittle } from "./concerns/levelsTaughtLittle.ts";
import { levelsWithinError } from "./concerns/levelsWithinError.ts";
import { levelTiming } from "./concerns/levelTiming.ts";
import { levelTooEarly } from "./concerns/levelTooEarly.ts";
import { levelToxic } from "./concerns/levelToxic.ts";
import { linearApproximation } from "./concerns/linearApproximation.ts";
import { linesUnreadable } from "./concerns/linesUnreadable.ts";
import { memoryFigures } from "./concerns/memoryFigures.ts";
import { modelIncomplete } from "./concerns/modelIncomplete.ts";
import { neverSteady } from "./concerns/neverSteady.ts";
import { noSteadyState } from "./concerns/noSteadyState.ts";
import { oneLevel } from "./concerns/oneLevel.ts";
import { optionChanceOutside } from "./concerns/optionChanceOutside.ts";
import { optionChanceToxic } from "./concerns/optionChanceToxic.ts";
import { optionOutsideWindow } from "./concerns/optionOutsideWindow.ts";
import { optionToxic } from "./concerns/optionToxic.ts";
import { parametersHeld } from "./concerns/parametersHeld.ts";
import { parameterUnusual } from "./concerns/parameterUnusual.ts";
import { phenytoinAlbumin } from "./concerns/phenytoinAlbumin.ts";
import { populationOutside } from "./concerns/populationOutside.ts";
import { productSwitch } from "./concerns/productSwitch.ts";
import { recordUnreviewed } from "./concerns/recordUnreviewed.ts";
import { roadsDiffer } from "./concerns/roadsDiffer.ts";
import { typicalOnly } from "./concerns/typicalOnly.ts";
import { valuesConfirmed } from "./concerns/valuesConfirmed.ts";
import { windowHourNever } from "./concerns/windowHourNever.ts";
import { windowMissing } from "./concerns/windowMissing.ts";
import { windowSampling } from "./concerns/windowSampling.ts";

/** Every rule, in the order in which concerns of the same gravity are shown. */
const RULES: readonly ConcernRule[] = [
  roadsDiffer,
  modelIncomplete,
  linesUnreadable,
  inventedMedicine,
  optionToxic,
  optionChanceToxic,
  levelToxic,
  levelOutOfRange,
  fitWithheld,
  neverSteady,
  populationOutside,
  formulaStep,
  levelTiming,
  levelTooEarly,
  phenytoinAlbumin,
  levelOutsideWindow,
  levelFarOff,
  levelOutlier,
  levelResidual,
  levelOutsidePrior,
  forecastMissed,
  parameterUnusual,
  levelsSameTime,
  dosesSameTime,
  typicalOnly,
  levelsAllLeftOut,
  fitSetAside,
  flipFlopAmbiguous,
  levelsAbsorptionOnly,
  levelsBeforeChange,
  levelsTaughtLittle,
  optionChanceOutside,
  kineticsChange,
  autoinduction,
  linearApproximation,
  doseAboveLimit,
  productSwitch,
  optionOutsideWindow,
  windowHourNever,
  windowSampling,
  levelNotSteady,
  firstDoseClose,
  doseNotMakeable,
  dosesAfterNow,
  windowMissing,
  interactionKnown,
  factorsUnused,
  valuesConfirmed,
  flipFlop,
  levelLeftOut,
  oneLevel,
  parametersHeld,
  levelsBeforeSteady,
  levelsWithinError,
  levelsBelowLimit,
  noSteadyState,
  historyAssumed,
  kidneyUnknown,
  estimatesPieced,
  memoryFigures,
  recordUnreviewed,
];

const ORDER: Readonly<Record<Gravity, number>> = { stop: 0, check: 1, note: 2 };

/** What a human has to look at, gravest first; with the unit its sentences name concentrations in. */
export function caseConcerns(context: ConcernContext): Concern[] {
  const { medicine } = context.case;
  const shownIn = { unit: concentrationUnit(medicine), factor: concentrationFactor(medicine) };
  return RULES.flatMap((rule) => rule(context))
    .map((each) => ({ ...each, data: { ...each.data, shownIn } }))
    .sort((a, b) => ORDER[a.gravity] - ORDER[b.gravity]);
}
