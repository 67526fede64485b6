import { fail, type Issue, issue, type Result, succeed } from "../../result/index.ts";
import { instantMs, wallClock } from "../../time/index.ts";
import type { ClockPhrase, DoseSegment } from "./doseSegment.ts";

/** What kind of repeat a segment says. `time`: the clock time of the first (or only) dose, where one was named. */
export type SegmentRepeat =
  | { readonly kind: "once"; readonly time: ClockPhrase | null }
  | { readonly kind: "every"; readonly hours: number; readonly count: number | null; readonly time: ClockPhrase | null }
  | {
      readonly kind: "clock";
      readonly times: readonly string[];
      readonly weekdays: readonly number[] | null;
      readonly time: ClockPhrase | null;
    };

/** Decides between once, every so many hours, and each day (or each of some weekdays) at clock times. `clocksInText`: how many clock times all segments name together. */
export function segmentRepeat(segment: DoseSegment, clocksInText: number, zone: string): Result<SegmentRepeat> {
  const { once, everyH, isDaily, days, doses, endless, clocks, startTime, isDayOnly } = segment;
  const refuse = (code: string, data: Record<string, unknown> = {}): Result<SegmentRepeat> => fail(issue(code, data));
  const part = segment.amount?.part ?? "";

  if ([once, everyH, isDaily].filter((said) => said !== undefined).length > 1)
    return refuse("dose-text-two-repeats", { part });
  if ([days, doses, endless].filter((said) => said !== undefined).length > 1)
    return refuse("dose-text-two-lengths", { part });

  const weekdays = weekdayIssue(segment, part);
  if (weekdays) return fail(weekdays);
  const isRepeatedByClock =
    clocks.length > 0 && (days !== undefined || endless || (doses ?? 1) > 1 || (clocksInText > 1 && !isDayOnly));
  const isOnce = once || (everyH === undefined && !isDaily && doses === 1);
  if (isOnce) {
    if (days !== undefined || endless || (doses ?? 1) > 1) return refuse("dose-text-two-lengths", { part });
    if (clocks.length > 1 || (clocks.length === 1 && startTime)) return refuse("dose-text-once-times", { part });
    return succeed({ kind: "once", time: clocks[0] ?? startTime ?? null });
  }
  if (everyH !== undefined) return everyRepeat(segment, everyH, part);
  if (isDaily || segment.weekdays || isRepeatedByClock) return clockRepeat(segment, part, zone);
  return refuse("dose-text-needs-repeat", { part, expected: ["once", "daily at 08:00", "every 12 h from 08:00"] });
}

/** What can't be said beside weekdays, and a single weekday that may be one day or each week's. */
function weekdayIssue(segment: DoseSegment, part: string): Issue | null {
  const { weekdays, weekdaysPart = "", once, everyH, isDaily, days, doses, endless } = segment;
  if (!weekdays) return null;
  if (once || doses === 1) return issue("dose-text-weekday-once", { part: weekdaysPart });
  if (everyH !== undefined) return issue("dose-text-weekdays-and", { part, weekdays: weekdaysPart, hours: everyH });
  if (isDaily) return issue("dose-text-weekdays-and", { part, weekdays: weekdaysPart });
  if (segment.isDayOnly) return issue("dose-text-weekdays-day", { part: weekdaysPart });
  const hasLength = days !== undefined || doses !== undefined || endless;
  return segment.isWeekly || hasLength
    ? null
    : issue("dose-text-one-weekday", { part: weekdaysPart, weekday: weekdays[0] });
}

function everyRepeat(segment: DoseSegment, hours: number, part: string): Result<SegmentRepeat> {
  const { clocks, startTime, days, doses } = segment;
  if (clocks.length > 1 || (clocks.length === 1 && startTime))
    return fail(issue("dose-text-every-and-clocks", { part, hours }));
  // Decimal hours such as 0.1 don't divide exactly in binary; the quotient is judged to nine digits.
  const count = days === undefined ? (doses ?? null) : Number(((days * 24) / hours).toPrecision(9));
  if (count !== null && !Number.isInteger(count)) return fail(issue("dose-text-uneven-days", { days, hours }));
  return succeed({ kind: "every", hours, count, time: clocks[0] ?? startTime ?? null });
}

function clockRepeat(segment: DoseSegment, part: string, zone: string): Result<SegmentRepeat> {
  const { clocks, startTime, timesPerDay, iso } = segment;
  const which = clocks.find((clock) => clock.which !== undefined);
  if (which) return fail(issue("dose-text-daily-which", { part: which.time }));
  const startOnly = startTime?.time ?? (iso === undefined ? undefined : wallClock(instantMs(iso), zone).time);
  const isOnceADay = timesPerDay === undefined || timesPerDay === 1;
  const named = clocks.map((clock) => clock.time);
  const times = named.length === 0 && startOnly !== undefined && isOnceADay ? [startOnly] : named;

  const { weekdays = null, weekdaysPart } = segment;
  if (times.length === 0 && weekdays)
    return fail(issue("dose-text-needs-time", { part: weekdaysPart, expected: "at 08:00" }));
  if (times.length === 0) return fail(issue("dose-text-needs-clock", { part, times: timesPerDay ?? 1 }));
  const withSeconds = times.find((time) => time.length > 5);
  if (withSeconds !== undefined) return fail(issue("dose-text-seconds", { part: withSeconds }));
  if (new Set(times).size < times.length) return fail(issue("dose-text-conflict", { part: times.join(" and ") }));
  if (timesPerDay !== undefined && timesPerDay !== times.length) {
    return fail(issue("dose-text-clock-count", { times: timesPerDay, clocks: times }));
  }
  return succeed({ kind: "clock", times: [...times].sort(), weekdays, time: startTime ?? null });
}
