import {
  type Analysis,
  type IndividualReadings,
  type OptionResult,
  type Spread,
  windowDrawH,
} from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { productOf } from "../../core/medicine/index.ts";
import { benchWords, fitWords, summaryOrderWords, windowRemarkWords } from "../../core/messages/index.ts";
import { instantText } from "../../core/time/index.ts";
import { numberPrint, quantityPrint, unitSpoken } from "../../core/units/index.ts";
import { exposureSpoken, type ShownUnit, unitFactor } from "./shownUnit.ts";

/** One row of the readings column: a name and, an option, what the typical patient and this patient have. */
export interface ReadingsRow {
  readonly id: string;
  readonly name: string;
  readonly cells: readonly ReadingPair[];
}

/** null where there is none. */
export interface ReadingPair {
  readonly typical: ReadingCell | null;
  readonly individual: ReadingCell | null;
  /** The same for whichever patient: stands across both columns. */
  readonly isShared?: boolean;
}

export interface ReadingCell {
  readonly text: string;
  /** Said under it, smaller: when, or the 90 % interval. */
  readonly sub?: string;
}

export interface ReadingsGroup {
  readonly id: "steady" | "span";
  readonly head: string;
  readonly rows: readonly ReadingsRow[];
}

const three = (value: number) => numberPrint(value, { significant: 3 });

/** From four days on a duration is read in days, as on paper. */
const DAYS_FROM_H = 96;

/** A unit of more characters than this would break the cells. */
const LONGEST_UNIT = 5;

/** Whether any option has figures of this patient: then there are two columns an option. */
export function hasIndividual(analysis: Analysis): boolean {
  return analysis.options.some((option) => option.individual !== null);
}

type Own = IndividualReadings;
type OwnSteady = NonNullable<Own["steadyState"]>;
type Steady = NonNullable<NonNullable<OptionResult["typical"]>["steadyState"]>;
type Span = NonNullable<OptionResult["typical"]>["span"];

