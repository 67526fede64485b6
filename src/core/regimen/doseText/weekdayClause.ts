import { fail, issue, succeed } from "../../result/index.ts";
import { instantPhraseRead, WEEKDAYS } from "../../time/index.ts";
import type { ClauseRead, DoseSegment } from "./doseSegment.ts";

export type WeekdayPart = Required<Pick<DoseSegment, "weekdays" | "weekdaysPart">> & Pick<DoseSegment, "isWeekly">;

const GROUPS: Readonly<Record<string, readonly number[]>> = {
  weekday: [1, 2, 3, 4, 5],
  weekdays: [1, 2, 3, 4, 5],
  weekends: [6, 7],
};

/** "on Mon, Wed and Fri", "on Tuesday and Saturday", "on Mondays", "every Monday", "on weekdays", "at weekends". A weekday with its date is no such clause. */
export function weekdayClause(words: readonly string[], from: number): ClauseRead<WeekdayPart> {
  const before = words[from]?.toLowerCase() ?? "";
  if (!/^(on|at|every|each)$/.test(before)) return succeed(null);
  const isEvery = before === "every" || before === "each";
  const partTo = (next: number) => words.slice(from, next).join(" ").replaceAll(" ,", ",");
  const group = words[from + 1]?.toLowerCase() ?? "";
  if (Object.hasOwn(GROUPS, group) && isEvery === (group === "weekday")) {
    const weekdays = GROUPS[group] ?? [];
    return succeed({ value: { weekdays, weekdaysPart: partTo(from + 2), isWeekly: true }, next: from + 2 });
  }
  if (before === "at") return succeed(null);

  const days: number[] = [];
  let isPlural = false;
  let next = from + 1;
  for (let at = next; isWeekdayAlone(words, at); at = afterJoin(words, next)) {
    days.push(weekdayOf(words[at]));
    isPlural ||= /days$/i.test(words[at] ?? "");
    next = at + 1;
  }
  if (days.length === 0) return succeed(null);
  const weekdaysPart = partTo(next);
  if (new Set(days).size < days.length) return fail(issue("dose-text-weekday-twice", { part: weekdaysPart }));
  const isWeekly = isEvery || isPlural || days.length > 1;
  const weekdays = days.sort((a, b) => a - b);
  return succeed({ value: { weekdays, weekdaysPart, ...(isWeekly ? { isWeekly } : {}) }, next });
}

function isWeekdayAlone(words: readonly string[], at: number): boolean {
  if (weekdayOf(words[at]) === 0) return false;
  const dated = instantPhraseRead(words, at);
  return !(dated.ok && dated.value?.value.date);
}

/** Where the next weekday of a list would stand; past the end where no comma or "and" follows. */
function afterJoin(words: readonly string[], from: number): number {
  let at = from;
  if (words[at] === ",") at += 1;
  if (words[at]?.toLowerCase() === "and") at += 1;
  return at === from ? words.length : at;
}

/** 1 (Monday) to 7 for "Wednesday", "Wednesdays", "Wed", "Thurs"; 0 when the word is no weekday. */
function weekdayOf(word = ""): number {
  const said = word.toLowerCase();
  const one = said.endsWith("s") ? said.slice(0, -1) : said;
  if (one.length < 3) return 0;
  return (
    1 +
    WEEKDAYS.findIndex((name) => {
      const full = name.toLowerCase();
      return full === one || (one.length <= 4 && full.startsWith(one));
    })
  );
}
