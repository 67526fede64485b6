import {
  summaryReadingWords,
  SUMMARY_TITLES as titles,
  summaryNextLevelWords as words,
} from "../../core/messages/index.ts";
import { type DoseLine, doseLineExpand } from "../../core/regimen/index.ts";
import { instantMs, MS_PER_HOUR } from "../../core/time/index.ts";
import { shownModel } from "./kineticsText.ts";
import { shownReadings } from "./shownReadings.ts";
import { steadyFromMs } from "./steadyFrom.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryModel } from "./summaryModel.ts";
import { chosenOption } from "./summaryOrder.ts";
import type { SummaryPrint } from "./summaryPrint.ts";

/** A before-dose sample is drawn within this long before the dose (common practice). */
const BEFORE_DOSE_MS = 0.5 * MS_PER_HOUR;

export function nextLevelText(input: SummaryInput, print: SummaryPrint): SummaryModel["nextLevel"] {
  return { title: titles.nextLevel, sentences: sentences(input, print) };
}

/** Before the first dose of the chosen option at or after 90 % of steady state. */
function sentences(input: SummaryInput, print: SummaryPrint): readonly string[] {
  const option = chosenOption(input.case);
  if (!option) return [words.noOption];
  const shown = shownReadings(input);
  if (!shown) return [words.noModel];
  const { steadyState, noSteadyState } = shown.readings;
  if (!steadyState) {
    const reason =
      noSteadyState === "dose-rate-at-or-above-vmax"
        ? summaryReadingWords.neverSteady
        : noSteadyState === "no-common-period"
          ? summaryReadingWords.noCommonPeriod
          : summaryReadingWords.noRepeat;
    return [reason, words.byQuestion, words.writeTimes];
  }
  const nowMs = instantMs(input.case.now);
  const steadyMs = steadyFromMs(input, print) ?? print.ms(steadyState.steady90AtH);
  const untilMs = Math.max(steadyMs, nowMs) + (steadyState.periodH + 24) * MS_PER_HOUR;
  const doses = doseInstants(option.lines, input.case.timeZone, untilMs);
  const doseMs = doses.find((ms) => ms >= steadyMs && ms >= nowMs);
  const steady = print.at(steadyMs, "full");
  if (doseMs === undefined) {
    const last = doses.at(-1);
    return last === undefined ? [words.noModel] : [words.endsBefore(steady, print.at(last, "full")), words.byQuestion];
  }
  return [
    drawSentence(doseMs, print.at(steadyMs, "dayClock"), print),
    ...farOff(doseMs - nowMs),
    ...distribution(input, print),
    words.writeTimes,
  ];
}

/** Longer than this until steady state, and an earlier level is worth a thought. */
const FAR_DAYS = 7;

function farOff(waitMs: number): readonly string[] {
  const days = waitMs / (24 * MS_PER_HOUR);
  return days > FAR_DAYS ? [words.farOff(String(Math.round(days)))] : [];
}

/** With two compartments a sample drawn too early says little: how long to wait after a dose at the least. */
function distribution(input: SummaryInput, print: SummaryPrint): readonly string[] {
  const model = shownModel(input)?.model;
  const lines = chosenOption(input.case)?.lines ?? [];
  if (model?.kind !== "two-compartment") return [];
  return [words.notBefore(print.hours(Math.max(...lines.map(({ product }) => model.distributionEndH[product] ?? 0))))];
}

function drawSentence(doseMs: number, steady: string, print: SummaryPrint): string {
  const fromMs = doseMs - BEFORE_DOSE_MS;
  const day = print.at(doseMs, "dateYear");
  return print.at(fromMs, "dateYear") === day
    ? words.draw(day, print.at(fromMs, "clock"), print.at(doseMs, "clock"), steady)
    : words.drawAcross(print.at(fromMs, "full"), print.at(doseMs, "full"), print.at(doseMs, "clock"), steady);
}

function doseInstants(lines: readonly DoseLine[], zone: string, untilMs: number): readonly number[] {
  return lines
    .flatMap((line) => {
      const events = doseLineExpand(line, { zone, untilMs });
      return events.ok ? events.value.filter(({ status }) => status !== "missed").map(({ atMs }) => atMs) : [];
    })
    .sort((a, b) => a - b);
}
