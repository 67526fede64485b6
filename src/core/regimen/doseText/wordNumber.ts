import { type Result, succeed } from "../../result/index.ts";
import { numberRead } from "../../units/index.ts";

const WORDS = ["one", "two", "three", "four", "five", "six", "seven", "eight", "nine", "ten", "eleven", "twelve"];

/** A number written in digits (strictly: see `numberRead`) or as a word up to twelve; null when the word is none. */
export function wordNumber(word: string | undefined): Result<number | null> {
  const at = WORDS.indexOf(word?.toLowerCase() ?? "");
  if (at >= 0) return succeed(at + 1);
  if (word === undefined || !/^[-+\u2010-\u2015\u2212]?[.,]?\p{Nd}/u.test(word) || word.includes(":"))
    return succeed(null);
  return numberRead(word);
}

/** As `wordNumber`, but only a whole number of at least 1. */
export function wordCount(word: string | undefined): number | null {
  const number = wordNumber(word);
  return number.ok && number.value !== null && Number.isInteger(number.value) && number.value >= 1
    ? number.value
    : null;
}
