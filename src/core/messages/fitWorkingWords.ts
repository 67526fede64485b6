import type {
  Analysis,
  FittedParameter,
  FlipFlopFinding,
  IndividualFit,
  IndividualReadings,
  Spread,
} from "../analysis/index.ts";
import type { Case } from "../case/index.ts";
import { concentrationUnit, type DisplayUnit } from "../medicine/index.ts";
import { instantText } from "../time/index.ts";
import { numberPrint, quantityPrint, unitSpoken } from "../units/index.ts";
import { figure, hours } from "./concernFigures.ts";
import { chanceWords, fitWords, taughtWord } from "./fitWords.ts";
import { workingUnit } from "./workingUnit.ts";
import { readingWorking, timedTitle, type WorkingWords } from "./workingWords.ts";

/** Six digits: enough to check by hand. */
const six = (value: number): string => numberPrint(value, { significant: 6 });

/** How this patient's figures were found, a line a step; also under every reading of this patient. */
export function fitWorkingWords(fit: IndividualFit): string[] {
  const residual =
    fit.residualModel === "normal"
      ? "normal residuals: every level counts by its error"
      : "robust residuals: Student t with 4 degrees of freedom";
  const draws =
    fit.method === "importance"
      ? `${figure(fit.draws)} draws by quasi-random importance sampling from a multivariate t about the most likely values, weights smoothed by Pareto's law${fit.paretoK === null ? "" : `: k ${numberPrint(fit.paretoK, { decimals: 2 })}, trusted to 0.7`}`
      : `${figure(fit.draws)} draws by an adaptive Markov chain${fit.rHat === null ? "" : `: R-hat ${numberPrint(fit.rHat, { decimals: 3 })}`}`;
  return [
    "parameters are log-normal about the typical patient's: value = typical · e^η, η ~ N(0, ω²)",
    residual,
    `most likely values found in ${figure(fit.iterations)} steps`,
    draws,
    `effective number of draws ${numberPrint(fit.effectiveSize, { decimals: 0 })}; seed ${fit.seed}: the same case gives the same draws`,
    "shown are the median of the draws and the interval from 5 % to 95 % of them",
  ];
}

/** The figures of a parameter, with their units. */
export function parameterFigures(parameter: FittedParameter): { readonly name: string; readonly text: string }[] {
  const print = (value: number) => quantityPrint({ value, unit: parameter.unit }, { style: "screen", significant: 3 });
  const { posterior } = parameter;
  return [
    { name: fitWords.typical, text: print(parameter.typical) },
    { name: fitWords.mostLikely, text: print(parameter.mostLikely) },
    { name: fitWords.median, text: print(posterior.q50) },
    { name: fitWords.interval, text: `${figure(posterior.q05)} to ${print(posterior.q95)}` },
    {
      name: fitWords.taught,
      text: `${taughtWord(parameter.taught)}: spread ${numberPrint(Math.max(0, 1 - parameter.taught) * 100, { decimals: 0 })} % of before`,
    },
  ];
}

/** What the picture of a parameter says, for who does not see it. */
export function learntDescription({ words, unit, prior, posterior, taught }: FittedParameter): string {
  const spoken = unit === "1" ? "" : ` ${unitSpoken(unit, "screen")}`;
  const range = (spread: Spread) => `${figure(spread.q05)} to ${figure(spread.q95)}`;
  return `${words}: before the levels 90 % between ${range(prior)}, with them between ${range(posterior)}${spoken}; the levels taught ${taughtWord(taught)} about it`;
}

/** Both readings, where the levels leave both standing or the draws fall on either side; null where absorption and elimination do not get mixed up. */
export function flipFlopWords(finding: FlipFlopFinding | null): string | null {
  if (!finding?.fastAbsorption || !finding.slowAbsorption) return null;
  const of = ({ ka, ke, volume }: NonNullable<FlipFlopFinding["fastAbsorption"]>) =>
    `absorption half-life ${hours(Math.LN2 / ka)}, elimination ${hours(Math.LN2 / ke)}, volume ${figure(volume)} L`;
  return `${finding.isAmbiguous ? "Both readings of the curve stand" : "Some draws read the curve the other way round"}: ${of(finding.fastAbsorption)}; or ${of(finding.slowAbsorption)}, with a chance of ${chanceWords(finding.shareSlowAbsorption)}.`;
}

/** Levels by id as "5.3 mg/L, Tue 3 March, 14:00", a reason for being left out with them. */
export function levelTimes(value: Case, analysis: Analysis): ReadonlyMap<string, string> {
  return new Map(
    analysis.levels.map(({ id, atH, excluded, belowLimit }) => {
      const found = value.levels.find((level) => level.id === id);
      const shown = found ? `${belowLimit ? "below " : ""}${quantityPrint(found.quantity, { style: "screen" })}, ` : "";
      const at = instantText(analysis.clock.originMs + atH * 3_600_000, value.timeZone, "dayClock");
      return [id, `${shown}${at}${excluded === null ? "" : ` (${fitWords.leftOut(excluded)})`}`];
    }),
  );
}

