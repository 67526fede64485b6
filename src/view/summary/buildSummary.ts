import { concentrationFactor, concentrationUnit } from "../../core/medicine/index.ts";
import {
  capitalised,
  summaryDetailWords as detailWords,
  SUMMARY_STATEMENT,
  SUMMARY_TITLES,
  summaryChartWords,
  summaryPatientWords,
  WATERMARK,
  summaryHeadWords as words,
} from "../../core/messages/index.ts";
import { unitSpoken } from "../../core/units/index.ts";
import { assumptionsText } from "./assumptionsText.ts";
import { type Citations, citations, isUnverified } from "./citations.ts";
import { dosesText } from "./dosesText.ts";
import { expectedText } from "./expectedText.ts";
import { figuresText } from "./figuresText.ts";
import { individualText } from "./individualText.ts";
import { kineticsText } from "./kineticsText.ts";
import { levelsText } from "./levelsText.ts";
import { nextLevelText } from "./nextLevelText.ts";
import { noteElements } from "./noteElements.ts";
import { printRefusal } from "./printRefusal.ts";
import { shownPatient } from "./shownPatient.ts";
import { shownReadings } from "./shownReadings.ts";
import { concernsOfOption, concernText, summaryBanners } from "./summaryBanners.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryChart, SummaryDetails, SummaryModel } from "./summaryModel.ts";
import { summaryOrder } from "./summaryOrder.ts";
import { type SummaryPrint, summaryPrint } from "./summaryPrint.ts";
import { windowText } from "./windowText.ts";

/** How the figures of a case file are worked out again without a browser. */
const RECOMPUTE_COMMAND = "npm run -s recompute -- FILE";
/** Digits of the fingerprint on the first sheet; the details have all 64. */
const FINGERPRINT_SHORT = 12;

/** Concerns whose sentence the first sheet has already: in a banner, under the readings and levels, and among the assumptions. */
const SAID_ELSEWHERE: readonly string[] = [
  "dose-not-makeable",
  "levels-not-used",
  "levels-all-left-out",
  "fit-set-aside",
  "figures-pieced-together",
];

/** The printed summary as strings: pure, so that what is printed can be read and searched without a page. */
export function buildSummary(input: SummaryInput): SummaryModel {
  const print = summaryPrint(input);
  const cite = citations(input.case.medicine);
  const { case: value, analysis } = input;
  const refusal = printRefusal(input);
  const order = summaryOrder(input, print);
  const banners = summaryBanners(input, refusal, order);
  const record = words.record(value.medicine.name, value.medicine.recordVersion);
  const fingerprint = words.fingerprint(fingerprintGroups(analysis.fingerprint.slice(0, FINGERPRINT_SHORT)));
  const saved = savedWords(input, print);
  const watermark = value.demo ? WATERMARK : null;
  return {
    pageSize: input.settings.pageSize,
    heading: SUMMARY_TITLES.heading,
    label: value.label === "" ? words.unlabelled : value.label,
    person: personWords(input, print),
    printed: words.printed(print.at(input.printedAtMs, "full")),
    saved,
    running: [value.label, saved, fingerprint, ...(watermark ? [watermark] : [])]
      .filter((part) => part !== "")
      .join(" · "),
    watermark,
    marks: words.marks(banners.filter(({ gravity }) => gravity === "stop").map(({ title }) => title)),
    banners,
    order: order?.order ?? null,
    chart: chartWords(input, print),
    expected: expectedText(input, print),
    hours: windowText(input, print),
    kinetics: kineticsText(input, print),
    levels: levelsText(input, print),
    nextLevel: nextLevelText(input, cite, print),
    concerns: concernsOfOption(input)
      .filter(({ gravity, code }) => gravity === "check" && !SAID_ELSEWHERE.includes(code))
      .map(concernText),
    cautions: value.medicine.cautions.map(cite.ofStatement),
    cautionsRemark: value.medicine.cautions.some(isUnverified) ? detailWords.markRemark : detailWords.sourcesRemark,
    assumes: assumptionsText(input, print),
    preparedBy: input.settings.preparedBy.trim(),
    statement: SUMMARY_STATEMENT,
    footer: words.footer(input.programVersion, record, fingerprint),
    details: details(input, cite, print),
  };
}

