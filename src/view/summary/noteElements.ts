import type { Case } from "../../core/case/index.ts";
import {
  listWords,
  NOT_RECORDED,
  summaryDetailWords,
  windowAboutWords,
  summaryElementWords as words,
} from "../../core/messages/index.ts";
import { instantMs } from "../../core/time/index.ts";
import { kidneyWords } from "./assumptionsText.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryRow } from "./summaryModel.ts";
import { chosenOption, runningText } from "./summaryOrder.ts";
import type { SummaryPrint } from "./summaryPrint.ts";

/**
 * What a note on a pharmacokinetic question should contain and does not stand elsewhere on the summary,
 * after ASHP's statement on clinical pharmacokinetic monitoring and published request requirements (docs/summary.md).
 * What the case does not say is printed as not recorded, never left blank.
 */
export function noteElements(input: SummaryInput, print: SummaryPrint): readonly SummaryRow[] {
  const { case: value, analysis } = input;
  const { medicine } = value;
  const factors = (...kinds: Factor["kind"][]) => factorWords(value, kinds, print);
  const before = runningText(input, chosenOption(value)?.lines ?? [], print);
  const first = analysis.given.find(({ countedMg }) => countedMg > 0);
  const missed = analysis.given.filter(({ status }) => status === "missed").length;
  const rows: readonly (readonly [string, string])[] = [
    [words.purpose, NOT_RECORDED],
    [words.assay, words.assayUnknown(medicine.matrix)],
    [words.regimen, before ? (before.lines.length > 0 ? before.text : words.noneRunning(before.text)) : NOT_RECORDED],
    [words.duration, first ? words.durationFrom(print.at(print.ms(first.atH), "day")) : NOT_RECORDED],
    [words.salt, NOT_RECORDED],
    [words.steady, NOT_RECORDED],
    [words.kidney, kidneyWords(input, print)],
    [words.liver, NOT_RECORDED],
    [words.albumin, latest(value, "albumin", print)],
    [words.haematocrit, NOT_RECORDED],
    [words.pregnancy, NOT_RECORDED],
    [words.smoking, factors("smoking")],
    [words.interactions, factors("interacting-medicine")],
    [words.meals, factors("meal", "vomiting", "other")],
    [words.adherence, analysis.given.length > 0 ? words.adherenceMissed(missed, analysis.given.length) : NOT_RECORDED],
    [words.response, NOT_RECORDED],
    [words.target, value.window ? targetWords(value.window, print) : NOT_RECORDED],
    [words.interpretation, NOT_RECORDED],
    [words.currentExposure, NOT_RECORDED],
    [words.monitoring, NOT_RECORDED],
    [words.communication, NOT_RECORDED],
    [words.patientTold, NOT_RECORDED],
  ];
  return rows.map(([label, text]) => ({ label, value: text }));
}

type Factor = Case["patient"]["factors"][number];

function factorWords(value: Case, kinds: readonly Factor["kind"][], print: SummaryPrint): string {
  const when = (instant: string) => print.at(instantMs(instant), "dayClock");
  const found = value.patient.factors.filter(({ kind }) => kinds.includes(kind));
  if (found.length === 0) return NOT_RECORDED;
  return listWords(
    found.map(({ detail, from, to }) =>
      to ? words.factorUntil(detail, when(from), when(to)) : words.factor(detail, when(from)),
    ),
  );
}

function latest(value: Case, kind: "albumin", print: SummaryPrint): string {
  const nowMs = instantMs(value.now);
  const found = value.patient.observations
    .filter((each) => each.kind === kind && instantMs(each.at) <= nowMs)
    .sort((a, b) => instantMs(a.at) - instantMs(b.at))
    .at(-1);
  return found
    ? summaryDetailWords.measuredAt(print.exact(found.quantity), print.at(instantMs(found.at), "dayClock"))
    : NOT_RECORDED;
}

export function targetWords(window: NonNullable<Case["window"]>, print: SummaryPrint): string {
  return summaryDetailWords.window(
    windowAboutWords(window),
    print.number(window.low),
    print.exact(window.high),
    window.basis === "" ? NOT_RECORDED : window.basis,
  );
}
