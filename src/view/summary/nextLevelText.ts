import { BEFORE_DOSE_H, type SteadyStateReadings, windowDrawH } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { chanceWords, SUMMARY_TITLES as titles, summaryNextLevelWords as words } from "../../core/messages/index.ts";
import { type DoseLine, doseLineExpand } from "../../core/regimen/index.ts";
import { instantMs, MS_PER_HOUR } from "../../core/time/index.ts";
import { quantityConvert } from "../../core/units/index.ts";
import type { Citations } from "./citations.ts";
import { noSteadyText } from "./noSteadyText.ts";
import { shownPatient } from "./shownPatient.ts";
import { shownReadings } from "./shownReadings.ts";
import { type SteadyFrom, steadyFrom } from "./steadyFrom.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryModel } from "./summaryModel.ts";
import { chosenOption } from "./summaryOrder.ts";
import type { SummaryPrint } from "./summaryPrint.ts";

const BEFORE_DOSE_MS = BEFORE_DOSE_H * MS_PER_HOUR;
const DAY_MS = 24 * MS_PER_HOUR;
/** Longer than this until steady state, and an earlier level is worth a thought. */
const FAR_DAYS = 7;
/** Longer than this, and no appointment is made: nobody stays on the same doses so long without a level. Our choice, common practice. */
const LONGEST_DAYS = 60;

export function nextLevelText(input: SummaryInput, cite: Citations, print: SummaryPrint): SummaryModel["nextLevel"] {
  return { title: titles.nextLevel, sentences: sentences(input, cite, print) };
}

/**
 * At the first dose of the chosen option at or after 90 % of steady state, or after the record's wait where that is longer, so that a level drawn
 * then is not called unsteady later: before the dose, or as long after it as the window says.
 */
function sentences(input: SummaryInput, cite: Citations, print: SummaryPrint): readonly string[] {
  const option = chosenOption(input.case);
  if (!option) return [words.noOption];
  const shown = shownReadings(input);
  if (!shown) return [words.noModel];
  const steady = steadyFrom(input, print);
  const { steadyState } = shown.readings;
  const none = noSteadyText(input) ?? (steady ? null : typicalNever(input, print));
  if (!steadyState || !steady || none !== null) return [none ?? words.noModel, words.byQuestion, words.writeTimes];
  const wait = waitOf(input, steady, cite, print);
  const nowMs = instantMs(input.case.now);
  if (wait.untilMs - nowMs > LONGEST_DAYS * DAY_MS) return [wait.tooLong, words.byQuestion, words.writeTimes];
  const untilMs = Math.max(wait.untilMs, nowMs) + (steadyState.periodH + 24) * MS_PER_HOUR;
  const doses = doseInstants(option.lines, input.case.timeZone, untilMs);
  const { window } = input.case;
  const isDue = (ms: number) => ms >= wait.untilMs && ms >= nowMs;
  // Of several doses a day only some are followed by so long a gap as a timed window asks for.
  const timed = doses.findIndex((ms, i) => isDue(ms) && window && timedDraw(window, ms, doses[i + 1] ?? ms) !== null);
  const at = timed >= 0 ? timed : doses.findIndex(isDue);
  const doseMs = doses[at];
  if (doseMs === undefined) {
    const last = doses.at(-1);
    return last === undefined
      ? [words.noModel]
      : [words.endsBefore(wait.since(print.at(wait.untilMs, "full")), print.at(last, "full")), words.byQuestion];
  }
  const since = wait.since(print.at(wait.untilMs, "dayClock"));
  return [
    drawSentence(window, doseMs, doses[at + 1], since, print),
    ...hourNever(input, steadyState, print),
    ...wait.why,
    ...neverSteady(input),
    ...farOff(doseMs - nowMs),
    ...distribution(input, print),
    words.writeTimes,
  ];
}

/** A window for a level so long after a dose, where the next dose always comes sooner. */
function hourNever({ case: value }: SummaryInput, steady: SteadyStateReadings, print: SummaryPrint): readonly string[] {
  const afterDoseH = windowDrawH(value);
  return afterDoseH === null || steady.timed ? [] : [words.hourNever(print.hours(afterDoseH))];
}

interface Wait {
  readonly untilMs: number;
  /** What the dose comes at or after. */
  readonly since: (when: string) => string;
  readonly why: readonly string[];
  readonly tooLong: string;
}

