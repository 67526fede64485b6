import { fail, issue, type Result, succeed } from "../../result/index.ts";
import { type InstantPhrase, instantPhraseRead } from "../../time/index.ts";
import type { ClauseRead, ClockPhrase, DoseSegment } from "./doseSegment.ts";

export type InstantPart = Pick<DoseSegment, "clocks"> &
  Partial<Pick<DoseSegment, "iso" | "date" | "isDayOnly" | "startTime">>;

const FROM = /^(from|starting|start|starts|beginning)$/i;

/** "from 08:00", "from Wed 4 March 20:00", "at 08:00 and 22:00", "at 14:00 on Wed 4 March", "first dose tomorrow 08:00", "tomorrow at 08:00". */
export function instantClause(words: readonly string[], from: number): ClauseRead<InstantPart> {
  const word = words[from]?.toLowerCase() ?? "";
  const isFirstDose = word === "first" && words[from + 1]?.toLowerCase() === "dose";
  const isFrom = FROM.test(word) || isFirstDose;
  let at = from;
  if (isFrom) at += isFirstDose ? 2 : 1;
  if (/^(at|on)$/i.test(words[at] ?? "")) at += 1;
  const hasPreposition = at > from;

  const phrase = instantPhraseRead(words, at);
  if (!phrase.ok) return phrase;
  if (!phrase.value) {
    if (!hasPreposition) return succeed(null);
    const part = words.slice(from, at + 1).join(" ");
    return fail(issue("dose-text-unreadable", { part, expected: ["at 08:00", "from 08:00", "from 4 March 08:00"] }));
  }
  const { value: first, next } = phrase.value;
  const clock = clockOf(first);
  if (isFrom) return succeed({ value: { ...dateOf(first), clocks: [], ...(clock ? { startTime: clock } : {}) }, next });
  const day = { ...dateOf(first), ...(first.date || first.iso ? { isDayOnly: true as const } : {}) };
  if (!clock) return succeed({ value: { ...day, clocks: [] }, next });
  const more = moreClocks(words, next);
  if (!more.ok) return more;
  return succeed({ value: { ...day, clocks: [clock, ...more.value.clocks] }, next: more.value.next });
}

function clockOf(phrase: InstantPhrase): ClockPhrase | null {
  if (phrase.time === undefined) return null;
  return { time: phrase.time, ...(phrase.which === undefined ? {} : { which: phrase.which }) };
}

function dateOf(phrase: InstantPhrase): Partial<Pick<DoseSegment, "iso" | "date">> {
  if (phrase.iso !== undefined) return { iso: phrase.iso };
  return phrase.date === undefined ? {} : { date: phrase.date };
}

/** Further times of a list: ", 14:00 and 22:00". A comma or "and" that no time follows is left where it stands. */
function moreClocks(words: readonly string[], from: number): Result<{ clocks: ClockPhrase[]; next: number }> {
  const clocks: ClockPhrase[] = [];
  let next = from;
  for (;;) {
    let at = next;
    if (words[at] === ",") at += 1;
    if (words[at]?.toLowerCase() === "and") at += 1;
    if (at === next) return succeed({ clocks, next });
    if (words[at]?.toLowerCase() === "at") at += 1;
    if (!/^\d{1,2}:\d/.test(words[at] ?? "")) return succeed({ clocks, next });
    const phrase = instantPhraseRead(words, at);
    if (!phrase.ok) return phrase;
    const clock = phrase.value ? clockOf(phrase.value.value) : null;
    if (!phrase.value || !clock) return succeed({ clocks, next });
    clocks.push(clock);
    next = phrase.value.next;
  }
}
