import type { Traced } from "../../core/analysis/index.ts";
import { productOf } from "../../core/medicine/index.ts";
import { summaryReadingWords as readingWords, summaryDetailWords as words } from "../../core/messages/index.ts";
import { numberPrint } from "../../core/units/index.ts";
import type { Citations } from "./citations.ts";
import { parameterName } from "./kineticsText.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryFigure } from "./summaryModel.ts";
import { chosenOption } from "./summaryOrder.ts";
import type { SummaryPrint } from "./summaryPrint.ts";

/** Inputs of a formula are printed so closely that it can be worked out again by hand. */
const INPUT_SIGNIFICANT = 5;

/** Every figure the prediction stands on, with its formula, what went in and its source. */
export function figuresText(input: SummaryInput, cite: Citations, print: SummaryPrint): readonly SummaryFigure[] {
  const { patient, typical: model } = input.analysis;
  const { medicine } = input.case;
  const used = new Set([...(chosenOption(input.case)?.lines ?? []), ...input.case.given].map(({ product }) => product));
  const isApparent = medicine.kinetics.apparent;
  const figure = (name: string, traced: Traced | null | undefined) =>
    traced ? [figureText(name, traced, cite, print)] : [];
  return [
    ...figure(words.weight, patient.weight),
    ...figure(words.creatinine, patient.creatinine),
    ...figure(words.idealWeight, patient.idealWeight),
    ...figure(words.adjustedWeight, patient.clearanceWeight === "adjusted" ? patient.adjustedWeight : null),
    ...figure(words.creatinineClearance, patient.creatinineClearance),
    ...figure(
      words.phenytoinForAlbumin,
      patient.phenytoinForAlbumin?.isAlbuminLow ? patient.phenytoinForAlbumin.figure : null,
    ),
    ...(model?.parameters ?? []).flatMap((each) => figure(parameterName(each, isApparent), each.figure)),
    ...figure(words.eliminationRate, model?.kind === "one-compartment" ? model.eliminationRate : null),
    ...figure(readingWords.halfLife, model?.halfLife),
    ...(model?.products ?? [])
      .filter(({ product }) => used.has(product))
      .flatMap((each) => {
        const { name } = productOf(medicine, each.product);
        return [
          ...figure(readingWords.absorption, each.absorptionRate),
          ...each.inputFigures.flatMap((input) => figure(input.words, input.figure)),
          ...figure(readingWords.lag, each.lag),
          ...figure(readingWords.bioavailability, each.bioavailability),
        ].map((row) => ({ ...row, inputs: [name, row.inputs].filter((part) => part !== "").join("; ") }));
      }),
  ];
}

function figureText(name: string, figure: Traced, cite: Citations, print: SummaryPrint): SummaryFigure {
  return {
    name,
    value: print.quantity(figure.value, figure.unit, { significant: INPUT_SIGNIFICANT }),
    formula: formulaPrint(figure.formula),
    inputs: figure.inputs
      .map((each) => words.input(each.name, print.quantity(each.value, each.unit, { significant: INPUT_SIGNIFICANT })))
      .join("; "),
    source: cite.ofFigure(figure),
  };
}

/** A formula as it is read on paper: × for *, ÷ for /, which could be taken for a 1; comparisons and conditions in words, thousands apart. */
export function formulaPrint(formula: string): string {
  return formula
    .replace(/\s*\*\s*/g, " × ")
    .replace(/\s*\/\s*/g, " ÷ ")
    .replace(/\s*>=\s*/g, " at least ")
    .replace(/\s*<=\s*/g, " at most ")
    .replace(/\s*>\s*/g, " above ")
    .replace(/\s*<\s*/g, " below ")
    .replace(/\s*==\s*/g, " equal to ")
    .replace(/\s*\?\s*/g, ", then ")
    .replace(/\s+:\s*/g, ", else ")
    .replace(/(?<![\d.\w])\d{4,}(?![\w])/g, (whole) => numberPrint(Number(whole)));
}
