import { fail, issue, succeed } from "../../result/index.ts";
import { unitWordRead } from "../../units/index.ts";
import type { ClauseRead, DoseSegment } from "./doseSegment.ts";
import { wordCount, wordNumber } from "./wordNumber.ts";

type RepeatPart = Partial<
  Pick<DoseSegment, "once" | "everyH" | "timesPerDay" | "isDaily" | "endless" | "days" | "doses">
>;

/** How many words say "a day" from here: "daily", "a day", "per day", "each day", "every day"; 0 when none do. */
function dayWords(words: readonly string[], from: number): number {
  const [first = "", second = ""] = [words[from]?.toLowerCase(), words[from + 1]?.toLowerCase()];
  if (first === "daily") return 1;
  return /^(a|per|each|every)$/.test(first) && second === "day" ? 2 : 0;
}

/** "once", "twice daily", "3 times a day", "daily", "every 12 h", "8-hourly", "for 7 days", "10 doses", "until further notice". */
export function repeatClause(words: readonly string[], from: number): ClauseRead<RepeatPart> {
  const word = words[from]?.toLowerCase() ?? "";
  const found = (value: RepeatPart, length: number) => succeed({ value, next: from + length });

  if (word === "once" || word === "twice") {
    const length = dayWords(words, from + 1);
    if (length > 0) return found({ isDaily: true, timesPerDay: word === "once" ? 1 : 2 }, 1 + length);
    return word === "once" ? found({ once: true }, 1) : succeed(null);
  }
  const daily = dayWords(words, from);
  if (daily > 0) return found({ isDaily: true }, daily);
  if (word === "every" || word === "each") return everyClause(words, from);
  if (word === "until" && words[from + 1]?.toLowerCase() === "further" && words[from + 2]?.toLowerCase() === "notice") {
    return found({ endless: true }, 3);
  }
  const hourly = /^(\d+(?:\.\d+)?)-hourly$/.exec(word);
  if (hourly) return found({ everyH: Number(hourly[1]) }, 1);

  const at = word === "for" ? from + 1 : from;
  const count = wordCount(words[at]);
  if (count === null) return word === "for" ? forRefused(words, from) : succeed(null);
  const unit = words[at + 1]?.toLowerCase() ?? "";
  const length = at + 2 - from;
  if (/^doses?$/.test(unit)) return found({ doses: count }, length);
  if (/^days?$/.test(unit)) return found({ days: count }, length);
  if (/^weeks?$/.test(unit)) return found({ days: count * 7 }, length);
  if (word === "for") return forRefused(words, from);
  if (unit === "hourly") return found({ everyH: count }, length);
  const times = /^times?$/.test(unit) ? dayWords(words, at + 2) : 0;
  return times > 0 ? found({ isDaily: true, timesPerDay: count }, length + times) : succeed(null);
}

function forRefused(words: readonly string[], from: number): ClauseRead<RepeatPart> {
  return fail(
    issue("dose-text-unreadable", {
      part: words.slice(from, from + 3).join(" "),
      expected: ["for 7 days", "10 doses"],
    }),
  );
}

function everyClause(words: readonly string[], from: number): ClauseRead<RepeatPart> {
  const number = wordNumber(words[from + 1]);
  if (!number.ok) return number;
  const unitAt = number.value === null ? from + 1 : from + 2;
  const every = number.value ?? 1;
  const unit = unitWordRead(words[unitAt] ?? "");
  const part = words.slice(from, unitAt + 1).join(" ");
  if (every <= 0) return fail(issue("dose-text-interval", { part }));
  if (unit === "h") return succeed({ value: { everyH: every }, next: unitAt + 1 });
  const days = unit === "d" ? every : /^weeks?$/i.test(words[unitAt] ?? "") ? every * 7 : null;
  // A day is not always 24 h: the clock repeat knows single days only, so anything longer is asked for in hours.
  const second = words[from + 1]?.toLowerCase() === "other" || words[from + 1]?.toLowerCase() === "second";
  if (second && words[from + 2]?.toLowerCase() === "day") {
    return fail(issue("dose-text-every-days", { part: words.slice(from, from + 3).join(" "), expected: "every 48 h" }));
  }
  if (days !== null) return fail(issue("dose-text-every-days", { part, expected: `every ${days * 24} h` }));
  return fail(issue("dose-text-unreadable", { part, expected: ["every 12 h", "daily at 08:00"] }));
}