/** The readings of every option, side by side, in the unit shown; this patient's with the 90 % interval under the median. */
export function readingsGroups(value: Case, analysis: Analysis, unit: ShownUnit): readonly ReadingsGroup[] {
  const factor = unitFactor(value, unit);
  const spoken = unitSpoken(unit, "screen");
  const hasChanges = (analysis.typical?.dispositions.length ?? 1) > 1;
  const hasOwn = hasIndividual(analysis);
  // A long unit, or one beside many figures, stands once in the head instead of in every cell.
  const isInHead = hasOwn || spoken.length > LONGEST_UNIT;
  const concentration: Print = {
    figure: (mgPerL) => three(mgPerL * factor),
    unit: isInHead ? "" : ` ${spoken}`,
  };
  const exposure: Print = { figure: concentration.figure, unit: isInHead ? "" : ` ${exposureSpoken(unit)}` };
  const hours: Print = {
    figure: (h) => numberPrint(h, { decimals: 1 }),
    ...(hasOwn ? { unit: "", named: ", h" } : { unit: " h" }),
  };
  /** A row in days where its longest figure is days: four figures of hours tell nobody anything. */
  const wait = (found: readonly (number | null | undefined)[]): Print =>
    Math.max(0, ...found.map((h) => h ?? 0)) < DAYS_FROM_H
      ? hours
      : {
          figure: (h) => numberPrint(h / 24, { decimals: 1 }),
          ...(hasOwn ? { unit: "", named: ", days" } : { unit: " days" }),
        };
  const halfLife = wait(
    analysis.options.map((option) => option.individual?.halfLifeH?.q95 ?? option.typical?.halfLifeH),
  );
  const steady = wait(
    analysis.options.map(
      ({ individual, typical }) => individual?.steadyState?.timeTo90H.q95 ?? typical?.steadyState?.timeTo90H,
    ),
  );
  const times: Print = { figure: three, ...(hasOwn ? { unit: "", named: ", times" } : { unit: " times" }) };
  /** When, under the figure: where there are two columns an option it has no room, and stands in the working. */
  const at = (text: string) => (hasOwn ? {} : { sub: text });
  const clock = (h: number) => instantText(analysis.clock.originMs + h * 3_600_000, value.timeZone, "dayClock");
  const row = (
    id: string,
    name: string,
    print: Print,
    typical: (option: OptionResult) => number | ReadingCell | null | undefined,
    own: (individual: Own) => Spread | null | undefined = () => null,
  ): ReadingsRow => ({
    id,
    name: name + (print.named ?? ""),
    cells: analysis.options.map((option) => {
      const found = typical(option) ?? null;
      const spread = option.individual ? (own(option.individual) ?? null) : null;
      return {
        typical: typeof found === "number" ? { text: print.figure(found) + print.unit } : found,
        individual: spread && {
          text: print.figure(spread.q50) + print.unit,
          sub: `${print.figure(spread.q05)} to ${print.figure(spread.q95)}`,
        },
      };
    }),
  });
  const settled = (
    id: string,
    name: string,
    print: Print,
    of: (s: Steady) => number | ReadingCell,
    own?: (s: OwnSteady) => Spread,
  ) =>
    row(
      id,
      name,
      print,
      (option) => option.typical?.steadyState && of(option.typical.steadyState),
      own && (({ steadyState }) => steadyState && own(steadyState)),
    );
  const span = (
    id: string,
    name: string,
    print: Print,
    of: (s: Span) => number | ReadingCell | null,
    own: (s: Own["span"]) => Spread | null,
  ) =>
    row(
      id,
      name,
      print,
      (option) => option.typical && of(option.typical.span),
      (individual) => own(individual.span),
    );
  const hasSalts = isSaltMixed(value);
  const units = isInHead ? `; ${spoken}, AUC ${exposureSpoken(unit)}` : "";
  const patient = hasOwn ? "" : `, ${fitWords.typicalPatient}`;
  return [
    {
      id: "steady",
      head: `${hasChanges ? benchWords.steadyHeadFinal : benchWords.steadyHead}${patient}${units}`,
      rows: [
        settled(
          "peak",
          "Highest (Cmax)",
          concentration,
          (s) => s.peak,
          (s) => s.peak,
        ),
        settled("peakAfterDose", "after the dose (Tmax)", hours, (s) => s.peakAfterDoseH),
        settled(
          "lowest",
          "Lowest",
          concentration,
          (s) => s.lowest,
          (s) => s.lowest,
        ),
        ...timedRows(analysis, windowDrawH(value), concentration),
        settled(
          "average",
          "Average",
          concentration,
          (s) => s.average,
          (s) => s.average,
        ),
        settled(
          "auc24",
          "AUC in 24 h",
          exposure,
          (s) => s.auc24,
          (s) => s.auc24,
        ),
        row(
          "halfLife",
          "Half-life",
          halfLife,
          (option) => option.typical?.halfLifeH,
          (own) => own.halfLifeH,
        ),
        settled(
          "accumulation",
          "Accumulation",
          times,
          (s) => s.accumulation,
          (s) => s.accumulation,
        ),
        settled(
          "timeTo90",
          "90 % steady after",
          steady,
          (s) => ({ text: steady.figure(s.timeTo90H) + steady.unit, ...at(`from ${clock(s.steady90AtH)}`) }),
          (s) => s.timeTo90H,
        ),
        {
          id: "dailyDose",
          name: "Dose in 24 h",
          cells: analysis.options.map((option) => ({
            typical: dailyDose(option, hasSalts ? value.medicine.name : null),
            individual: null,
            isShared: true,
          })),
        },
      ],
    },
    {
      id: "span",
      head: `${clock(analysis.clock.nowH)} to ${clock(analysis.clock.readingsToH)}, ${numberPrint(analysis.clock.readingsToH - analysis.clock.nowH, { decimals: 0 })} h${patient}${hasOwn ? `; ${spoken}` : ""}${windowRemark(value)}`,
      rows: [
        span(
          "spanPeak",
          "Highest",
          concentration,
          (s) => ({ text: concentration.figure(s.peak) + concentration.unit, ...at(clock(s.timeOfPeakH)) }),
          (s) => s.peak,
        ),
        span(
          "spanLowest",
          "Lowest",
          concentration,
          (s) => ({ text: concentration.figure(s.lowest) + concentration.unit, ...at(clock(s.timeOfLowestH)) }),
          (s) => s.lowest,
        ),
        span(
          "spanAverage",
          "Average",
          concentration,
          (s) => s.average,
          (s) => s.average,
        ),
        span(
          "hoursBelow",
          "Below the window",
          hours,
          (s) => s.hoursBelow,
          (s) => s.hoursBelow,
        ),
        span(
          "hoursWithin",
          "Within the window",
          hours,
          (s) => s.hoursWithin,
          (s) => s.hoursWithin,
        ),
        span(
          "hoursAbove",
          "Above the window",
          hours,
          (s) => s.hoursAbove,
          (s) => s.hoursAbove,
        ),
      ],
    },
  ];
}

