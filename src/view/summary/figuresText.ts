import type { Traced } from "../../core/analysis/index.ts";
import { productOf } from "../../core/medicine/index.ts";
import { summaryReadingWords, summaryDetailWords as words } from "../../core/messages/summaryWords.ts";
import { shownModel } from "./kineticsText.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryFigure } from "./summaryModel.ts";
import { chosenOption } from "./summaryOrder.ts";
import type { SummaryPrint } from "./summaryPrint.ts";

/** Inputs of a formula are printed so closely that it can be worked out again by hand. */
const INPUT_SIGNIFICANT = 5;

/** Every figure the prediction stands on, with its formula, what went in and its source. */
export function figuresText(input: SummaryInput, print: SummaryPrint): readonly SummaryFigure[] {
  const { patient } = input.analysis;
  const { medicine } = input.case;
  const model = shownModel(input)?.model;
  const used = new Set([...(chosenOption(input.case)?.lines ?? []), ...input.case.given].map(({ product }) => product));
  const traced: (readonly [string, Traced | null | undefined])[] = [
    [words.weight, patient.weight],
    [words.creatinine, patient.creatinine],
    [words.bodyMassIndex, patient.bodyMassIndex],
    [words.idealWeight, patient.idealWeight],
    [words.adjustedWeight, patient.adjustedWeight],
    [words.creatinineClearance, patient.creatinineClearance],
    [summaryReadingWords.clearance(medicine.kinetics.apparent), model?.clearance],
    [summaryReadingWords.volume(medicine.kinetics.apparent), model?.volume],
    [words.eliminationRate, model?.eliminationRate],
    [summaryReadingWords.halfLife, model?.halfLife],
    ...(model?.products ?? [])
      .filter(({ product }) => used.has(product))
      .flatMap((each) => {
        const name = productOf(medicine, each.product).name;
        return [
          [summaryReadingWords.absorption(name), each.absorptionRate],
          [summaryReadingWords.lag(name), each.lag],
          [summaryReadingWords.bioavailability(name), each.bioavailability],
        ] as const;
      }),
  ];
  return traced.flatMap(([name, figure]) => (figure ? [figureText(name, figure, print)] : []));
}

function figureText(name: string, figure: Traced, print: SummaryPrint): SummaryFigure {
  return {
    name,
    value: print.quantity(figure.value, figure.unit, { significant: INPUT_SIGNIFICANT }),
    formula: formulaPrint(figure.formula),
    inputs: figure.inputs
      .map((each) => words.input(each.name, print.quantity(each.value, each.unit, { significant: INPUT_SIGNIFICANT })))
      .join("; "),
    source: words.sourceAndBasis(figure.source, figure.basis),
  };
}

/** A formula as it is read on paper: × for *, ÷ for /, which could be taken for a 1. */
export function formulaPrint(formula: string): string {
  return formula.replace(/\s*\*\s*/g, " × ").replace(/\s*\/\s*/g, " ÷ ");
}
