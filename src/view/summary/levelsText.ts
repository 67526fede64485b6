import type { LevelFit, LevelResult } from "../../core/analysis/index.ts";
import { concentrationUnit } from "../../core/medicine/index.ts";
import {
  summaryPatientWords as patientWords,
  SUMMARY_TITLES as titles,
  summaryLevelWords as words,
} from "../../core/messages/index.ts";
import { instantMs } from "../../core/time/index.ts";
import { numberPrint } from "../../core/units/index.ts";
import { type ShownPatient, shownPatient } from "./shownPatient.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryLevel, SummaryModel } from "./summaryModel.ts";
import type { SummaryPrint } from "./summaryPrint.ts";

/** Every level, also one that was left out, with what is predicted for its time, and for this patient what was forecast before it. */
export function levelsText(input: SummaryInput, print: SummaryPrint): SummaryModel["levels"] {
  const patient = shownPatient(input);
  const rows = [...input.case.levels]
    .sort((a, b) => instantMs(a.at) - instantMs(b.at))
    .map((level) => levelRow(input, level, patient, print));
  return {
    title: titles.levels,
    rows,
    remark: rows.length === 0 ? words.none : patient.kind === "individual" ? usedWords(patient) : words.compared,
    isIndividual: patient.kind === "individual",
  };
}

function usedWords({ fit }: Extract<ShownPatient, { kind: "individual" }>): string {
  return patientWords.levelsUsed(fit.levelsUsed.length, fit.levelsLeftOut.length);
}

function levelRow(
  input: SummaryInput,
  level: SummaryInput["case"]["levels"][number],
  patient: ShownPatient,
  print: SummaryPrint,
): SummaryLevel {
  const result = input.analysis.levels.find(({ id }) => id === level.id);
  const typed = print.exact(level.quantity);
  const shown = concentrationUnit(input.case.medicine);
  const isInShownUnit = result !== undefined && shown === (SAME_UNIT[level.quantity.unit] ?? level.quantity.unit);
  const measured = isInShownUnit || !result ? typed : words.asTyped(typed, print.concentration(result.measured));
  const isBelow = level.kind === "below-limit";
  const own = patient.kind === "individual" ? (result?.fit ?? null) : null;
  const predicted = own ? own.predicted.q50 : patient.kind === "individual" ? null : (result?.predicted ?? null);
  return {
    drawn: print.at(instantMs(level.at), "dayClock"),
    afterDose: result?.afterDoseH == null ? words.noDose : print.quantity(result.afterDoseH, "h"),
    measured: isBelow ? words.belowLimit(measured) : measured,
    predicted:
      predicted === null
        ? words.noPrediction
        : own
          ? print.cell(own.predicted, "mg/L")
          : print.concentration(predicted),
    difference: result && !isBelow && predicted !== null ? differenceText(result.measured, predicted, print) : "",
    residual:
      own && own.standardised !== null
        ? signed(own.standardised, numberPrint(Math.abs(own.standardised), { decimals: 1 }))
        : "",
    forecast: own && result ? forecastText(own, result, print) : "",
    remark: remarkText(level.excluded, result, patient),
    isLeftOut: level.excluded !== undefined,
  };
}

/** A level that is neither used nor left out says why. */
function remarkText(excluded: string | undefined, result: LevelResult | undefined, patient: ShownPatient): string {
  if (excluded !== undefined) return words.leftOut(excluded);
  if (patient.kind === "typical" || !result || patient.fit.levelsUsed.includes(result.id)) return "";
  return patientWords.beforeFirstDose;
}

function forecastText({ forecast }: LevelFit, { excluded }: LevelResult, print: SummaryPrint): string {
  if (!forecast) return excluded === null ? patientWords.noForecast : "";
  const { predictive, held } = forecast;
  return patientWords.forecast(print.range(predictive.q05, predictive.q95, "mg/L"), held);
}

/** Units that are the printed one by another name: nothing is added in brackets for them. */
const SAME_UNIT: Readonly<Record<string, string>> = { "ug/mL": "mg/L", "ng/mL": "ug/L" };

/** Rounded to the place the prediction is printed to, so that the row adds up for the eye. */
function differenceText(measuredMgPerL: number, predictedMgPerL: number, print: SummaryPrint): string {
  const predicted = predictedMgPerL * print.shownFactor;
  const difference = (measuredMgPerL - predictedMgPerL) * print.shownFactor;
  const magnitude = predicted > 0 ? Math.floor(Math.log10(predicted)) : 0;
  const decimals = Math.min(6, Math.max(0, 2 - magnitude));
  return signed(difference, numberPrint(Math.abs(difference), { decimals }));
}

function signed(value: number, figure: string): string {
  if (figure === "0") return figure;
  return value > 0 ? words.more(figure) : words.less(figure);
}
