import type { Analysis, FitState, IndividualReadings, LevelFit, Spread } from "../core/analysis/index.ts";
import type { Case } from "../core/case/index.ts";
import type { UnitCode } from "../core/units/index.ts";

/** What the levels make of this patient, as `recompute` prints it: every figure as median with its 50 % and 90 % interval. */

function interval({ q05, q25, q50, q75, q95 }: Spread, unit: UnitCode) {
  return { median: q50, interval50: [q25, q75], interval90: [q05, q95], unit };
}

function maybe(spread: Spread | null, unit: UnitCode) {
  return spread && interval(spread, unit);
}

/** `use`: what the case orders by, whether or not there is a fit. */
export function recomputeFit(state: FitState, use: Case["fit"]["use"]): unknown {
  if (state.kind === "none") return { use, none: state.reason };
  if (state.kind === "withheld") return { use, withheld: state.reason, ...state.data };
  if (state.kind === "pending") throw new RangeError("state: pending; recompute asks for the fit");
  const { fit } = state;
  return {
    use,
    method: fit.method,
    residualModel: fit.residualModel,
    seed: fit.seed,
    draws: fit.draws,
    paretoK: fit.paretoK,
    effectiveSize: fit.effectiveSize,
    rHat: fit.rHat,
    iterations: fit.iterations,
    gradientNorm: fit.gradientNorm,
    levelsUsed: fit.levelsUsed,
    levelsLeftOut: fit.levelsLeftOut,
    parameters: Object.fromEntries(
      fit.parameters.map((parameter) => [
        parameter.symbol,
        {
          typical: parameter.typical,
          omega: parameter.omega,
          mostLikely: parameter.mostLikely,
          eta: parameter.eta,
          mean: parameter.posteriorMean,
          sd: parameter.posteriorSd,
          ...interval(parameter.posterior, parameter.unit),
          taught: parameter.taught,
        },
      ]),
    ),
    halfLife: fit.halfLife && { typical: fit.halfLife.typical, ...interval(fit.halfLife.posterior, "h") },
    flipFlop: fit.flipFlop && {
      shareSlowAbsorption: fit.flipFlop.shareSlowAbsorption,
      isAmbiguous: fit.flipFlop.isAmbiguous,
      fastAbsorption: fit.flipFlop.fastAbsorption,
      slowAbsorption: fit.flipFlop.slowAbsorption,
    },
  };
}

export function recomputeIndividual(readings: IndividualReadings | null, fit: Analysis["fit"]): unknown {
  if (!readings || fit.kind !== "fitted") return null;
  const { span, steadyState } = readings;
  const figure = (symbol: string) => fit.fit.parameters.find((parameter) => parameter.symbol === symbol);
  const clearance = figure("CL");
  const volume = figure("V") ?? figure("V1");
  const timed = steadyState?.timed ?? null;
  return {
    peak: interval(span.peak, "mg/L"),
    trough: interval(span.lowest, "mg/L"),
    average: interval(span.average, "mg/L"),
    auc: interval(span.auc, "mg.h/L"),
    auc24: interval(span.auc24, "mg.h/L"),
    halfLife: maybe(readings.halfLifeH, "h"),
    clearance: clearance ? interval(clearance.posterior, clearance.unit) : null,
    volume: volume ? interval(volume.posterior, volume.unit) : null,
    hoursBelow: maybe(span.hoursBelow, "h"),
    hoursWithin: maybe(span.hoursWithin, "h"),
    hoursAbove: maybe(span.hoursAbove, "h"),
    chance: span.chance,
    lowestBeforeOption: span.lowestBeforeOption,
    steadyState: steadyState && {
      peak: interval(steadyState.peak, "mg/L"),
      trough: interval(steadyState.lowest, "mg/L"),
      average: interval(steadyState.average, "mg/L"),
      auc24: interval(steadyState.auc24, "mg.h/L"),
      accumulation: interval(steadyState.accumulation, "1"),
      swing: interval(steadyState.swing, "1"),
      fluctuation: interval(steadyState.fluctuation, "1"),
      timeTo90: interval(steadyState.timeTo90H, "h"),
      timed: timed && {
        afterDose: { value: timed.afterDoseH, unit: "h" },
        lowest: interval(timed.lowest, "mg/L"),
        highest: interval(timed.highest, "mg/L"),
      },
    },
    chanceAtSteadyState: readings.steadyChance,
    shareNeverSteady: readings.shareNeverSteady,
    chanceToxic: readings.toxicChance,
  };
}

export function recomputeLevelFit(fit: LevelFit | null): unknown {
  return (
    fit && {
      predicted: interval(fit.predicted, "mg/L"),
      predictive: interval(fit.predictive, "mg/L"),
      standardised: fit.standardised,
      priorPredictive: {
        median: fit.priorPredictive.median,
        interval95: [fit.priorPredictive.low, fit.priorPredictive.high],
        unit: "mg/L",
      },
      isOutsidePrior: fit.isOutsidePrior,
      influence: fit.influence && Object.fromEntries(fit.influence.map(({ symbol, ratio }) => [symbol, ratio])),
      forecast: fit.forecast && {
        ...interval(fit.forecast.predictive, "mg/L"),
        levelsKnown: fit.forecast.levelsKnown,
        held: fit.forecast.held,
      },
    }
  );
}
