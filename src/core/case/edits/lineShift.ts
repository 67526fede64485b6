import { type DoseException, type DoseLine, type DoseRepeat, doseLineScheduledMs } from "../../regimen/index.ts";
import { clockOnDay, instantIso, instantMs, wallClock } from "../../time/index.ts";
import { lineWithExceptions } from "./doseException.ts";
import { lineDueIndex } from "./lineDueIndex.ts";

/**
 * A line moved so that dose `index` is due at `atMs`.
 * A single dose or an hourly repeat: all of it moves by the same shift.
 * A clock repeat: the clock time of that dose becomes the new one on every day, and the start follows so that no dose falls before it; a move
 * onto another clock time of the line, which would merge two doses into one, leaves the line as it is.
 * On weekdays, a move into another day takes the weekdays along; with several clock times they would have to move for one time alone,
 * which a line can't say, and the line stays as it is.
 */
export function lineShifted(line: DoseLine, index: number, atMs: number, zone: string): DoseLine {
  const dueMs = doseLineScheduledMs(line, index, zone);
  if (atMs === dueMs) return line;
  if (line.repeat && "clock" in line.repeat) return clockMoved(line, line.repeat, dueMs, atMs, zone);
  const shifted = (iso: string) => instantIso(instantMs(iso) + atMs - dueMs, zone);
  const except = line.except?.map((each) => (each.at === undefined ? each : { ...each, at: shifted(each.at) }));
  return { ...line, start: shifted(line.start), ...(except && { except }) };
}

type ClockRepeat = Extract<DoseRepeat, { clock: string[] }>;

interface DayTime {
  readonly date: string;
  readonly time: string;
}

function clockMoved(line: DoseLine, repeat: ClockRepeat, dueMs: number, atMs: number, zone: string): DoseLine {
  const times = [...repeat.clock].sort();
  const due = wallClock(dueMs, zone);
  const at = wallClock(atMs, zone);
  const slot = slotOf(times, due.time);
  if (slot !== at.time && times.includes(at.time)) return line;
  const byDays = daysBetween(due.date, at.date);
  const { weekdays } = repeat;
  if (weekdays && byDays !== 0 && times.length > 1) return line;
  const moved = ({ date, time }: DayTime): DayTime =>
    time === slot ? { date: dateAfter(date, byDays), time: at.time } : { date, time };

  const start = wallClock(instantMs(line.start), zone);
  const isBeforeStart = (time: string) => time < start.time || (time === start.time && start.second > 0);
  const firsts = times.map((time) => moved({ time, date: dateAfter(start.date, isBeforeStart(time) ? 1 : 0) }));
  const first = firsts.reduce((a, b) => (`${b.date}T${b.time}` < `${a.date}T${a.time}` ? b : a));
  // A first day without a dose is not part of what moves.
  const emptyDays = times.every(isBeforeStart) ? 1 : 0;
  const after: DoseLine = {
    ...line,
    start: instantIso(startMs(first, zone), zone),
    repeat: {
      clock: times.map((time) => (time === slot ? at.time : time)).sort(),
      ...(repeat.days !== undefined && { days: Math.max(1, repeat.days - emptyDays) }),
      ...(weekdays && { weekdays: weekdaysAfter(weekdays, byDays) }),
    },
  };
  return exceptionsFollow(line, after, (dose) => moved({ ...dose, time: slotOf(times, dose.time) }), zone);
}

/** Each exception goes with its dose; one whose dose is no longer part of the line goes with the dose. */
function exceptionsFollow(
  before: DoseLine,
  after: DoseLine,
  moved: (dose: DayTime) => DayTime,
  zone: string,
): DoseLine {
  const except = (before.except ?? []).flatMap((each): DoseException[] => {
    const fromMs = doseLineScheduledMs(before, each.index, zone);
    const index = lineDueIndex(after, moved(wallClock(fromMs, zone)), zone);
    if (index === null) return [];
    const shiftMs = doseLineScheduledMs(after, index, zone) - fromMs;
    return [{ ...each, index, ...(each.at !== undefined && { at: instantIso(instantMs(each.at) + shiftMs, zone) }) }];
  });
  return lineWithExceptions(after, except);
}

/** The line's clock time behind a dose; on a day that skips it, the dose is due when the clocks have changed, just after it. */
function slotOf(times: readonly string[], time: string): string {
  return times.findLast((each) => each <= time) ?? (times[0] as string);
}

/** The start that lets this dose in: of a time that comes twice the first, of a skipped one the last minute before the change. */
function startMs({ date, time }: DayTime, zone: string): number {
  const found = clockOnDay(date, time, zone);
  if (found.kind === "once") return found.ms;
  return found.kind === "twice" ? found.firstMs : found.beforeMs;
}

function weekdaysAfter(weekdays: readonly number[], days: number): number[] {
  return weekdays.map((day) => ((((day - 1 + days) % 7) + 7) % 7) + 1).sort((a, b) => a - b);
}

/** Calendar arithmetic on dates alone, in UTC, where every day has 24 hours. */
const DAY_MS = 86_400_000;

function dateAfter(date: string, days: number): string {
  return instantIso(instantMs(`${date}T00:00:00Z`) + days * DAY_MS, "UTC").slice(0, 10);
}

function daysBetween(from: string, to: string): number {
  return (instantMs(`${to}T00:00:00Z`) - instantMs(`${from}T00:00:00Z`)) / DAY_MS;
}
