import { Temporal } from "temporal-polyfill";
import { fail, type Issue, issue, type Result, succeed } from "../result/index.ts";
import { WEEKDAYS } from "./calendarWords.ts";
import { clockInstant } from "./clockInstant.ts";
import { instantIso, instantMs } from "./instant.ts";
import type { InstantPhrase, PhraseDate } from "./instantPhrase.ts";
import { wallClock } from "./wallClock.ts";

/** The calendar date ("YYYY-MM-DD") a phrase's date means; without a year, the one nearest to now. */
function dateResolve(date: PhraseDate, zone: string, nowIso: string): Result<string> {
  const today = Temporal.PlainDate.from(wallClock(instantMs(nowIso), zone).date);
  if (date.kind === "relative") return succeed(today.add({ days: date.days }).toString());
  const { day, month, weekday } = date;
  const years = date.year === undefined ? [today.year, today.year - 1, today.year + 1] : [date.year];
  const days = years.flatMap((year) => {
    try {
      return [Temporal.PlainDate.from({ year, month, day }, { overflow: "reject" })];
    } catch {
      return [];
    }
  });
  const distance = (found: Temporal.PlainDate) => Math.abs(today.until(found).days);
  const nearest = days.sort((a, b) => distance(a) - distance(b))[0];
  if (!nearest)
    return fail(issue("instant-no-such-date", { day, month, ...(date.year === undefined ? {} : { year: date.year }) }));
  if (weekday !== undefined && nearest.dayOfWeek !== weekday) {
    const said = WEEKDAYS[weekday - 1];
    return fail(issue("instant-weekday", { date: nearest.toString(), said, actual: WEEKDAYS[nearest.dayOfWeek - 1] }));
  }
  return succeed(nearest.toString());
}

/** Places a phrase on the calendar. A phrase without a date takes `dateOfTime`; one without a time is an issue. */
export function instantPhraseResolve(
  phrase: InstantPhrase,
  zone: string,
  nowIso: string,
  dateOfTime?: string,
): Result<string> {
  if (phrase.iso !== undefined) return succeed(instantIso(instantMs(phrase.iso), zone));
  const date = phrase.date
    ? dateResolve(phrase.date, zone, nowIso)
    : succeed(dateOfTime ?? wallClock(instantMs(nowIso), zone).date);
  if (!date.ok) return date;
  if (phrase.time === undefined) return fail(issue("instant-needs-time", { date: date.value }));
  return timeResolve(date.value, phrase.time, phrase.which, zone);
}

function timeResolve(date: string, time: string, which: InstantPhrase["which"], zone: string): Result<string> {
  const plain = clockInstant(date, time, zone);
  if (which === undefined) return plain;
  const candidates = plain.ok ? [plain.value] : candidatesOf(plain.issues);
  if (!plain.ok && plain.issues[0]?.code !== "clock-twice") return plain;
  if (typeof which === "object") {
    const match = candidates.find((candidate) => candidate.endsWith(which.offset));
    return match
      ? succeed(match)
      : fail(issue("instant-offset", { date, time, zone, offset: which.offset, candidates }));
  }
  const [first = "", second] = candidates;
  if (second === undefined) return fail(issue("instant-once", { date, time, zone, which }));
  return succeed(which === "first" ? first : second);
}

function candidatesOf(issues: readonly Issue[]): readonly string[] {
  const candidates = issues[0]?.data.candidates;
  return Array.isArray(candidates) ? candidates.map(String) : [];
}
