import type { DoseMark, OptionReadings } from "../../core/analysis/index.ts";
import type { Case, Option } from "../../core/case/index.ts";
import { productOf } from "../../core/medicine/index.ts";
import { listWords, summaryOrderWords as words } from "../../core/messages/index.ts";
import type { DoseLine } from "../../core/regimen/index.ts";
import { instantMs } from "../../core/time/index.ts";
import { type OrderLine, orderLine } from "./orderLine.ts";
import { isRunning, isSameRegimen, nextDueMs, scheduleBrief } from "./orderSchedule.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryOrder } from "./summaryModel.ts";
import type { SummaryPrint } from "./summaryPrint.ts";

export interface OrderResult {
  readonly order: SummaryOrder;
  readonly notMakeable: readonly string[];
  /** Lines without any dose to come, as sentences. */
  readonly empty: readonly string[];
}

/** The one chosen option; null when none or more than one is. */
export function chosenOption(value: Case): Option | null {
  const chosen = value.options.filter((option) => option.chosen);
  return chosen.length === 1 ? (chosen[0] ?? null) : null;
}

/** The chosen option in plain sentences; null when there is none that could be ordered. */
export function summaryOrder(input: SummaryInput, print: SummaryPrint): OrderResult | null {
  const option = chosenOption(input.case);
  if (!option || option.lines.length === 0) return null;
  const doses = input.analysis.options.find(({ id }) => id === option.id)?.doses ?? [];
  const lines = option.lines.map((line) =>
    orderLine(
      input.case,
      line,
      doses.filter((mark) => mark.lineId === line.id),
      print,
    ),
  );
  return {
    order: {
      option: words.option(option.id, option.label),
      lines: lines.map(({ line, mass }) =>
        lines.length === 1 ? line : { ...line, sentences: [words.perDose(mass), ...line.sentences] },
      ),
      sentences: [...replacedSentence(input, option.lines, print), ...totalSentences(input, option, lines, print)],
    },
    notMakeable: lines.flatMap(({ notMakeable }) => notMakeable),
    empty: lines.flatMap(({ mass, hasDoseToCome }) => (hasDoseToCome ? [] : [words.nothingLeft(mass)])),
  };
}

/** What was running at the now line, in words: null where nothing was given before it. */
export function runningText(
  { case: value, analysis }: Pick<SummaryInput, "case" | "analysis">,
  ordered: readonly DoseLine[],
  print: SummaryPrint,
): { readonly lines: readonly DoseLine[]; readonly text: string } | null {
  const nowMs = instantMs(value.now);
  const counted = analysis.given.filter(({ countedMg }) => countedMg > 0);
  const lines = value.given.filter((line) => isRunning(line, value.given, nowMs, value.timeZone));
  const named = (product: string, amount: string) =>
    ordered.some((line) => line.product === product)
      ? amount
      : words.ofProduct(productOf(value.medicine, product).name, amount);
  const at = ({ atH }: DoseMark) => print.at(print.ms(atH), "dayClock");
  /** Said where a dose is due since: nobody reads from "every 12 hours" that one was held. */
  const since = (line: DoseLine) => {
    const last = counted.findLast(({ lineId }) => lineId === line.id);
    const nextMs = last ? nextDueMs(line, last.index, value.timeZone) : null;
    return last && nextMs !== null && nextMs < nowMs ? words.since(at(last)) : "";
  };
  if (lines.length > 0) {
    const text = lines.map(
      (line) => words.running(named(line.product, print.exact(line.amount)), scheduleBrief(line)) + since(line),
    );
    return { lines, text: listWords(text) };
  }
  const last = counted.at(-1);
  return last ? { lines, text: words.lastGiven(named(last.product, print.exact(last.amount)), at(last)) } : null;
}

function replacedSentence(input: SummaryInput, ordered: readonly DoseLine[], print: SummaryPrint): readonly string[] {
  if (input.case.given.length === 0) return [words.noneGiven];
  const found = runningText(input, ordered, print);
  if (!found) return [words.noneRunning];
  const { lines, text } = found;
  if (lines.length === 0) return [words.noneRunningSince(text)];
  const isSame =
    lines.length === ordered.length && lines.every((line) => ordered.some((other) => isSameRegimen(line, other)));
  return [isSame ? words.continues(text) : words.replaces(text)];
}

/** "300 mg per dose, 600 mg per day, 10.3 mg per kg per day." */
function totalSentences(
  input: SummaryInput,
  option: Option,
  lines: readonly OrderLine[],
  print: SummaryPrint,
): readonly string[] {
  const masses = [...new Set(lines.map(({ mass }) => mass))];
  const readings = input.analysis.options.find(({ id }) => id === option.id)?.typical ?? null;
  const perDayMg = readings?.dailyDoseMg ?? null;
  const perDose = masses.length === 1 && masses[0] ? masses[0] : null;
  if (perDayMg === null) return perDose ? [words.perDose(perDose)] : [];
  const weight = input.analysis.patient.weight;
  // Labelled amounts of a salt and of the free substance don't add up: then the active part is given, and said to be so.
  const activeMg = activePerDayMg(input, option, readings);
  const perDay = `${print.quantity(activeMg ?? perDayMg, "mg", { significant: 4 })}${activeMg === null ? "" : ` ${words.active(input.case.medicine.name)}`}`;
  const perKg = weight ? print.quantity((activeMg ?? perDayMg) / weight.value, "mg") : null;
  const isAverage = option.lines.some(
    ({ repeat }) => repeat && ("every" in repeat ? 24 % repeat.every.value !== 0 : (repeat.weekdays?.length ?? 7) < 7),
  );
  const isOneStep = option.lines.every(
    ({ repeat }) => repeat && ("clock" in repeat ? repeat.days : repeat.count) === undefined,
  );
  const unknown = perKg ? [] : [words.perKgUnknown];
  if (perDose && lines.length === 1) return [words.total(perDose, perDay, perKg, isAverage), ...unknown];
  return [(isOneStep ? words.together24 : words.settlesAt)(perDay, perKg, isAverage), ...unknown];
}

/** mg of the active moiety a day where a product of the option is labelled as a salt; null where labels are active already. */
function activePerDayMg(input: SummaryInput, option: Option, readings: OptionReadings | null): number | null {
  const { medicine } = input.case;
  if (option.lines.every((line) => productOf(medicine, line.product).saltFactor === undefined)) return null;
  return readings?.activeDailyDoseMg ?? null;
}
