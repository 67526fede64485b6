import { fail, issue, type Result } from "../result/index.ts";
import { instantPhraseRead } from "./instantPhrase.ts";
import { instantPhraseResolve } from "./instantPhraseResolve.ts";

/**
 * Reads a typed instant: "2026-03-04 07:30", "4 March 2026 07:30", "Wed 4 March 07:30" (year nearest to now), "07:30" (today),
 * "yesterday 07:30". A time that exists twice takes "first", "second" or an offset after it. Nothing is guessed.
 */
export function instantRead(text: string, zone: string, nowIso: string): Result<string> {
  const words = text
    .replace(/,/g, " , ")
    .replace(/^(\s*\d{4}-\d{2}-\d{2})T(\d{1,2}:\d{2}\s*)$/, "$1 $2")
    .split(/\s+/)
    .filter((word) => word !== "");
  if (words.length === 0) return fail(issue("instant-empty"));
  const phrase = instantPhraseRead(words, 0);
  if (!phrase.ok) return phrase;
  if (!phrase.value || phrase.value.next < words.length) {
    const part = words
      .slice(phrase.value?.next ?? 0)
      .join(" ")
      .replace(/ ,/g, ",");
    return fail(issue("instant-unreadable", { text: text.trim(), part }));
  }
  return instantPhraseResolve(phrase.value.value, zone, nowIso);
}
