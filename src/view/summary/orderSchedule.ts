import { weekdayList, summaryOrderWords as words } from "../../core/messages/index.ts";
import {
  type DoseLine,
  type DoseRepeat,
  doseLineEndMs,
  doseLineGapHours,
  doseLineScheduledMs,
  MOST_DOSES,
} from "../../core/regimen/index.ts";
import { instantMs, MS_PER_HOUR, wallClock } from "../../core/time/index.ts";
import { numberPrint } from "../../core/units/index.ts";

/** A day divided into more doses than this is told by its interval alone. */
const MOST_CLOCK_TIMES = 6;

/** The clock times of day at which an elapsed-hours repeat falls; empty when it does not come round to the same times each day. */
export function everyClockTimes(startMs: number, everyH: number, zone: string): readonly string[] {
  if (everyH % 24 === 0) return [wallClock(startMs, zone).time];
  const count = 24 / everyH;
  if (!Number.isInteger(count) || count > MOST_CLOCK_TIMES) return [];
  const { hour, minute } = wallClock(startMs, zone);
  const first = hour * 60 + minute;
  const minutes = Array.from({ length: count }, (_, i) => (first + i * everyH * 60) % 1_440).sort((a, b) => a - b);
  return minutes.every(Number.isInteger) ? minutes.map(clockOf) : [];
}

function clockOf(minuteOfDay: number): string {
  const two = (value: number) => String(value).padStart(2, "0");
  return `${two(Math.floor(minuteOfDay / 60))}:${two(minuteOfDay % 60)}`;
}

/** "every 12 hours, at 08:00 and 20:00"; "every day at 22:00"; "once". */
export function orderSchedule(line: DoseLine, firstMs: number, zone: string): string {
  const { repeat } = line;
  if (!repeat) return words.once;
  if ("clock" in repeat) return clockSchedule(repeat);
  const every = repeat.every.value;
  return words.every(numberPrint(every), everyClockTimes(firstMs, every, zone));
}

/** "every day at 22:00"; "on Monday, Wednesday and Friday at 08:00". */
function clockSchedule({ clock, weekdays }: Extract<DoseRepeat, { clock: string[] }>): string {
  const times = [...clock].sort();
  return weekdays ? words.onWeekdays(weekdayList(weekdays), times) : words.everyDay(times);
}

/** The same without clock times: what a regimen that is replaced is called. */
export function scheduleBrief(line: DoseLine): string {
  const { repeat } = line;
  if (!repeat) return words.once;
  return "clock" in repeat ? clockSchedule(repeat) : words.every(numberPrint(repeat.every.value), []);
}

/**
 * Where an elapsed-hours repeat leaves the clock times it is ordered by, because the clocks change.
 * null when it does not within the doses looked at.
 */
export function clockShift(
  line: DoseLine,
  scheduledMs: readonly number[],
  zone: string,
): { readonly fromMs: number; readonly clock: readonly string[] } | null {
  const [firstMs] = scheduledMs;
  if (!line.repeat || "clock" in line.repeat || firstMs === undefined) return null;
  const every = line.repeat.every.value;
  const ordered = everyClockTimes(firstMs, every, zone);
  if (ordered.length === 0) return null;
  const fromMs = scheduledMs.find((ms) => !ordered.includes(wallClock(ms, zone).time));
  return fromMs === undefined ? null : { fromMs, clock: everyClockTimes(fromMs, every, zone) };
}

/** Same product, amount and rhythm: the order goes on with what was running. */
export function isSameRegimen(a: DoseLine, b: DoseLine): boolean {
  return (
    a.product === b.product &&
    a.amount.unit === b.amount.unit &&
    a.amount.value === b.amount.value &&
    rhythm(a) === rhythm(b)
  );
}

function rhythm({ repeat, start }: DoseLine): string {
  if (!repeat) return `once ${start}`;
  if ("every" in repeat) return `every ${repeat.every.value}`;
  return `clock ${[...repeat.clock].sort().join(" ")} on ${repeat.weekdays?.join(" ") ?? "every day"}`;
}

/**
 * Whether a given line is what an order made at the now line replaces: it repeats, has begun, and its end is less than one interval back
 * (on weekdays, the longest gap between two). Up to two of its longest gaps back it still is, because a dose is often held for a level,
 * unless another repeating line began after its end.
 */
export function isRunning(line: DoseLine, lines: readonly DoseLine[], nowMs: number, zone: string): boolean {
  if (!line.repeat || instantMs(line.start) > nowMs) return false;
  const endMs = doseLineEndMs(line, zone);
  if (endMs === null || endMs + (doseLineGapHours(line) ?? 0) * MS_PER_HOUR > nowMs) return true;
  const isFollowed = lines.some(({ repeat, start }) => {
    const startMs = instantMs(start);
    return repeat !== undefined && startMs > endMs && startMs <= nowMs;
  });
  return !isFollowed && endMs + HELD_GAPS * longestGapHours(line.repeat) * MS_PER_HOUR > nowMs;
}

/** A line this many of its gaps past its last dose has been stopped, not held. Our choice. */
const HELD_GAPS = 2;

/** The most hours from one dose to the next, as the wall clock counts. */
function longestGapHours(repeat: DoseRepeat): number {
  if ("every" in repeat) return repeat.every.value;
  const times = repeat.clock.map((time) => {
    const [hour = 0, minute = 0] = time.split(":").map(Number);
    return hour + minute / 60;
  });
  const week = (repeat.weekdays ?? [1, 2, 3, 4, 5, 6, 7])
    .flatMap((day) => times.map((hours) => 24 * day + hours))
    .sort((a, b) => a - b);
  const gaps = week.map((hours, i) => (week[i + 1] ?? (week[0] ?? hours) + 168) - hours);
  return Math.max(...gaps);
}

/** When the dose after number `index` of a line is due by its schedule, were it to go on. */
export function nextDueMs(line: DoseLine, index: number, zone: string): number | null {
  const { repeat } = line;
  if (!repeat || index + 1 >= MOST_DOSES) return null;
  const goesOn: DoseRepeat =
    "every" in repeat
      ? { every: repeat.every }
      : { clock: repeat.clock, ...(repeat.weekdays && { weekdays: repeat.weekdays }) };
  return doseLineScheduledMs({ ...line, repeat: goesOn }, index + 1, zone);
}
