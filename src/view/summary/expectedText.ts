import type { DoseMark, OptionReadings } from "../../core/analysis/index.ts";
import {
  SUMMARY_TITLES as titles,
  windowRemarkWords,
  summaryReadingWords as words,
} from "../../core/messages/index.ts";
import { shownReadings } from "./shownReadings.ts";
import { steadyFromMs } from "./steadyFrom.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryModel, SummaryRow } from "./summaryModel.ts";
import type { SummaryPrint } from "./summaryPrint.ts";

export function expectedText(input: SummaryInput, print: SummaryPrint): SummaryModel["expected"] {
  const shown = shownReadings(input);
  if (!shown) return null;
  const { readings, patient } = shown;
  return readings.steadyState
    ? {
        title: words.titled(titles.expectedSteady, patient),
        rows: steadyRows(readings.steadyState, shown.option.doses, steadyFromMs(input, print), print),
        remark: words.chanceLeftOut,
      }
    : {
        title: words.titled(titles.expectedSpan, patient),
        rows: spanRows(readings, print),
        remark: `${readings.noSteadyState === "no-common-period" ? words.noCommonPeriod : words.noRepeat} ${words.chanceLeftOut}`,
      };
}

function steadyRows(
  steady: NonNullable<OptionReadings["steadyState"]>,
  doses: readonly DoseMark[],
  steadyMs: number | null,
  print: SummaryPrint,
): readonly SummaryRow[] {
  return [
    { label: words.highest(print.hours(steady.peakAfterDoseH)), value: print.concentration(steady.peak) },
    {
      label: isBeforeDose(steady.lowestAfterDoseH, doses)
        ? words.lowestBefore
        : words.lowestAfter(print.hours(steady.lowestAfterDoseH)),
      value: print.concentration(steady.lowest),
    },
    { label: words.average, value: print.concentration(steady.average) },
    { label: words.auc24, value: print.quantity(steady.auc24, "mg.h/L") },
    { label: words.accumulation, value: words.times(print.figure(steady.accumulation, 2)) },
    { label: words.steady90, value: print.at(steadyMs ?? print.ms(steady.steady90AtH), "dayClock") },
  ];
}

/** Half a minute: dose times are whole minutes. */
const SAME_TIME_H = 0.5 / 60;

/** Whether so many hours after a dose the next one falls. */
function isBeforeDose(afterDoseH: number, doses: readonly DoseMark[]): boolean {
  return doses.some((dose, i) => {
    const next = doses[i + 1];
    return next !== undefined && Math.abs(next.scheduledH - dose.scheduledH - afterDoseH) < SAME_TIME_H;
  });
}

function spanRows({ span }: OptionReadings, print: SummaryPrint): readonly SummaryRow[] {
  return [
    { label: words.highestAt(print.at(print.ms(span.timeOfPeakH), "dayClock")), value: print.concentration(span.peak) },
    {
      label: words.lowestAt(print.at(print.ms(span.timeOfLowestH), "dayClock")),
      value: print.concentration(span.lowest),
    },
    { label: words.average, value: print.concentration(span.average) },
    { label: words.auc24, value: print.quantity(span.auc24, "mg.h/L") },
  ];
}

/** Hours below, within and above the window over the stated span; null without a concentration window. */
export function hoursText(input: SummaryInput, print: SummaryPrint): SummaryModel["hours"] {
  const span = shownReadings(input)?.readings.span;
  const window = input.case.window;
  if (!span || !window || span.hoursBelow === null || span.hoursWithin === null || span.hoursAbove === null)
    return null;
  const fromTo = words.span(print.at(print.ms(span.fromH), "dayClock"), print.at(print.ms(span.toH), "dayClock"));
  return {
    title: words.hoursOf(titles.hours, print.number(window.low), print.exact(window.high)),
    span: window.quantity === "lowest-and-highest" ? fromTo : `${fromTo}. ${windowRemarkWords(window.quantity)}.`,
    rows: [
      { label: words.below, value: print.hours(span.hoursBelow) },
      { label: words.within, value: print.hours(span.hoursWithin) },
      { label: words.above, value: print.hours(span.hoursAbove) },
    ],
  };
}
