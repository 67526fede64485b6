import type { Spread } from "../../core/analysis/index.ts";
import { concentrationFactor, concentrationUnit } from "../../core/medicine/index.ts";
import { summaryPatientWords, summaryReadingWords } from "../../core/messages/index.ts";
import { type InstantForm, instantText, MS_PER_HOUR } from "../../core/time/index.ts";
import {
  type NumberPrintOptions,
  numberPrint,
  quantityPrint,
  type UnitCode,
  unitDimension,
  unitSpoken,
} from "../../core/units/index.ts";
import type { SummaryInput } from "./summaryInput.ts";

/** Readings are printed to three significant digits: more is not known, and whole-number digits are never rounded away. */
const SIGNIFICANT = 3;
/** All a double holds for certain: a conversion's rounding is not printed. */
const EXACT = 15;
/** A wait longer than this is told in days, h. */
const DAYS_FROM_H = 96;

/** Figures and times of one summary, as they stand on paper. */
export interface SummaryPrint {
  readonly figure: (value: number, significant?: number) => string;
  readonly quantity: (value: number, unit: UnitCode, options?: NumberPrintOptions) => string;
  /** As written by a person or the record: not rounded. */
  readonly exact: (quantity: { readonly value: number; readonly unit: UnitCode }) => string;
  /** The number of `exact` alone, for the low end of a range. */
  readonly number: (quantity: { readonly value: number; readonly unit: UnitCode }) => string;
  readonly concentration: (mgPerL: number) => string;
  /** From mg/L to the unit concentrations are printed in. */
  readonly shownFactor: number;
  /** Median with the 90 % interval: "9.95 mg per L (90 %: 8.1 to 12.3)". `dress` puts words about the median. */
  readonly spread: (spread: Spread, unit: UnitCode, dress?: (figure: string) => string) => string;
  /** "9.95 mg per L (8.1 to 12.3)": in a column that says what it is. */
  readonly cell: (spread: Spread, unit: UnitCode) => string;
  /** "8.1 to 12.3 mg per L" */
  readonly range: (low: number, high: number, unit: UnitCode) => string;
  /** "5 hours" */
  readonly hours: (hours: number) => string;
  /** "5 (4.2 to 6.1)": in a column that says what it is. */
  readonly hoursCell: (spread: Spread) => string;
  /** "5 hours (90 %: 4.2 to 6.1)" */
  readonly hoursSpread: (spread: Spread) => string;
  /** "20 hours", from four days on in days: "41.1 days" */
  readonly wait: (hours: number) => string;
  /** As hoursSpread, from four days on in days. */
  readonly waitSpread: (spread: Spread) => string;
  readonly ms: (atH: number) => number;
  readonly at: (ms: number, form: InstantForm) => string;
  /** "Wednesday 4 March 2026 at 20:00" */
  readonly atClock: (ms: number) => string;
}

export function summaryPrint(input: Pick<SummaryInput, "case" | "analysis" | "settings">): SummaryPrint {
  const { microgram } = input.settings;
  const zone = input.case.timeZone;
  const shownUnit = concentrationUnit(input.case.medicine);
  const factor = concentrationFactor(input.case.medicine);
  const isMolar = unitDimension(shownUnit) !== "mass concentration";
  type Stated = { readonly value: number; readonly unit: UnitCode };
  const inShown = ({ value, unit }: Stated): Stated =>
    unit === "mg/L" ? { value: value * factor, unit: shownUnit } : { value, unit };
  /** What was stated by mass does not turn into a molar unit, whose digits nobody stated. */
  const asStated = (stated: Stated) => (isMolar ? stated : inShown(stated));
  const quantity = (
    value: number,
    unit: UnitCode,
    options: NumberPrintOptions = { significant: SIGNIFICANT },
  ): string => {
    if (unit === "mg.h/L") return exposure(value, options);
    return quantityPrint(inShown({ value, unit }), { style: "print", microgram, ...options });
  };
  /** Below 1 mg in micrograms, as any mg amount. */
  const isMicrogramExposure = (mgHours: number) =>
    shownUnit === "ug/L" || (shownUnit === "mg/L" && mgHours !== 0 && Math.abs(mgHours) < 1);
  const massExposure = (value: number, options: NumberPrintOptions): string =>
    isMicrogramExposure(value)
      ? `${numberPrint(value * 1000, options)} ${microgram} hours per L`
      : `${numberPrint(value, options)} mg hours per L`;
  const exposure = (value: number, options: NumberPrintOptions): string =>
    isMolar
      ? `${numberPrint(value * factor, options)} ${unitSpoken(shownUnit, "print", microgram).replace(/\s(per\sL)$/, " hours $1")}`
      : massExposure(value, options);
  const at = (ms: number, form: InstantForm) => instantText(ms, zone, form);
  const figure = (value: number, significant = SIGNIFICANT) => numberPrint(value, { significant });
  /** A number of an interval, in the unit its median is printed in. */
  const numberBeside = (value: number, unit: UnitCode, median: number) =>
    unit === "mg.h/L"
      ? figure(isMolar ? value * factor : isMicrogramExposure(median) ? value * 1000 : value)
      : figure(inShown({ value, unit }).value);
  const hours = (value: number) => summaryReadingWords.hours(hoursFigure(value));
  return {
    figure,
    quantity,
    exact: (stated) =>
      stated.unit === "mg.h/L"
        ? massExposure(stated.value, {})
        : quantityPrint(asStated(stated), { style: "print", microgram }),
    number: (stated) => numberPrint(asStated(stated).value, { significant: EXACT }),
    concentration: (mgPerL) => quantity(mgPerL, "mg/L"),
    shownFactor: factor,
    spread: ({ q05, q50, q95 }, unit, dress = (text) => text) =>
      summaryPatientWords.spread(
        dress(quantity(q50, unit)),
        numberBeside(q05, unit, q50),
        numberBeside(q95, unit, q50),
      ),
    cell: ({ q05, q50, q95 }, unit) =>
      summaryPatientWords.cell(quantity(q50, unit), numberBeside(q05, unit, q50), numberBeside(q95, unit, q50)),
    range: (low, high, unit) => summaryReadingWords.span(numberBeside(low, unit, high), quantity(high, unit)),
    hours,
    hoursCell: ({ q05, q50, q95 }) => summaryPatientWords.cell(hoursFigure(q50), hoursFigure(q05), hoursFigure(q95)),
    hoursSpread: ({ q05, q50, q95 }) => summaryPatientWords.spread(hours(q50), hoursFigure(q05), hoursFigure(q95)),
    wait: (value) => (value < DAYS_FROM_H ? hours(value) : summaryPatientWords.days(figure(value / 24))),
    waitSpread: ({ q05, q50, q95 }) =>
      q50 < DAYS_FROM_H
        ? summaryPatientWords.spread(hours(q50), hoursFigure(q05), hoursFigure(q95))
        : summaryPatientWords.spread(summaryPatientWords.days(figure(q50 / 24)), figure(q05 / 24), figure(q95 / 24)),
    ms: (atH) => input.analysis.clock.originMs + atH * MS_PER_HOUR,
    at,
    atClock: (ms) => `${at(ms, "dateYear")} at ${at(ms, "clock")}`,
  };
}

function hoursFigure(hours: number): string {
  return numberPrint(hours, { decimals: hours < 1 ? 2 : 1 });
}