/** The longest of the typical patient's 90 %, this patient's, who may be slower, and the record's wait: which one holds is said. */
function waitOf(input: SummaryInput, steady: SteadyFrom, cite: Citations, print: SummaryPrint): Wait {
  const { longerH, typicalH, ownH } = steady;
  const steadyH = longerH ?? typicalH;
  const { steadyStateAfter } = input.case.medicine;
  const recordH = steadyStateAfter ? quantityConvert(steadyStateAfter, "h") : 0;
  if (steadyStateAfter && recordH > steadyH) {
    const [record, source] = [print.wait(recordH), cite.ofRecord(steadyStateAfter)];
    return {
      untilMs: steady.startMs + recordH * MS_PER_HOUR,
      since: words.sinceRecord,
      why: [words.recordWait(record, print.wait(steadyH), whoseWait(steady), source)],
      tooLong: words.recordTooLong(record, source),
    };
  }
  const typical = print.wait(typicalH);
  return {
    untilMs: steady.ms,
    since: words.sinceSteady,
    why: longerH === null ? [] : [words.longerWait(print.wait(longerH), typical)],
    tooLong:
      ownH === null
        ? words.tooLong(typical)
        : words.tooLongOf(
            longerH === null
              ? { typical, own: print.wait(ownH), isOwnLonger: false }
              : { typical, own: print.wait(longerH), isOwnLonger: true },
          ),
  };
}

/** Whose time to 90 % of steady state the longer one is; null where there is the typical patient alone. */
function whoseWait({ longerH, ownH }: SteadyFrom): "own" | "typical" | null {
  return ownH === null ? null : longerH === null ? "typical" : "own";
}

/** The typical patient never settles and this one does: no hour of the pattern to count from, and the wait is long. */
function typicalNever(input: SummaryInput, print: SummaryPrint): string | null {
  const patient = shownPatient(input);
  const own = patient.kind === "individual" ? patient.readings?.steadyState : null;
  return own ? words.typicalNever(print.wait(own.timeTo90H.q95)) : null;
}

function neverSteady(input: SummaryInput): readonly string[] {
  const patient = shownPatient(input);
  const share = patient.kind === "individual" ? (patient.readings?.shareNeverSteady ?? 0) : 0;
  return share > 0 ? [words.maybeNever(chanceWords(share))] : [];
}

function farOff(waitMs: number): readonly string[] {
  const days = waitMs / DAY_MS;
  return days > FAR_DAYS ? [words.farOff(String(Math.round(days)))] : [];
}

/** With two compartments a sample drawn too early says little: how long to wait after a dose at the least. */
function distribution(input: SummaryInput, print: SummaryPrint): readonly string[] {
  const model = input.analysis.typical;
  const lines = chosenOption(input.case)?.lines ?? [];
  if (model?.kind !== "two-compartment") return [];
  return [words.notBefore(print.hours(Math.max(...lines.map(({ product }) => model.distributionEndH[product] ?? 0))))];
}

function drawSentence(
  window: Case["window"],
  doseMs: number,
  nextDoseMs: number | undefined,
  since: string,
  print: SummaryPrint,
): string {
  const timed = window && timedDraw(window, doseMs, nextDoseMs ?? Number.POSITIVE_INFINITY);
  const [fromMs, toMs] = timed ?? [doseMs - BEFORE_DOSE_MS, doseMs];
  const dose = print.at(doseMs, "clock");
  const day = print.at(toMs, "dateYear");
  const isOneDay = print.at(fromMs, "dateYear") === day;
  if (timed) {
    const whichDose = print.at(doseMs, "dayClock");
    return isOneDay
      ? words.drawTimed(day, print.at(fromMs, "clock"), print.at(toMs, "clock"), whichDose, since)
      : words.drawTimedAcross(print.at(fromMs, "full"), print.at(toMs, "full"), whichDose, since);
  }
  return isOneDay
    ? words.draw(day, print.at(fromMs, "clock"), print.at(toMs, "clock"), since)
    : words.drawAcross(print.at(fromMs, "full"), print.at(toMs, "full"), dose, since);
}

/** From and to of a window whose level is drawn so long after a dose; null where it is not, or the next dose comes first. */
function timedDraw(
  { drawFrom, drawTo }: NonNullable<Case["window"]>,
  doseMs: number,
  nextDoseMs: number,
): readonly [number, number] | null {
  if (!drawFrom || !drawTo) return null;
  const fromMs = doseMs + drawFrom.value * MS_PER_HOUR;
  return fromMs >= nextDoseMs ? null : [fromMs, Math.min(doseMs + drawTo.value * MS_PER_HOUR, nextDoseMs)];
}

function doseInstants(lines: readonly DoseLine[], zone: string, untilMs: number): readonly number[] {
  return [
    ...new Set(
      lines.flatMap((line) => {
        const events = doseLineExpand(line, { zone, untilMs });
        return events.ok ? events.value.filter(({ status }) => status !== "missed").map(({ atMs }) => atMs) : [];
      }),
    ),
  ].sort((a, b) => a - b);
}
