import type { LevelResult } from "../../core/analysis/index.ts";
import { concentrationUnit } from "../../core/medicine/index.ts";
import { SUMMARY_TITLES as titles, summaryLevelWords as words } from "../../core/messages/index.ts";
import { instantMs } from "../../core/time/index.ts";
import { numberPrint } from "../../core/units/index.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryLevel, SummaryModel } from "./summaryModel.ts";
import type { SummaryPrint } from "./summaryPrint.ts";

/** Every level, also one that was left out, with what was predicted for its time. */
export function levelsText(input: SummaryInput, print: SummaryPrint): SummaryModel["levels"] {
  const rows = [...input.case.levels]
    .sort((a, b) => instantMs(a.at) - instantMs(b.at))
    .map((level) => levelRow(input, level, print));
  return { title: titles.levels, rows, remark: rows.length === 0 ? words.none : words.compared };
}

function levelRow(
  input: SummaryInput,
  level: SummaryInput["case"]["levels"][number],
  print: SummaryPrint,
): SummaryLevel {
  const result = input.analysis.levels.find(({ id }) => id === level.id);
  const typed = print.exact(level.quantity);
  const shown = concentrationUnit(input.case.medicine);
  const isInShownUnit = result !== undefined && shown === (SAME_UNIT[level.quantity.unit] ?? level.quantity.unit);
  const measured = isInShownUnit || !result ? typed : words.asTyped(typed, print.concentration(result.measured));
  const isBelow = level.kind === "below-limit";
  return {
    drawn: print.at(instantMs(level.at), "dayClock"),
    afterDose: result?.afterDoseH == null ? words.noDose : print.quantity(result.afterDoseH, "h"),
    measured: isBelow ? words.belowLimit(measured) : measured,
    predicted: result?.predicted == null ? words.noPrediction : print.concentration(result.predicted),
    difference: result && !isBelow ? differenceText(result, print) : "",
    remark: level.excluded === undefined ? "" : words.leftOut(level.excluded),
  };
}

/** Units that are the printed one by another name: nothing is added in brackets for them. */
const SAME_UNIT: Readonly<Record<string, string>> = { "ug/mL": "mg/L", "ng/mL": "ug/L" };

/** Rounded to the place the prediction is printed to, so that the row adds up for the eye. */
function differenceText(level: LevelResult, print: SummaryPrint): string {
  if (level.predicted === null || level.difference === null) return "";
  const predicted = level.predicted * print.shownFactor;
  const difference = level.difference * print.shownFactor;
  const magnitude = predicted > 0 ? Math.floor(Math.log10(predicted)) : 0;
  const decimals = Math.min(6, Math.max(0, 2 - magnitude));
  const figure = numberPrint(Math.abs(difference), { decimals });
  if (figure === "0") return figure;
  return difference > 0 ? words.more(figure) : words.less(figure);
}