type Reader = (readings: IndividualReadings) => Spread | null | undefined;

/** Each reading of this patient by its row on the bench: what it is called, its unit, where it stands. */
const READINGS: Readonly<
  Record<string, readonly [title: string, unit: "concentration" | "exposure" | "times" | "h", of: Reader]>
> = {
  peak: ["Highest at steady state", "concentration", (r) => r.steadyState?.peak],
  lowest: ["Lowest at steady state", "concentration", (r) => r.steadyState?.lowest],
  average: ["Average at steady state", "concentration", (r) => r.steadyState?.average],
  auc24: ["AUC in 24 hours at steady state", "exposure", (r) => r.steadyState?.auc24],
  accumulation: ["Accumulation", "times", (r) => r.steadyState?.accumulation],
  timeTo90: ["90 % of the way to steady state", "h", (r) => r.steadyState?.timeTo90H],
  halfLife: ["Half-life of elimination", "h", (r) => r.halfLifeH],
  spanPeak: ["Highest over the span", "concentration", (r) => r.span.peak],
  spanLowest: ["Lowest over the span", "concentration", (r) => r.span.lowest],
  spanAverage: ["Average over the span", "concentration", (r) => r.span.average],
  hoursBelow: ["Hours below the window", "h", (r) => r.span.hoursBelow],
  hoursWithin: ["Hours within the window", "h", (r) => r.span.hoursWithin],
  hoursAbove: ["Hours above the window", "h", (r) => r.span.hoursAbove],
};

/** The working of a reading of this patient: how the draws were made and what they give; null when there is none. */
export function individualWorking(
  value: Case,
  analysis: Analysis,
  optionId: string,
  row: string,
  unit: DisplayUnit = concentrationUnit(value.medicine),
): WorkingWords | null {
  const readings = analysis.options.find(({ id }) => id === optionId)?.individual;
  if (!readings || analysis.fit.kind !== "fitted") return null;
  const found = row === "timed" ? timedFound(readings) : readingFound(readings, row);
  if (!found) return null;
  const shown = workingUnit(value, unit);
  const isLevel = found.unit === "concentration" || found.unit === "exposure";
  const spoken = found.unit === "concentration" || found.unit === "exposure" ? shown[found.unit] : found.unit;
  const print = (figure: number) => six(isLevel ? figure * shown.factor : figure);
  const { fit } = analysis.fit;
  const used = fit.levelsUsed.map((id) => levelTimes(value, analysis).get(id) ?? id);
  return {
    title: found.title,
    steps: [
      `levels used: ${used.join("; ")}`,
      ...fit.parameters.map(
        ({ symbol, unit: own, typical, omega, mostLikely, posterior }) =>
          `${symbol}: typical ${six(typical)}, ω ${six(omega)}; most likely ${six(mostLikely)}; draws ${six(posterior.q05)}, ${six(posterior.q50)}, ${six(posterior.q95)}${own === "1" ? "" : ` ${unitSpoken(own, "screen")}`} (5, 50, 95 %)`,
      ),
      ...fitWorkingWords(fit),
      "each draw was put through every counted dose as the typical patient was, and the reading found on its own curve",
      ...(readings.shareNeverSteady > 0 && row in STEADY
        ? [`draws that never reach a steady state are left out (${chanceWords(readings.shareNeverSteady)})`]
        : []),
      ...(isLevel ? shown.steps : []),
    ],
    result: found.spreads
      .map(
        ([name, { q05, q25, q50, q75, q95 }]) =>
          `${name}median ${print(q50)} ${spoken}; 50 % between ${print(q25)} and ${print(q75)}, 90 % between ${print(q05)} and ${print(q95)} ${spoken}`,
      )
      .join("; "),
    sources: readingWorking(value, analysis, optionId, row, unit)?.sources ?? [],
  };
}

interface Found {
  readonly title: string;
  readonly unit: (typeof READINGS)[string][1];
  readonly spreads: readonly (readonly [name: string, Spread])[];
}

function readingFound(readings: IndividualReadings, row: string): Found | null {
  const known = READINGS[row];
  const spread = known?.[2](readings);
  return known && spread ? { title: known[0], unit: known[1], spreads: [["", spread]] } : null;
}

/** Levels at the hour the window asks for: of unequal doses the lowest and the highest of them. */
function timedFound({ steadyState }: IndividualReadings): Found | null {
  const timed = steadyState?.timed;
  if (!timed) return null;
  const { lowest, highest, afterDoseH } = timed;
  const isOne = lowest.q50 === highest.q50 && lowest.q05 === highest.q05 && lowest.q95 === highest.q95;
  const spreads: Found["spreads"] = isOne
    ? [["", lowest]]
    : [
        ["lowest: ", lowest],
        ["highest: ", highest],
      ];
  return { title: timedTitle(afterDoseH), unit: "concentration", spreads };
}

const STEADY: Readonly<Record<string, true>> = {
  peak: true,
  lowest: true,
  timed: true,
  average: true,
  auc24: true,
  accumulation: true,
  timeTo90: true,
};
