import type { DoseMark } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { productOf } from "../../core/medicine/index.ts";
import { summaryOrderWords as words } from "../../core/messages/index.ts";
import type { DoseLine } from "../../core/regimen/index.ts";
import { instantMs } from "../../core/time/index.ts";
import { orderAmount } from "./orderAmount.ts";
import { clockShift, orderSchedule } from "./orderSchedule.ts";
import type { SummaryOrderLine } from "./summaryModel.ts";
import type { SummaryPrint } from "./summaryPrint.ts";

export interface OrderLine {
  readonly line: SummaryOrderLine;
  /** What can't be made up from the strengths, in sentences. */
  readonly notMakeable: readonly string[];
  /** "300 mg" */
  readonly mass: string;
  readonly hasDoseToCome: boolean;
}

/** One dose line of the chosen option in plain sentences. `marks`: its doses on the clock. */
export function orderLine(value: Case, line: DoseLine, marks: readonly DoseMark[], print: SummaryPrint): OrderLine {
  const product = productOf(value.medicine, line.product);
  const amount = orderAmount(line.amount, product, value.medicine, print);
  const toCome = marks.filter((mark) => mark.countedMg > 0);
  const scheduledMs = marks.filter((mark) => mark.status !== "before-now").map((mark) => print.ms(mark.scheduledH));
  const startMs = scheduledMs[0] ?? instantMs(line.start);
  const changes = exceptionSentences(value, line, marks, print);
  return {
    line: {
      products: [...new Set([...amount.products, ...changes.products])],
      instruction: words.byMouth(amount.take, orderSchedule(line, startMs, value.timeZone)),
      sentences: [
        ...courseSentences(line, toCome, marks, print),
        ...shiftSentence(value, line, scheduledMs, print),
        ...changes.sentences,
        ...(product.swallowWhole ? [words.swallowWhole] : []),
        ...(product.form === "liquid" ? [words.measureLiquid] : []),
      ],
    },
    notMakeable: [...(amount.notMakeable ? [amount.notMakeable] : []), ...changes.notMakeable],
    mass: amount.mass,
    hasDoseToCome: toCome.length > 0,
  };
}

/** First dose, last dose or none, and doses that fell before the now line. */
function courseSentences(
  line: DoseLine,
  toCome: readonly DoseMark[],
  marks: readonly DoseMark[],
  print: SummaryPrint,
): readonly string[] {
  const before = marks.filter((mark) => mark.status === "before-now").length;
  const first = toCome[0];
  const last = toCome.at(-1);
  const isEndless =
    line.repeat !== undefined && ("clock" in line.repeat ? line.repeat.days : line.repeat.count) === undefined;
  const sentences: string[] = [];
  if (!first || !last) sentences.push(words.nothingLeft(print.exact(line.amount)));
  else if (isEndless) sentences.push(words.firstDose(print.atClock(print.ms(first.atH))), words.untilReview);
  else if (toCome.length === 1) sentences.push(words.onlyDose(print.atClock(print.ms(first.atH))));
  else {
    sentences.push(words.firstDose(print.atClock(print.ms(first.atH))));
    sentences.push(words.lastDose(toCome.length, print.atClock(print.ms(last.atH))));
  }
  if (before > 0) sentences.push(words.beforeNow(before));
  return sentences;
}

function shiftSentence(
  value: Case,
  line: DoseLine,
  scheduledMs: readonly number[],
  print: SummaryPrint,
): readonly string[] {
  const shift = clockShift(line, scheduledMs, value.timeZone);
  return shift ? [words.clockChange(print.at(shift.fromMs, "full"), shift.clock)] : [];
}

interface Changes {
  readonly sentences: readonly string[];
  readonly products: readonly string[];
  readonly notMakeable: readonly string[];
}

/** Doses to come that do not go as the line says. */
function exceptionSentences(value: Case, line: DoseLine, marks: readonly DoseMark[], print: SummaryPrint): Changes {
  const sentences: string[] = [];
  const products: string[] = [];
  const notMakeable: string[] = [];
  for (const mark of marks) {
    if (mark.status === "before-now") continue;
    const scheduled = print.at(print.ms(mark.scheduledH), "dayClock");
    if (mark.status === "missed") {
      sentences.push(words.missed(scheduled));
      continue;
    }
    if (mark.atH !== mark.scheduledH) sentences.push(words.moved(scheduled, print.at(print.ms(mark.atH), "dayClock")));
    if (mark.amount.value === line.amount.value && mark.amount.unit === line.amount.unit) continue;
    const amount = orderAmount(mark.amount, productOf(value.medicine, line.product), value.medicine, print);
    sentences.push(words.changed(scheduled, amount.named));
    products.push(...amount.products);
    if (amount.notMakeable) notMakeable.push(amount.notMakeable);
  }
  return { sentences, products, notMakeable };
}
