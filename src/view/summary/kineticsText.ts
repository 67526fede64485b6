import type { FittedParameter, IndividualFit, Model } from "../../core/analysis/index.ts";
import { productOf } from "../../core/medicine/index.ts";
import {
  flipFlopWords,
  summaryPatientWords as patientWords,
  taughtSentence,
  SUMMARY_TITLES as titles,
  summaryReadingWords as words,
} from "../../core/messages/index.ts";
import { shownPatient } from "./shownPatient.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryModel, SummaryRow } from "./summaryModel.ts";
import { chosenOption } from "./summaryOrder.ts";
import type { SummaryPrint } from "./summaryPrint.ts";

/** The kinetic basis: of this patient with intervals, or of the typical one. */
export function kineticsText(input: SummaryInput, print: SummaryPrint): SummaryModel["kinetics"] {
  const model = input.analysis.typical;
  if (!model) return { title: titles.kinetics, rows: [], sentences: [words.noModel] };
  const isApparent = input.case.medicine.kinetics.apparent;
  const patient = shownPatient(input);
  if (patient.kind === "individual") return individualText(model, patient.fit, isApparent, print);
  return {
    title: words.titled(titles.kinetics, words.typical),
    rows: [
      ...model.parameters.map(({ symbol, figure }) => ({
        label: parameterLabel(symbol, isApparent),
        value: print.quantity(figure.value, figure.unit),
      })),
      ...(model.halfLife ? [{ label: words.halfLife, value: print.hours(model.halfLife.value) }] : []),
    ],
    sentences: flipFlopSentences(input, model, print),
  };
}

function individualText(
  model: Model,
  fit: IndividualFit,
  isApparent: boolean,
  print: SummaryPrint,
): SummaryModel["kinetics"] {
  const { halfLife } = fit;
  const flipFlop = flipFlopWords(fit.flipFlop);
  return {
    title: words.titled(titles.kinetics, words.individual),
    rows: [
      ...model.parameters.map(({ symbol, figure }): SummaryRow => {
        const own = fit.parameters.find((each) => each.symbol === symbol);
        return {
          label: parameterLabel(symbol, isApparent),
          value: own
            ? print.spread(own.posterior, own.unit)
            : patientWords.notAdjusted(print.quantity(figure.value, figure.unit)),
        };
      }),
      ...(halfLife ? [{ label: words.halfLife, value: print.hoursSpread(halfLife.posterior) }] : []),
    ],
    sentences: [
      taughtSentence(fit.parameters, fit.levelsUsed.length),
      // A share of the draws on either side is worth the room only where the data can't tell.
      ...(flipFlop !== null && fit.flipFlop?.isAmbiguous ? [flipFlop] : []),
    ],
  };
}

/** Clearance and volume by their own names, what other kinds of model have by its symbol; the details say more. */
function parameterLabel(symbol: string, isApparent: boolean): string {
  return symbol === "CL" ? words.clearance(isApparent) : symbol === "V" ? words.volume(isApparent) : symbol;
}

/** A parameter by its name: "Clearance, over bioavailability". */
export function parameterName(
  { symbol, words: name }: Pick<FittedParameter, "symbol" | "words">,
  isApparent: boolean,
): string {
  return symbol === "CL" || symbol === "V" ? parameterLabel(symbol, isApparent) : name;
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
