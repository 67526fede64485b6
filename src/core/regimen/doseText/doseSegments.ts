import { fail, type Issue, issue, type Result, succeed } from "../../result/index.ts";
import type { DoseProduct } from "../doseProduct.ts";
import { amountClause } from "./amountClause.ts";
import type { DoseSegment } from "./doseSegment.ts";
import { doseTextWords } from "./doseTextWords.ts";
import { exceptionClause } from "./exceptionClause.ts";
import { instantClause } from "./instantClause.ts";
import { refusedWord } from "./refusedWord.ts";
import { repeatClause } from "./repeatClause.ts";
import { weekdayClause } from "./weekdayClause.ts";

const FILLERS: ReadonlySet<string> = new Set(["take", "give", "of"]);
const newSegment = (): DoseSegment => ({ clocks: [], exceptions: [] });

/**
 * Reads dose text clause by clause, in any order, into one segment an amount. A second amount, after "and", "then" or a comma, begins the next segment.
 * The first word that no clause takes is refused by name.
 */
export function doseSegments(text: string, products: readonly DoseProduct[]): Result<readonly DoseSegment[]> {
  const words = doseTextWords(text);
  if (words.length === 0) return fail(issue("dose-text-empty", { expected: "300 mg every 12 h from 08:00, 10 doses" }));
  const segments = [newSegment()];
  for (let at = 0; at < words.length; ) {
    const read = clauseRead(words, at, segments, products);
    if (!read.ok) return read;
    at = read.value;
  }
  return succeed(segments);
}

function clauseRead(
  words: readonly string[],
  at: number,
  segments: DoseSegment[],
  products: readonly DoseProduct[],
): Result<number> {
  const segment = segments[segments.length - 1] ?? newSegment();
  const word = words[at] ?? "";

  if (/^\d+\/\d+$/.test(word) && /^(a|tablets?|tabs?|capsules?|caps?)$/i.test(words[at + 1] ?? "")) {
    return fail(issue("dose-text-fraction", { part: `${word} ${words[at + 1]}` }));
  }
  const product = productAt(words, at, products);
  if (product) {
    const clash = segment.product !== undefined && segment.product !== product.id;
    segment.product = product.id;
    return clash ? fail(conflict(words.slice(at, product.next))) : succeed(product.next);
  }
  const refused = refusedWord(words, at);
  if (refused) return fail(refused);
  const exception = exceptionClause(words, at);
  if (!exception.ok) return exception;
  if (exception.value) {
    segment.exceptions.push(exception.value.value);
    return succeed(exception.value.next);
  }
  const weekdays = weekdayClause(words, at);
  if (!weekdays.ok) return weekdays;
  if (weekdays.value) return merge(segment, weekdays.value.value, words, at, weekdays.value.next);
  const repeat = repeatClause(words, at);
  if (!repeat.ok) return repeat;
  if (repeat.value) return merge(segment, repeat.value.value, words, at, repeat.value.next);

  const instant = instantClause(words, at);
  if (!instant.ok) return instant;
  if (instant.value) {
    const { clocks, ...rest } = instant.value.value;
    if (clocks.length > 0 && segment.clocks.length > 0) return fail(conflict(words.slice(at, instant.value.next)));
    segment.clocks.push(...clocks);
    return merge(segment, rest, words, at, instant.value.next);
  }
  const amount = amountClause(words, at);
  if (!amount.ok) return amount;
  if (amount.value) {
    if (segment.amount === undefined) segment.amount = amount.value.value;
    else if (isJoinWord(words[at - 1])) segments.push({ ...newSegment(), amount: amount.value.value });
    else return fail(conflict(words.slice(at, amount.value.next)));
    return succeed(amount.value.next);
  }
  const isTrailing = at + 1 === words.length && word !== ",";
  if (FILLERS.has(word.toLowerCase()) || (isJoinWord(word) && !isTrailing)) return succeed(at + 1);
  return fail(
    issue("dose-text-unreadable", {
      part: word,
      expected: [
        "300 mg every 12 h from 08:00, 10 doses",
        "200 mg at 08:00 and 300 mg at 22:00 for 7 days",
        "450 mg once at 14:00",
      ],
    }),
  );
}

const isJoinWord = (word: string | undefined): boolean => /^(,|and|then)$/i.test(word ?? "");
const conflict = (part: readonly string[]): Issue => issue("dose-text-conflict", { part: part.join(" ") });

/** Adds what a clause says; a second clause of the same kind is a conflict, even if it says the same. */
function merge(
  segment: DoseSegment,
  part: Partial<DoseSegment>,
  words: readonly string[],
  at: number,
  next: number,
): Result<number> {
  const isSaid = Object.keys(part).some((key) => Object.hasOwn(segment, key));
  if (isSaid) return fail(conflict(words.slice(at, next)));
  Object.assign(segment, part);
  return succeed(next);
}

/** The product whose name (or id) stands here, the longest name first. */
function productAt(
  words: readonly string[],
  from: number,
  products: readonly DoseProduct[],
): { id: string; next: number } | null {
  const start = words[from]?.toLowerCase() === "of" ? from + 1 : from;
  const said = (text: string) => doseTextWords(text.toLowerCase());
  const matches = products.flatMap(({ id, name }) =>
    [said(name), said(id)]
      .filter((wanted) => wanted.length > 0 && wanted.every((word, i) => words[start + i]?.toLowerCase() === word))
      .map((wanted) => ({ id, next: start + wanted.length })),
  );
  return matches.sort((a, b) => b.next - a.next)[0] ?? null;
}
