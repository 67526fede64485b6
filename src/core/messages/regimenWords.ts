import {
  type DoseAmount,
  type DoseLine,
  type DoseProduct,
  type DoseRepeat,
  doseLineCount,
  doseLineEndMs,
  doseLineScheduledMs,
} from "../regimen/index.ts";
import { instantMs, instantText, wallClock } from "../time/index.ts";
import { type MicrogramWord, numberPrint, quantityConvert, quantityPrint, type UnitStyle } from "../units/index.ts";

import { listWords } from "./summaryWords.ts";
import { weekdayList } from "./weekdayWords.ts";

export interface DoseSentenceContext {
  readonly zone: string;
  readonly products: readonly DoseProduct[];
  readonly style?: UnitStyle;
  readonly microgram?: MicrogramWord;
}

/** A dose line in full words, shown back before it counts and printed on the summary; no full stop at the end. */
export function doseLineSentence(line: DoseLine, context: DoseSentenceContext): string {
  const product = context.products.find((each) => each.id === line.product);
  const what = `${doseAmountWords(line.amount, product, context)} of ${product?.name ?? line.product}`;
  return [`${what} ${scheduleWords(line, context.zone)}`, ...exceptionWords(line, product, context)].join("; ");
}

/** "300 mg"; a volume with its content: "5 mL (250 mg)". */
export function doseAmountWords(
  amount: DoseAmount,
  product: DoseProduct | undefined,
  context: Pick<DoseSentenceContext, "style" | "microgram">,
): string {
  const options = { style: context.style ?? "screen", microgram: context.microgram ?? "microgram" } as const;
  const written = quantityPrint(amount, options);
  const concentration = product?.concentrationMgPerMl;
  if (amount.unit !== "mL" || concentration === undefined) return written;
  const mg = Number((quantityConvert(amount, "mL") * concentration).toPrecision(12));
  return `${written} (${quantityPrint({ value: mg, unit: "mg" }, options)})`;
}

function scheduleWords(line: DoseLine, zone: string): string {
  if (!line.repeat) return `once, on ${dayAndClock(instantMs(line.start), zone, null)}`;
  const often =
    "every" in line.repeat
      ? `every ${numberPrint(line.repeat.every.value)} ${line.repeat.every.value === 1 ? "hour" : "hours"}`
      : clockWords(line.repeat);
  const count = doseLineCount(line, zone);
  if (count === 0) return `${often}: no dose`;
  const firstMs = doseLineScheduledMs(line, 0, zone);
  const first = `first dose ${dayAndClock(firstMs, zone, null)}`;
  const endMs = doseLineEndMs(line, zone);
  if (endMs === null) return `${often}, ${first}, until further notice`;
  if (count === 1) return `${often}, only dose ${dayAndClock(firstMs, zone, null)}: 1 dose`;
  return `${often}, ${first}, last ${dayAndClock(endMs, zone, firstMs)}: ${numberPrint(count)} doses`;
}

/** "Wednesday 4 March 2026 at 20:00"; the year is left out when it is that of `afterMs`. */
function dayAndClock(ms: number, zone: string, afterMs: number | null): string {
  const isSameYear = afterMs !== null && wallClock(ms, zone).year === wallClock(afterMs, zone).year;
  return `${instantText(ms, zone, isSameYear ? "date" : "dateYear")} at ${instantText(ms, zone, "clock")}`;
}

/** "each day at 08:00", "at 08:00 on Monday, Wednesday and Friday". */
function clockWords({ clock, weekdays }: Extract<DoseRepeat, { clock: string[] }>): string {
  const times = listWords([...new Set(clock)].sort());
  return weekdays ? `at ${times} on ${weekdayList(weekdays)}` : `each day at ${times}`;
}

function exceptionWords(line: DoseLine, product: DoseProduct | undefined, context: DoseSentenceContext): string[] {
  const WORDS = { missed: "missed", late: "taken late", moved: "moved" } as const;
  return (line.except ?? []).map(({ index, status, at, amount }) => {
    const preposition = status === "moved" ? " to" : ",";
    const when =
      at === undefined ? "" : `${preposition} ${dayAndClock(instantMs(at), context.zone, instantMs(line.start))}`;
    const howMuch = amount === undefined || status === "missed" ? "" : `, ${doseAmountWords(amount, product, context)}`;
    return `dose ${index + 1} ${WORDS[status]}${when}${howMuch}`;
  });
}
