import { fail, issue, type Result, succeed } from "../../result/index.ts";
import { instantIso, instantMs, instantPhraseResolve, MS_PER_HOUR } from "../../time/index.ts";
import type { DoseLine, DoseRepeat } from "../doseLine.ts";
import { doseLineCount, doseLineEndMs } from "../doseLineEndMs.ts";
import type { DoseSegment, DoseTextContext } from "./doseSegment.ts";
import { floatingStart } from "./floatingStart.ts";
import type { SegmentRepeat } from "./segmentRepeat.ts";

const HOURS_PER_DAY = 24;

/** The instant a segment starts, from what it says of day and time; a missing day is placed by `floatingStart`. */
export function segmentStart(segment: DoseSegment, repeat: SegmentRepeat, context: DoseTextContext): Result<string> {
  const { zone, nowIso } = context;
  if (segment.iso !== undefined) return succeed(instantIso(instantMs(segment.iso), zone));
  const time = repeat.time ?? firstClock(segment, repeat);
  if (!time) return withoutTime(segment, repeat, context);
  const on = (date?: string) =>
    instantPhraseResolve({ ...time, ...(segment.date ? { date: segment.date } : {}) }, zone, nowIso, date);
  if (segment.date) return on();

  if (repeat.kind === "clock" && context.lane === "option" && repeat.time === null)
    return firstOfClocks(repeat.times, context);
  return floatingStart(
    {
      startOn: (date) => on(date),
      endFrom: (start) => lineEnd(segment, repeat, start, zone),
      lengthMs: lengthHours(segment, repeat) * MS_PER_HOUR,
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
function firstOfClocks(times: readonly string[], context: DoseTextContext): Result<string> {
  const starts = times.map((time) =>
    floatingStart(
      {
        startOn: (date) => instantPhraseResolve({ time }, context.zone, context.nowIso, date),
        endFrom: () => null,
        lengthMs: 0,
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
  return (days ?? Math.ceil((doses ?? 1) / repeat.times.length)) * HOURS_PER_DAY;
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
  if (doses === undefined) return succeed(days === undefined ? { clock } : { clock, days });
  const firstDay = doseLineCount(bareLine(start, { clock, days: 1 }), zone);
  const wholeDays = (doses - firstDay) / clock.length;
  if (wholeDays < 0 || !Number.isInteger(wholeDays))
    return fail(issue("dose-text-uneven-doses", { doses, clocks: clock }));
  return succeed({ clock, days: wholeDays + 1 });
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
