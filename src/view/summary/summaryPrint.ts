import { concentrationFactor, concentrationUnit } from "../../core/medicine/index.ts";
import { summaryReadingWords } from "../../core/messages/index.ts";
import { type InstantForm, instantText, MS_PER_HOUR } from "../../core/time/index.ts";
import {
  type NumberPrintOptions,
  numberPrint,
  quantityPrint,
  type UnitCode,
  unitDimension,
} from "../../core/units/index.ts";
import type { SummaryInput } from "./summaryInput.ts";

/** Readings are printed to three significant digits: more is not known, and whole-number digits are never rounded away. */
const SIGNIFICANT = 3;
/** All a double holds for certain: a conversion's rounding is not printed. */
const EXACT = 15;

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
  const factor = concentrationFactor(input.case.medicine);
  type Stated = { readonly value: number; readonly unit: UnitCode };
  const inShown = ({ value, unit }: Stated): Stated =>
    unit === "mg/L" ? { value: value * factor, unit: shownUnit } : { value, unit };
  /** What was stated by mass does not turn into a molar unit, whose digits nobody stated. */
  const asStated = unitDimension(shownUnit) === "mass concentration" ? inShown : (stated: Stated) => stated;
  const quantity = (
    value: number,
    unit: UnitCode,
    options: NumberPrintOptions = { significant: SIGNIFICANT },
  ): string => {
    if (unit === "mg.h/L") return exposure(value, options);
    return quantityPrint(inShown({ value, unit }), { style: "print", microgram, ...options });
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
    exact: (stated) =>
      stated.unit === "mg.h/L"
        ? exposure(stated.value, {})
        : quantityPrint(asStated(stated), { style: "print", microgram }),
    number: (stated) => numberPrint(asStated(stated).value, { significant: EXACT }),
    concentration: (mgPerL) => quantity(mgPerL, "mg/L"),
    shownFactor: factor,
    hours: (hours) => summaryReadingWords.hours(numberPrint(hours, { decimals: hours < 1 ? 2 : 1 })),
    ms: (atH) => input.analysis.clock.originMs + atH * MS_PER_HOUR,
    at,
    atClock: (ms) => `${at(ms, "dateYear")} at ${at(ms, "clock")}`,
  };
}
