import { type DoseMark, type IndividualReadings, type OptionReadings, windowDrawH } from "../../core/analysis/index.ts";
import {
  neverSteadyWords,
  summaryPatientWords as patientWords,
  SUMMARY_TITLES as titles,
  summaryReadingWords as words,
} from "../../core/messages/index.ts";
import { noSteadyText } from "./noSteadyText.ts";
import { shownPatient } from "./shownPatient.ts";
import { shownReadings } from "./shownReadings.ts";
import { steadyFrom } from "./steadyFrom.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryModel, SummaryRow } from "./summaryModel.ts";
import type { SummaryPrint } from "./summaryPrint.ts";

type Steady = NonNullable<OptionReadings["steadyState"]>;
type OwnSteady = NonNullable<IndividualReadings["steadyState"]>;

/** What the chosen option comes to: at steady state, or over the days shown where there is none; for this patient where the levels say one. */
export function expectedText(input: SummaryInput, print: SummaryPrint): SummaryModel["expected"] {
  const patient = shownPatient(input);
  if (patient.kind === "individual") {
    return patient.readings && individualText(input, patient.readings, print);
  }
  const shown = shownReadings(input);
  if (!shown) return null;
  const { steadyState } = shown.readings;
  const why = patientWords.whyTypical(patient.reason);
  return steadyState
    ? {
        title: words.titled(titles.expectedSteady, words.typical),
        rows: steadyRows(input, steadyState, shown.option.doses, steadyFrom(input, print)?.ms ?? null, print),
        remark: why,
      }
    : {
        title: words.titled(titles.expectedSpan, words.typical),
        rows: spanRows(shown.readings, print),
        remark: [noSteadyText(input), why].join(" "),
      };
}

function individualText(input: SummaryInput, own: IndividualReadings, print: SummaryPrint): SummaryModel["expected"] {
  const typical = shownReadings(input);
  const { steadyState } = own;
  if (steadyState) {
    const never = neverSteadyWords(own);
    const settled = typical?.readings.steadyState;
    const when = settled && typical ? [typicalWhen(settled, typical.option.doses, print)] : [];
    return {
      title: words.titled(titles.expectedSteady, words.individual),
      rows: ownSteadyRows(input, steadyState, print),
      remark: [patientWords.spreadRemark, ...when, ...(never ? [never] : [])].join(" "),
    };
  }
  return {
    title: words.titled(titles.expectedSpan, words.individual),
    rows: ownSpanRows(own, print),
    remark: [noSteadyText(input), patientWords.spreadRemark].join(" "),
  };
}

function ownSteadyRows(input: SummaryInput, steady: OwnSteady, print: SummaryPrint): readonly SummaryRow[] {
  const { timed } = steady;
  return [
    { label: patientWords.highest, value: print.spread(steady.peak, "mg/L") },
    { label: patientWords.lowest, value: print.spread(steady.lowest, "mg/L") },
    ...timedRows(input, timed, print, (spread) => print.spread(spread, "mg/L")),
    { label: words.average, value: print.spread(steady.average, "mg/L") },
    { label: words.auc24, value: print.spread(steady.auc24, "mg.h/L") },
    { label: words.accumulation, value: print.spread(steady.accumulation, "1", words.times) },
    { label: patientWords.steady90After, value: print.waitSpread(steady.timeTo90H) },
  ];
}

function ownSpanRows({ span }: IndividualReadings, print: SummaryPrint): readonly SummaryRow[] {
  return [
    { label: patientWords.highest, value: print.spread(span.peak, "mg/L") },
    { label: patientWords.lowest, value: print.spread(span.lowest, "mg/L") },
    { label: words.average, value: print.spread(span.average, "mg/L") },
    { label: words.auc24, value: print.spread(span.auc24, "mg.h/L") },
  ];
}

/** The levels at the time after a dose that the window is about: one row where they are the same after every dose. */
function timedRows<T>(
  input: SummaryInput,
  timed: Readonly<Record<"lowest" | "highest", T>> | null,
  print: SummaryPrint,
  printed: (found: T) => string,
): readonly SummaryRow[] {
  const afterDoseH = windowDrawH(input.case);
  if (afterDoseH === null) return [];
  if (!timed) return [{ label: words.timed(print.hours(afterDoseH)), value: words.timedNever }];
  const [lowest, highest] = [printed(timed.lowest), printed(timed.highest)];
  const hours = print.hours(afterDoseH);
  return lowest === highest
    ? [{ label: words.timed(hours), value: lowest }]
    : [
        { label: words.timedLowest(hours), value: lowest },
        { label: words.timedHighest(hours), value: highest },
      ];
}

function steadyRows(
  input: SummaryInput,
  steady: Steady,
  doses: readonly DoseMark[],
  steadyMs: number | null,
  print: SummaryPrint,
): readonly SummaryRow[] {
  const { timed } = steady;
  return [
    { label: words.highest(print.hours(steady.peakAfterDoseH)), value: print.concentration(steady.peak) },
    { label: lowestWhen(steady, doses, print), value: print.concentration(steady.lowest) },
    ...timedRows(input, timed, print, print.concentration),
    { label: words.average, value: print.concentration(steady.average) },
    { label: words.auc24, value: print.quantity(steady.auc24, "mg.h/L") },
    { label: words.accumulation, value: words.times(print.figure(steady.accumulation)) },
    { label: words.steady90, value: print.at(steadyMs ?? print.ms(steady.steady90AtH), "dayClock") },
  ];
}

function lowestWhen(steady: Steady, doses: readonly DoseMark[], print: SummaryPrint): string {
  return isBeforeDose(steady.lowestAfterDoseH, doses)
    ? words.lowestBefore
    : words.lowestAfter(print.hours(steady.lowestAfterDoseH));
}

/** When the typical patient's highest and lowest come: the draws have no common hour. */
function typicalWhen(steady: Steady, doses: readonly DoseMark[], print: SummaryPrint): string {
  return patientWords.typicalWhen(words.highest(print.hours(steady.peakAfterDoseH)), lowestWhen(steady, doses, print));
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
