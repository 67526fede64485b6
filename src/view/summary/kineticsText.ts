import type { Model } from "../../core/analysis/index.ts";
import { productOf } from "../../core/medicine/index.ts";
import { SUMMARY_TITLES as titles, summaryReadingWords as words } from "../../core/messages/index.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryModel } from "./summaryModel.ts";
import { chosenOption } from "./summaryOrder.ts";
import type { SummaryPrint } from "./summaryPrint.ts";

/** The model the sheet is worked out with, and what its readings are called. */
export function shownModel(input: SummaryInput): { readonly model: Model; readonly patient: string } | null {
  const { typical } = input.analysis;
  return typical ? { model: typical, patient: words.typical } : null;
}

export function kineticsText(input: SummaryInput, print: SummaryPrint): SummaryModel["kinetics"] {
  const shown = shownModel(input);
  if (!shown) return { title: titles.kinetics, rows: [], sentences: [words.noModel] };
  const { model, patient } = shown;
  const isApparent = input.case.medicine.kinetics.apparent;
  return {
    title: words.titled(titles.kinetics, patient),
    rows: [
      ...parameterRows(model, isApparent, print),
      ...(model.halfLife ? [{ label: words.halfLife, value: print.hours(model.halfLife.value) }] : []),
    ],
    sentences: flipFlopSentences(input, model, print),
  };
}

/** Clearance and volume by their own names, what other kinds of model have by its symbol; the details say more. */
function parameterRows(model: Model, isApparent: boolean, print: SummaryPrint) {
  return model.parameters.map(({ symbol, figure }) => ({
    label: symbol === "CL" ? words.clearance(isApparent) : symbol === "V" ? words.volume(isApparent) : symbol,
    value: print.quantity(figure.value, figure.unit),
  }));
}

/** Which of the two half-lives the model takes for elimination, for every modified-release product in use. */
function flipFlopSentences(input: SummaryInput, model: Model, print: SummaryPrint): readonly string[] {
  return modifiedProducts(input).flatMap((id) => {
    const assumed = model.products.find(({ product }) => product === id)?.readings?.assumed;
    if (!assumed) return [];
    const { name } = productOf(input.case.medicine, id);
    return [words.flipFlop(name, print.hours(assumed.eliminationHalfLife), print.hours(assumed.absorptionHalfLife))];
  });
}

function modifiedProducts(input: SummaryInput): readonly string[] {
  const used = [...(chosenOption(input.case)?.lines ?? []), ...input.case.given].map(({ product }) => product);
  return [...new Set(used)].filter((id) => productOf(input.case.medicine, id).release === "modified");
}
