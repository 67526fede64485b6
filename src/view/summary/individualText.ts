import type { FittedParameter, IndividualFit } from "../../core/analysis/index.ts";
import {
  fitWords,
  flipFlopWords,
  levelFitWords,
  summaryReadingWords,
  taughtWord,
  SUMMARY_TITLES as titles,
  summaryPatientWords as words,
} from "../../core/messages/index.ts";
import { numberPrint } from "../../core/units/index.ts";
import { fitMethodWords } from "./assumptionsText.ts";
import { parameterName } from "./kineticsText.ts";
import { shownPatient } from "./shownPatient.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryGrid, SummaryIndividual, SummaryRow } from "./summaryModel.ts";
import type { SummaryPrint } from "./summaryPrint.ts";

/** How this patient was found: every parameter before and with the levels, what each level says, and the method. */
export function individualText(input: SummaryInput, print: SummaryPrint): SummaryIndividual | null {
  const patient = shownPatient(input);
  if (patient.kind === "typical") return null;
  const { fit } = patient;
  const flipFlop = flipFlopWords(fit.flipFlop);
  return {
    title: titles.individual,
    parameters: parameterGrid(input, fit, print),
    sentences: [
      words.method(fitMethodWords(fit), numberPrint(fit.iterations)),
      ...(flipFlop === null ? [] : [flipFlop]),
    ],
    levels: levelRows(input, print),
    method: words.methodSource,
  };
}

function parameterGrid(input: SummaryInput, fit: IndividualFit, print: SummaryPrint): SummaryGrid {
  const isApparent = input.case.medicine.kinetics.apparent;
  return {
    columns: [
      words.typical,
      words.variation,
      words.mostLikely,
      words.median,
      words.interval50,
      words.interval90,
      words.taught,
    ],
    rows: [
      ...fit.parameters.map((parameter) => ({
        label: parameterName(parameter, isApparent),
        cells: parameterCells(parameter, print),
      })),
      ...(fit.halfLife
        ? [
            {
              label: summaryReadingWords.halfLife,
              cells: [
                print.quantity(fit.halfLife.typical, "h"),
                "",
                "",
                print.quantity(fit.halfLife.posterior.q50, "h"),
                print.range(fit.halfLife.posterior.q25, fit.halfLife.posterior.q75, "h"),
                print.range(fit.halfLife.posterior.q05, fit.halfLife.posterior.q95, "h"),
                "",
              ],
            },
          ]
        : []),
    ],
  };
}

function parameterCells(parameter: FittedParameter, print: SummaryPrint): readonly string[] {
  const { unit, typical, omega, mostLikely, posterior, taught } = parameter;
  return [
    print.quantity(typical, unit),
    numberPrint(omega, { decimals: 2 }),
    print.quantity(mostLikely, unit),
    print.quantity(posterior.q50, unit),
    print.range(posterior.q25, posterior.q75, unit),
    print.range(posterior.q05, posterior.q95, unit),
    words.taughtCell(taughtWord(taught), numberPrint(Math.max(0, 1 - taught) * 100, { decimals: 0 })),
  ];
}

/** What each level says: residual, what leaving it out would do, the forecast before it, whether it is usual at all. */
function levelRows({ analysis }: SummaryInput, print: SummaryPrint): readonly SummaryRow[] {
  return analysis.levels.flatMap((level) => {
    const said = levelFitWords(level, print.concentration, (mgPerL) => print.figure(mgPerL * print.shownFactor))
      // Of a level that was left out no forecast is asked for.
      .filter((sentence) => level.excluded === null || !sentence.startsWith(fitWords.noForecast))
      // A full stop after the symbol of a unit can be read as a digit.
      .map((sentence, index) => (index === 0 ? sentence : lowered(sentence)).replace(/\.$/, ""));
    return said.length === 0 ? [] : [{ label: print.at(print.ms(level.atH), "dayClock"), value: said.join("; ") }];
  });
}

function lowered(text: string): string {
  return text.charAt(0).toLowerCase() + text.slice(1);
}