function details(input: SummaryInput, cite: Citations, print: SummaryPrint): SummaryDetails {
  const { notes } = input.case;
  return {
    concerns: input.analysis.concerns.map(concernText),
    individual: individualText(input, print),
    figures: figuresText(input, cite, print),
    figuresRemark: shownPatient(input).kind === "individual" ? summaryPatientWords.figuresRemark : "",
    doses: dosesText(input, print),
    elements: noteElements(input, print),
    notes: notes.trim(),
    sources: cite.list(),
    fingerprint: fingerprintGroups(input.analysis.fingerprint),
    recompute: words.recompute(RECOMPUTE_COMMAND),
  };
}

/**
 * When the state shown was saved: on the sheet it tells a later state from an earlier one, as no count that begins anew with every opening can.
 * Which state it is says the fingerprint.
 */
function savedWords({ saving }: SummaryInput, print: SummaryPrint): string {
  const isReader = saving.status === "read-only";
  const isSaved = (isReader || saving.status === "saved") && saving.savedAt !== null;
  const when = isSaved ? words.saved(print.at(saving.savedAt, "typed")) : words.notSaved;
  return [when, ...(isReader ? [words.readOnly] : [])].join(", ");
}

/** "woman, 64 years, 58 kg, 162 cm", with what is missing said. */
function personWords({ case: { patient }, analysis }: SummaryInput, print: SummaryPrint): string {
  const { weight } = analysis.patient;
  return [
    patient.sex ? words.sex[patient.sex] : words.sexUnknown,
    patient.age ? print.exact(patient.age) : words.ageUnknown,
    weight ? print.quantity(weight.value, weight.unit, { significant: 4 }) : words.weightUnknown,
    patient.height ? print.exact(patient.height) : words.heightUnknown,
  ].join(", ");
}

function chartWords(input: SummaryInput, print: SummaryPrint): SummaryChart {
  const { case: value, analysis } = input;
  const patient = shownPatient(input);
  const span = shownReadings(input)?.readings.span;
  const own = patient.kind === "individual" ? patient.readings?.span : undefined;
  const said = [
    summaryChartWords.title(capitalised(value.medicine.name)),
    ...(own
      ? [summaryChartWords.ownBetween(print.concentration(own.lowest.q50), print.concentration(own.peak.q50))]
      : span
        ? [summaryChartWords.between(print.concentration(span.lowest), print.concentration(span.peak))]
        : []),
    ...(value.levels.length > 0 ? [summaryChartWords.levels(value.levels.length)] : []),
  ];
  const shownUnit = concentrationUnit(value.medicine);
  const shownFactor = concentrationFactor(value.medicine);
  return {
    title: said.join("; "),
    unit: unitSpoken(shownUnit, "print", input.settings.microgram),
    key: keyWords(input, patient.kind === "individual"),
    before: summaryChartWords.given,
    after: summaryChartWords.proposed,
    days: analysis.clock.midnightsH
      .filter((atH) => atH < analysis.clock.toH)
      .map((atH) => ({ atH, text: print.at(print.ms(atH), "day") })),
    levels: analysis.levels.map((level) => ({ id: level.id, text: print.figure(level.measured * shownFactor) })),
  };
}

/** What the lines of the profile are, where there is more than one. */
function keyWords({ analysis }: SummaryInput, isIndividual: boolean): string {
  if (!isIndividual) return "";
  const { forecast, missed, leftOut } = summaryChartWords;
  const forecasts = analysis.levels.flatMap(({ fit }) => (fit?.forecast ? [fit.forecast] : []));
  return [
    summaryChartWords.individual,
    ...(forecasts.length > 0 ? [forecast] : []),
    ...(forecasts.some(({ held }) => !held) ? [missed] : []),
    ...(analysis.levels.some(({ excluded }) => excluded !== null) ? [leftOut] : []),
  ].join(" ");
}

/** "7f3a 91c2 4e0d": in groups of four, to be read aloud and compared. */
export function fingerprintGroups(hex: string): string {
  return (hex.match(/.{1,4}/g) ?? []).join(" ");
}
