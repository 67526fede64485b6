import type { Analysis, OptionResult } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { benchWords, windowRemarkWords } from "../../core/messages/index.ts";
import { instantText } from "../../core/time/index.ts";
import { numberPrint, quantityPrint, unitSpoken } from "../../core/units/index.ts";
import { exposureSpoken, type ShownUnit, unitFactor } from "./shownUnit.ts";

/** One row of the readings column: a name and one printed value an option; null where the option has none. */
export interface ReadingsRow {
  readonly id: string;
  readonly name: string;
  readonly cells: readonly (ReadingCell | null)[];
}

export interface ReadingCell {
  readonly text: string;
  /** Said under it, smaller: when. */
  readonly sub?: string;
}

export interface ReadingsGroup {
  readonly id: "steady" | "span";
  readonly head: string;
  readonly rows: readonly ReadingsRow[];
}

const three = (value: number) => numberPrint(value, { significant: 3 });

/** A unit of more characters than this would break the cells. */
const LONGEST_UNIT = 5;

/** The readings of every option, side by side, in the unit shown. */
export function readingsGroups(value: Case, analysis: Analysis, unit: ShownUnit): readonly ReadingsGroup[] {
  const factor = unitFactor(value, unit);
  // A long unit stands once in the head instead of in every cell.
  const spoken = unitSpoken(unit, "screen");
  const hasChanges = (analysis.typical?.dispositions.length ?? 1) > 1;
  const isLong = spoken.length > LONGEST_UNIT;
  const concentration = (mgPerL: number) => `${three(mgPerL * factor)}${isLong ? "" : ` ${spoken}`}`;
  const exposure = (mgH: number) => `${three(mgH * factor)}${isLong ? "" : ` ${exposureSpoken(unit)}`}`;
  const hours = (h: number) => `${numberPrint(h, { decimals: 1 })} h`;
  const clock = (h: number) => instantText(analysis.clock.originMs + h * 3_600_000, value.timeZone, "dayClock");
  const row = (
    id: string,
    name: string,
    of: (option: OptionResult) => string | ReadingCell | null | undefined,
  ): ReadingsRow => ({
    id,
    name,
    cells: analysis.options.map((option) => {
      const found = of(option) ?? null;
      return typeof found === "string" ? { text: found } : found;
    }),
  });
  const settled = (
    name: string,
    id: string,
    of: (s: NonNullable<NonNullable<OptionResult["typical"]>["steadyState"]>) => string | ReadingCell,
  ) => row(id, name, (option) => option.typical?.steadyState && of(option.typical.steadyState));
  const span = (
    name: string,
    id: string,
    of: (s: NonNullable<OptionResult["typical"]>["span"]) => string | ReadingCell | null,
  ) => row(id, name, (option) => option.typical && of(option.typical.span));
  const inHours = (h: number | null) => (h === null ? null : hours(h));
  return [
    {
      id: "steady",
      head: `${hasChanges ? benchWords.steadyHeadFinal : benchWords.steadyHead}${isLong ? `; ${spoken}, AUC ${exposureSpoken(unit)}` : ""}`,
      rows: [
        settled("Highest (Cmax)", "peak", (s) => concentration(s.peak)),
        settled("after the dose (Tmax)", "peakAfterDose", (s) => hours(s.peakAfterDoseH)),
        settled("Lowest", "lowest", (s) => concentration(s.lowest)),
        settled("Average", "average", (s) => concentration(s.average)),
        settled("AUC in 24 h", "auc24", (s) => exposure(s.auc24)),
        row("halfLife", "Half-life", (option) => inHours(option.typical?.halfLifeH ?? null)),
        settled("Accumulation", "accumulation", (s) => `${three(s.accumulation)} times`),
        settled("90 % steady after", "timeTo90", (s) => ({
          text: hours(s.timeTo90H),
          sub: `from ${clock(s.steady90AtH)}`,
        })),
        row("dailyDose", "Dose in 24 h", (option) =>
          option.typical?.dailyDoseMg === null || option.typical === null
            ? null
            : breaking(
                quantityPrint({ value: option.typical.dailyDoseMg, unit: "mg" }, { style: "screen", significant: 3 }),
              ),
        ),
      ],
    },
    {
      id: "span",
      head: `${clock(analysis.clock.nowH)} to ${clock(analysis.clock.readingsToH)}, ${numberPrint(analysis.clock.readingsToH - analysis.clock.nowH, { decimals: 0 })} h${windowRemark(value)}`,
      rows: [
        span("Highest", "spanPeak", (s) => ({ text: concentration(s.peak), sub: clock(s.timeOfPeakH) })),
        span("Lowest", "spanLowest", (s) => ({ text: concentration(s.lowest), sub: clock(s.timeOfLowestH) })),
        span("Average", "spanAverage", (s) => concentration(s.average)),
        span("Below the window", "hoursBelow", (s) => inHours(s.hoursBelow)),
        span("Within the window", "hoursWithin", (s) => inHours(s.hoursWithin)),
        span("Above the window", "hoursAbove", (s) => inHours(s.hoursAbove)),
      ],
    },
  ];
}

/** Hours are always of the whole curve; a window meant for one point of it is easily misread. */
function windowRemark(value: Case): string {
  const quantity = value.window?.quantity;
  return quantity === undefined || quantity === "lowest-and-highest" || quantity === "auc24"
    ? ""
    : `. ${windowRemarkWords(quantity)}`;
}

/** In a narrow cell a unit may stand under its number. */
function breaking(text: string): string {
  return text.replaceAll("\u00a0", " ");
}
