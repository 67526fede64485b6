import { concentrationUnit } from "../../core/medicine/index.ts";
import { summaryReadingWords } from "../../core/messages/index.ts";
import { type InstantForm, instantText, MS_PER_HOUR } from "../../core/time/index.ts";
import { type NumberPrintOptions, numberPrint, quantityPrint, type UnitCode } from "../../core/units/index.ts";
import type { SummaryInput } from "./summaryInput.ts";

/** Readings are printed to three significant digits: more is not known, and whole-number digits are never rounded away. */
const SIGNIFICANT = 3;

/** Figures and times of one summary, as they stand on paper. */
export interface SummaryPrint {
  readonly figure: (value: number, significant?: number) => string;
  readonly quantity: (value: number, unit: UnitCode, options?: NumberPrintOptions) => string;
  /** As written by a person or the record: not rounded. */
  readonly exact: (quantity: { readonly value: number; readonly unit: UnitCode }) => string;
  readonly concentration: (mgPerL: number) => string;
  /** From mg/L to the unit concentrations are printed in. */
  readonly shownFactor: number;
  /** "5 hours" */
  readonly hours: (hours: number) => string;
  readonly ms: (atH: number) => number;
  readonly at: (ms: number, form: InstantForm) => string;
  /** "Wednesday 4 March 2026 at 20:00" */
  readonly atClock: (ms: number) => string;
}

export function summaryPrint(input: Pick<SummaryInput, "case" | "analysis" | "settings">): SummaryPrint {
  const { microgram } = input.settings;
  const zone = input.case.timeZone;
  const shownUnit = concentrationUnit(input.case.medicine);
  const quantity = (
    value: number,
    unit: UnitCode,
    options: NumberPrintOptions = { significant: SIGNIFICANT },
  ): string => {
    if (unit === "mg.h/L") return exposure(value, options);
    const shown = unit === "mg/L" && shownUnit === "ug/L" ? { value: value * 1000, unit: shownUnit } : { value, unit };
    return quantityPrint(shown, { style: "print", microgram, ...options });
  };
  /** Below 1 mg in micrograms, as any mg amount. */
  const exposure = (value: number, options: NumberPrintOptions): string =>
    shownUnit === "ug/L" || (value !== 0 && Math.abs(value) < 1)
      ? `${numberPrint(value * 1000, options)} ${microgram} hours per L`
      : `${numberPrint(value, options)} mg hours per L`;
  const at = (ms: number, form: InstantForm) => instantText(ms, zone, form);
  return {
    figure: (value, significant = SIGNIFICANT) => numberPrint(value, { significant }),
    quantity,
    exact: ({ value, unit }) => quantity(value, unit, {}),
    concentration: (mgPerL) => quantity(mgPerL, "mg/L"),
    shownFactor: shownUnit === "ug/L" ? 1000 : 1,
    hours: (hours) => summaryReadingWords.hours(numberPrint(hours, { decimals: hours < 1 ? 2 : 1 })),
    ms: (atH) => input.analysis.clock.originMs + atH * MS_PER_HOUR,
    at,
    atClock: (ms) => `${at(ms, "dateYear")} at ${at(ms, "clock")}`,
  };
}
