import { fail, issue, type Result, succeed } from "../result/index.ts";
import type { DoseLine } from "./doseLine.ts";
import { doseLineExpand, isEndlessLine } from "./doseLineExpand.ts";
import type { DoseSegment, DoseTextContext } from "./doseText/doseSegment.ts";
import { doseSegments } from "./doseText/doseSegments.ts";
import { segmentAmount } from "./doseText/segmentAmount.ts";
import { segmentExceptions } from "./doseText/segmentExceptions.ts";
import { segmentRepeat } from "./doseText/segmentRepeat.ts";
import { repeatFrom, segmentStart } from "./doseText/segmentStart.ts";
import { sharedClauses } from "./doseText/sharedClauses.ts";

/**
 * Reads a regimen as a person writes it, one line an amount: "300 mg every 12 h from 08:00, 10 doses",
 * "200 mg at 08:00 and 300 mg at 22:00 for 7 days", "450 mg once at 14:00". The grammar: docs/dose-text.md.
 * Nothing is guessed: what can't be read, is missing, or could be meant two ways is an issue that names the part.
 */
export function doseTextRead(text: string, context: DoseTextContext): Result<DoseLine[]> {
  const said = doseSegments(text, context.products);
  if (!said.ok) return said;
  const segments = sharedClauses(said.value);
  if (!segments.ok) return segments;
  const clocksInText = segments.value.reduce((count, segment) => count + segment.clocks.length, 0);
  const lines: DoseLine[] = [];
  for (const segment of segments.value) {
    const line = segmentLine(segment, clocksInText, context);
    if (!line.ok) return line;
    lines.push(line.value);
  }
  return succeed(lines);
}

function segmentLine(segment: DoseSegment, clocksInText: number, context: DoseTextContext): Result<DoseLine> {
  const productId = segment.product ?? context.defaultProduct;
  const product = context.products.find((each) => each.id === productId);
  if (!product) throw new RangeError(`context.defaultProduct: no product "${productId}" among the products`);

  if (!segment.amount) return fail(issue("dose-text-needs-amount", { expected: "300 mg" }));
  const amount = segmentAmount(segment.amount, product);
  if (!amount.ok) return amount;
  const said = segmentRepeat(segment, clocksInText, context.zone);
  if (!said.ok) return said;
  const start = segmentStart(segment, said.value, context);
  if (!start.ok) return start;
  const repeat = repeatFrom(segment, said.value, start.value, context.zone);
  if (!repeat.ok) return repeat;

  const plain: DoseLine = {
    id: context.newId(),
    product: product.id,
    amount: amount.value,
    start: start.value,
    ...(repeat.value ? { repeat: repeat.value } : {}),
  };
  const except = segmentExceptions(segment.exceptions, plain, product, context);
  if (!except.ok) return except;
  const line = except.value.length > 0 ? { ...plain, except: except.value } : plain;
  if (isEndlessLine(line)) return succeed(line);
  // A line with an end is laid out at once, so that a clock time that does not exist is said now and not on the bench.
  const laidOut = doseLineExpand(line, { zone: context.zone, untilMs: Number.POSITIVE_INFINITY });
  return laidOut.ok ? succeed(line) : laidOut;
}