interface Print {
  readonly figure: (value: number) => string;
  readonly unit: string;
  /** The unit behind the row's name, where it does not stand behind each figure. */
  readonly named?: string;
}

/** As labelled; `active`: the name of the moiety, where the labels of the options can't be compared without it. */
function dailyDose({ typical }: OptionResult, active: string | null): ReadingCell | null {
  if (!typical || typical.dailyDoseMg === null) return null;
  const print = (mg: number) => breaking(quantityPrint({ value: mg, unit: "mg" }, { style: "screen", significant: 3 }));
  const text = print(typical.dailyDoseMg);
  const { activeDailyDoseMg } = typical;
  return active === null || activeDailyDoseMg === null
    ? { text }
    : { text, sub: `${print(activeDailyDoseMg)} ${summaryOrderWords.active(active)}` };
}

/** Some of the options' products are labelled as a salt and others are not, or as another. */
function isSaltMixed({ options, medicine }: Case): boolean {
  const products = options.flatMap(({ lines }) => lines.map((line) => productOf(medicine, line.product)));
  return new Set(products.map(({ saltFactor }) => saltFactor?.value ?? 1)).size > 1;
}

/** Hours are always of the whole curve; a window meant for one point of it is easily misread. */
function windowRemark(value: Case): string {
  const { window } = value;
  return !window || window.quantity === "lowest-and-highest" || window.quantity === "auc24"
    ? ""
    : `. ${windowRemarkWords(window)}`;
}

/** In a narrow cell a unit may stand under its number. */
function breaking(text: string): string {
  return text.replaceAll("\u00a0", " ");
}

/** Levels at the hour after a dose the window asks for: from the lowest to the highest where doses or gaps differ; no row where it asks for none, and in words where no dose is so long before the next. */
function timedRows({ options }: Analysis, afterDoseH: number | null, { figure, unit }: Print): readonly ReadingsRow[] {
  if (afterDoseH === null || options.every((option) => !option.typical?.steadyState)) return [];
  const never = { text: benchWords.timedNever, sub: benchWords.timedNeverWhy };
  const range = (low: number, high: number) =>
    figure(low) === figure(high) ? figure(low) : `${figure(low)} to ${figure(high)}`;
  const cells = options.map((option): ReadingPair => {
    const typical = option.typical?.steadyState?.timed;
    const own = option.individual?.steadyState?.timed;
    return {
      typical: typical
        ? { text: range(typical.lowest, typical.highest) + unit }
        : option.typical?.steadyState
          ? never
          : null,
      individual: own
        ? {
            text: range(own.lowest.q50, own.highest.q50) + unit,
            sub: `${figure(own.lowest.q05)} to ${figure(own.highest.q95)}`,
          }
        : option.individual?.steadyState
          ? never
          : null,
    };
  });
  return [{ id: "timed", name: benchWords.timed(numberPrint(afterDoseH)), cells }];
}
