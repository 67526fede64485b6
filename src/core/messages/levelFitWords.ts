import type { LevelResult, Spread } from "../analysis/index.ts";
import { numberPrint } from "../units/index.ts";
import { fitWords, influenceWords } from "./fitWords.ts";

/** What the fit says of one level, a sentence each. `print`: mg/L in the level's own unit; `figure`: the same without the unit. */
export function levelFitWords(
  level: LevelResult,
  print: (mgPerL: number) => string,
  figure: (mgPerL: number) => string,
): string[] {
  const { fit } = level;
  if (!fit) return [];
  const range = (low: number, high: number) => `${figure(low)} to ${print(high)}`;
  const interval = (spread: Spread) => range(spread.q05, spread.q95);
  const { standardised, forecast, priorPredictive, isOutsidePrior } = fit;
  const influence = influenceWords(fit.influence, undefined, level.excluded !== null);
  return [
    ...(standardised === null ? [] : [`${residualWords(standardised)}.`]),
    ...(level.excluded === null && fit.influence === null ? [`${fitWords.onlyLevel}.`] : []),
    ...(influence === "" ? [] : [`${influence}.`]),
    ...(forecast
      ? [
          `${fitWords.forecastHead(forecast.levelsKnown)}, ${fitWords.interval} ${interval(forecast.predictive)}: ${fitWords.held(forecast.held)}.`,
        ]
      : [`${fitWords.noForecast}.`]),
    `${fitWords.priorRange} ${range(priorPredictive.low, priorPredictive.high)}${isOutsidePrior ? `: ${fitWords.outsidePrior}` : ""}.`,
  ];
}

/** Nearer than this, in residual standard deviations, a level lies on the curve. */
const ON_CURVE = 0.05;

function residualWords(standardised: number): string {
  if (Math.abs(standardised) < ON_CURVE) return "On this patient's curve";
  const size = numberPrint(Math.abs(standardised), { significant: 2 });
  return `${size} residual standard deviations ${standardised > 0 ? "above" : "below"} this patient's curve`;
}
