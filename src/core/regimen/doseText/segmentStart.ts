import { fail, issue, type Result, succeed } from "../../result/index.ts";
import { instantIso, instantMs, instantPhraseResolve, MS_PER_HOUR, wallClock } from "../../time/index.ts";
import type { DoseLine, DoseRepeat } from "../doseLine.ts";
import { doseLineCount, doseLineEndMs, doseLineScheduledMs } from "../doseLineEndMs.ts";
import { MOST_DOSES } from "../doseLineExpand.ts";
import type { DoseSegment, DoseTextContext } from "./doseSegment.ts";
import { floatingStart } from "./floatingStart.ts";
import type { SegmentRepeat } from "./segmentRepeat.ts";

const HOURS_PER_DAY = 24;
const DAYS_PER_WEEK = 7;

type ClockRepeat = Extract<SegmentRepeat, { kind: "clock" }>;

/** The instant a segment starts, from what it says of day and time; a missing day is placed by `floatingStart`. */
export function segmentStart(segment: DoseSegment, repeat: SegmentRepeat, context: DoseTextContext): Result<string> {
  const { zone, nowIso } = context;
  if (segment.iso !== undefined) return succeed(instantIso(instantMs(segment.iso), zone));
  const time = repeat.time ?? firstClock(segment, repeat);
  if (!time) return withoutTime(segment, repeat, context);
  const on = (date?: string) =>
    instantPhraseResolve({ ...time, ...(segment.date ? { date: segment.date } : {}) }, zone, nowIso, date);
  if (segment.date) return on();

  const weekdays = repeat.kind === "clock" ? repeat.weekdays : null;
  if (repeat.kind === "clock" && context.lane === "option" && repeat.time === null)
    return firstOfClocks(repeat, context);
  // Days that are no whole weeks hold more or fewer of the weekdays, depending on where they begin.
  const { days } = segment;
  if (weekdays && context.lane === "given" && days !== undefined && days % DAYS_PER_WEEK !== 0)
    return fail(issue("dose-text-needs-day", { expected: "from 4 March 08:00" }));
  return floatingStart(
    {
      startOn: (date) => on(date),
      endFrom: (start) => lineEnd(segment, repeat, start, zone),
      lengthMs: lengthHours(segment, repeat) * MS_PER_HOUR,
      weekdays,
    },
    context,
  );
}

function withoutTime(
  segment: DoseSegment,
  repeat: SegmentRepeat,
  { zone, nowIso, lane }: DoseTextContext,
): Result<string> {
  // A single dose of an option that names no time is meant now; it is shown back with its clock time.
  if (repeat.kind === "once" && !segment.date && lane === "option") return succeed(instantIso(instantMs(nowIso), zone));
  const part = segment.amount?.part ?? "";
  const expected = repeat.kind === "once" ? "at 08:00" : "from 08:00";
  return fail(issue("dose-text-needs-time", { part, expected }));
}

/**
 * The clock time a clock repeat starts with where none is named: the first of the day, so that whole days follow;
 * for so many doses, the one from which they end with a day.
 */
function firstClock({ doses }: DoseSegment, repeat: SegmentRepeat): { time: string } | null {
  if (repeat.kind !== "clock") return null;
  const perDay = repeat.times.length;
  const skipped = doses === undefined ? 0 : (perDay - (doses % perDay)) % perDay;
  const time = repeat.times[skipped];
  return time === undefined ? null : { time };
}

/** An option's first dose: the earliest of the day's times that comes at or after the now line. */
function firstOfClocks({ times, weekdays }: ClockRepeat, context: DoseTextContext): Result<string> {
  const starts = times.map((time) =>
    floatingStart(
      {
        startOn: (date) => instantPhraseResolve({ time }, context.zone, context.nowIso, date),
        endFrom: () => null,
        lengthMs: 0,
        weekdays,
      },
      context,
    ),
  );
  const refused = starts.find((start) => !start.ok);
  if (refused) return refused;
  const found = starts.flatMap((start) => (start.ok ? [start.value] : []));
  return succeed(found.reduce((first, start) => (instantMs(start) < instantMs(first) ? start : first)));
}

function lengthHours({ days, doses }: DoseSegment, repeat: SegmentRepeat): number {
  if (repeat.kind === "once") return 0;
  if (repeat.kind === "every") return ((repeat.count ?? 1) - 1) * repeat.hours;
  const dosingDays = Math.ceil((doses ?? 1) / repeat.times.length);
  const spanDays = repeat.weekdays ? Math.ceil(dosingDays / repeat.weekdays.length) * DAYS_PER_WEEK : dosingDays;
  return (days ?? spanDays) * HOURS_PER_DAY;
}

/** The repeat as it stands in a dose line, for a line with this start. */
export function repeatFrom(
  segment: DoseSegment,
  repeat: SegmentRepeat,
  start: string,
  zone: string,
): Result<DoseRepeat | null> {
  if (repeat.kind === "once") return succeed(null);
  if (repeat.kind === "every") {
    const every = { value: repeat.hours, unit: "h" as const };
    return succeed(repeat.count === null ? { every } : { every, count: repeat.count });
  }
  const clock = [...repeat.times];
  const { days, doses } = segment;
  const onDays = repeat.weekdays ? { weekdays: [...repeat.weekdays] } : {};
  if (doses === undefined) return succeed({ clock, ...(days === undefined ? {} : { days }), ...onDays });
  if (repeat.weekdays) return weekdaysFor(doses, { clock, ...onDays }, start, zone);
  const firstDay = doseLineCount(bareLine(start, { clock, days: 1 }), zone);
  const wholeDays = (doses - firstDay) / clock.length;
  if (wholeDays < 0 || !Number.isInteger(wholeDays))
    return fail(issue("dose-text-uneven-doses", { doses, clocks: clock }));
  return succeed({ clock, days: wholeDays + 1 });
}

/** So many doses on weekdays, as the calendar days they take from the start's; an issue where they would end in the middle of a day. */
function weekdaysFor(
  doses: number,
  repeat: Extract<DoseRepeat, { clock: string[] }>,
  start: string,
  zone: string,
): Result<DoseRepeat> {
  if (doses > MOST_DOSES) return fail(issue("dose-too-many", { most: MOST_DOSES }));
  const lastMs = doseLineScheduledMs(bareLine(start, repeat), doses - 1, zone);
  const dayOf = (ms: number) => instantMs(`${wallClock(ms, zone).date}T12:00:00Z`) / (HOURS_PER_DAY * MS_PER_HOUR);
  const ended = { ...repeat, days: Math.round(dayOf(lastMs) - dayOf(instantMs(start))) + 1 };
  return doseLineCount(bareLine(start, ended), zone) === doses
    ? succeed(ended)
    : fail(issue("dose-text-uneven-doses", { doses, clocks: repeat.clock }));
}

function lineEnd(segment: DoseSegment, repeat: SegmentRepeat, start: string, zone: string): number | null {
  const found = repeatFrom(segment, repeat, start, zone);
  return found.ok ? doseLineEndMs(bareLine(start, found.value), zone) : null;
}

/** A line of which only start and repeat matter. */
function bareLine(start: string, repeat: DoseRepeat | null): DoseLine {
  const line = { id: "-", product: "-", amount: { value: 1, unit: "mg" as const }, start };
  return repeat ? { ...line, repeat } : line;
}
