import { type IndividualReadings, windowDrawH } from "../../core/analysis/index.ts";
import type { TargetWindow } from "../../core/case/index.ts";
import {
  chanceWords,
  lowestBeforeWords,
  neverSteadyWords,
  summaryPatientWords as patientWords,
  SUMMARY_TITLES as titles,
  windowChanceWords,
  windowRemarkWords,
  summaryReadingWords as words,
} from "../../core/messages/index.ts";
import { shownPatient } from "./shownPatient.ts";
import { shownReadings } from "./shownReadings.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryModel } from "./summaryModel.ts";
import type { SummaryPrint } from "./summaryPrint.ts";

/** Hours below, within and above the window over the stated span, and for this patient the chances; null without what they are about. */
export function windowText(input: SummaryInput, print: SummaryPrint): SummaryModel["hours"] {
  const patient = shownPatient(input);
  return patient.kind === "individual" ? individualText(input, patient.readings, print) : typicalText(input, print);
}

function typicalText(input: SummaryInput, print: SummaryPrint): SummaryModel["hours"] {
  const span = shownReadings(input)?.readings.span;
  const { window } = input.case;
  if (!span || !window || span.hoursBelow === null || span.hoursWithin === null || span.hoursAbove === null)
    return null;
  return {
    title: words.hoursOf(titles.hours, print.number(window.low), print.exact(window.high)),
    span: spanWords(window, span, print),
    columns: [],
    rows: [
      { label: words.below, cells: [print.hours(span.hoursBelow)] },
      { label: words.within, cells: [print.hours(span.hoursWithin)] },
      { label: words.above, cells: [print.hours(span.hoursAbove)] },
    ],
  };
}

const SIDES = ["below", "within", "above"] as const;
const HOURS = { below: "hoursBelow", within: "hoursWithin", above: "hoursAbove" } as const;

function individualText(
  input: SummaryInput,
  readings: IndividualReadings | null,
  print: SummaryPrint,
): SummaryModel["hours"] {
  const { window } = input.case;
  if (!readings || !window) return null;
  const { span, steadyChance } = readings;
  const steady = steadyChance;
  const overSpan = span.chance;
  const hasHours = SIDES.every((side) => span[HOURS[side]] !== null);
  if (!steady && !overSpan && !hasHours) return null;
  return {
    title: patientWords.windowChance(print.number(window.low), print.exact(window.high)),
    span: [
      ...(steady || overSpan
        ? [patientWords.chanceOf(windowChanceWords(window.quantity, windowDrawH(input.case)))]
        : []),
      ...(overSpan || hasHours ? [patientWords.overSpan(spanWords(window, span, print, hasHours))] : []),
      // With steady-state figures it stands beside those.
      ...(readings.steadyState ? [] : sentence(neverSteadyWords(readings))),
      ...sentence(lowestBeforeWords(window.quantity, span)),
    ].join(" "),
    columns: [
      ...(steady ? [patientWords.chanceSteady] : []),
      ...(overSpan ? [patientWords.chanceSpan] : []),
      ...(hasHours ? [patientWords.hoursColumn] : []),
    ],
    rows: SIDES.map((side) => {
      const hours = span[HOURS[side]];
      return {
        label: words[side],
        cells: [
          ...(steady ? [chanceWords(steady[side])] : []),
          ...(overSpan ? [chanceWords(overSpan[side])] : []),
          ...(hasHours && hours ? [print.hoursCell(hours)] : []),
        ],
      };
    }),
  };
}

const sentence = (found: string | null): readonly string[] => (found === null ? [] : [found]);

function spanWords(
  window: TargetWindow,
  span: { readonly fromH: number; readonly toH: number },
  print: SummaryPrint,
  hasHours = true,
): string {
  const fromTo = words.span(print.at(print.ms(span.fromH), "dayClock"), print.at(print.ms(span.toH), "dayClock"));
  return window.quantity === "lowest-and-highest" || !hasHours ? fromTo : `${fromTo}. ${windowRemarkWords(window)}.`;
}
