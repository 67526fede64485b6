import { fail, type Issue, issue, type Result, succeed } from "../result/index.ts";
import { monthNumber, twoDigits, weekdayNumber } from "./calendarWords.ts";
import { isInstant } from "./instant.ts";

/** A word of typed text; the words a phrase is read from. Commas are words of their own. */
export type PhraseWord = string;

export type PhraseDate =
  | { readonly kind: "relative"; readonly days: -1 | 0 | 1 }
  | {
      readonly kind: "calendar";
      readonly day: number;
      readonly month: number;
      readonly year?: number;
      readonly weekday?: number;
    };

/** What a phrase such as "Wed 4 March 07:30" says, before it is placed on the calendar. */
export interface InstantPhrase {
  /** A complete ISO instant was written. */
  readonly iso?: string;
  readonly date?: PhraseDate;
  /** "HH:MM" or "HH:MM:SS" */
  readonly time?: string;
  /** Which of a time that exists twice: by order or by offset ("+01:00"). */
  readonly which?: "first" | "second" | { readonly offset: string };
}

interface Taken<T> {
  readonly value: T;
  readonly next: number;
}

const RELATIVE: Readonly<Record<string, -1 | 0 | 1>> = { yesterday: -1, today: 0, tomorrow: 1 };
const DAY = /^(\d{1,2})(?:st|nd|rd|th)?$/;
const YEAR = /^(?:19[7-9]\d|2[01]\d\d)$/;
const TIME = /^([01]?\d|2[0-3]):([0-5]\d)(:[0-5]\d)?$/;
const OFFSET = /^\(?(?:utc)?([+-](?:0\d|1[0-4]):[0-5]\d)\)?$/i;

/**
 * Reads the longest phrase for an instant that starts at `words[from]`: null when none does, an issue for a form that is refused
 * (a numeric date with slashes, a 12-hour time, a time that is not on the 24-hour clock).
 */
export function instantPhraseRead(words: readonly PhraseWord[], from: number): Result<Taken<InstantPhrase> | null> {
  const word = words[from] ?? "";
  if (isInstant(word)) return succeed({ value: { iso: word }, next: from + 1 });
  const refused = refusedForm(words, from);
  if (refused) return fail(refused);

  const date = dateRead(words, from);
  let next = date?.next ?? from;
  if (date) {
    if (words[next] === ",") next += 1;
    if (words[next]?.toLowerCase() === "at") next += 1;
    const refusedTime = refusedForm(words, next);
    if (refusedTime) return fail(refusedTime);
  }
  const time = timeRead(words, next);
  if (!time) return succeed(date ? { value: { date: date.value }, next: date.next } : null);
  return succeed({ value: { ...(date ? { date: date.value } : {}), ...time.value }, next: time.next });
}

function refusedForm(words: readonly PhraseWord[], from: number): Issue | null {
  const word = words[from] ?? "";
  if (
    /^\d{1,4}[/.-]\d{1,2}([/.-]\d{1,4})?$/.test(word) &&
    !/^\d+\.\d+$/.test(word) &&
    !/^\d{4}-\d{2}-\d{2}$/.test(word)
  ) {
    return issue("instant-numeric-date", { part: word });
  }
  if (weekdayNumber(word) > 0 && dateRead(words, from) === null) return issue("instant-needs-date", { part: word });
  const after = words[from + 1]?.toLowerCase() ?? "";
  const twelve =
    /^(\d{1,2})(?::([0-5]\d))?([ap]\.?m\.?)$/i.exec(word) ??
    (/^[ap]\.?m\.?$/.test(after) ? /^(\d{1,2})(?::([0-5]\d))?$/.exec(word) : null);
  if (twelve) {
    const isAfternoon = (twelve[3] ?? after).toLowerCase().startsWith("p");
    const hour = Number(twelve[1]);
    const suggestion =
      hour >= 1 && hour <= 12 ? `${twoDigits((hour % 12) + (isAfternoon ? 12 : 0))}:${twelve[2] ?? "00"}` : null;
    return issue("instant-twelve-hour", { part: twelve[3] ? word : `${word} ${words[from + 1]}`, suggestion });
  }
  if (/^\d{1,2}:\d{1,2}(:\d{1,2})?$/.test(word) && !TIME.test(word))
    return issue("instant-no-such-time", { part: word });
  return null;
}

function timeRead(words: readonly PhraseWord[], from: number): Taken<Pick<InstantPhrase, "time" | "which">> | null {
  const match = TIME.exec(words[from] ?? "");
  if (!match) return null;
  const time = `${twoDigits(Number(match[1]))}:${match[2]}${match[3] ?? ""}`;
  const suffix = words[from + 1]?.toLowerCase() ?? "";
  if (suffix === "first" || suffix === "second") return { value: { time, which: suffix }, next: from + 2 };
  const offset = OFFSET.exec(suffix)?.[1];
  if (offset !== undefined) return { value: { time, which: { offset } }, next: from + 2 };
  return { value: { time }, next: from + 1 };
}

function dateRead(words: readonly PhraseWord[], from: number): Taken<PhraseDate> | null {
  const word = words[from]?.toLowerCase() ?? "";
  const days = RELATIVE[word];
  if (days !== undefined) return { value: { kind: "relative", days }, next: from + 1 };
  const iso = /^(\d{4})-(\d{2})-(\d{2})$/.exec(word);
  if (iso) {
    return {
      value: { kind: "calendar", year: Number(iso[1]), month: Number(iso[2]), day: Number(iso[3]) },
      next: from + 1,
    };
  }
  const weekday = weekdayNumber(word);
  let at = weekday > 0 ? from + 1 : from;
  if (weekday > 0 && words[at] === ",") at += 1;
  const dayFirst = DAY.exec(words[at] ?? "");
  const monthFirst = monthNumber(words[at] ?? "");
  const dayWord = dayFirst ?? (monthFirst > 0 ? DAY.exec(words[at + 1] ?? "") : null);
  const month = dayFirst ? monthNumber(words[at + 1] ?? "") : monthFirst;
  if (!dayWord || month === 0) return null;
  at += 2;
  const yearAt = words[at] === "," && !dayFirst ? at + 1 : at;
  const year = YEAR.test(words[yearAt] ?? "") ? Number(words[yearAt]) : undefined;
  return {
    value: {
      kind: "calendar",
      day: Number(dayWord[1]),
      month,
      ...(year === undefined ? {} : { year }),
      ...(weekday > 0 ? { weekday } : {}),
    },
    next: year === undefined ? at : yearAt + 1,
  };
}
