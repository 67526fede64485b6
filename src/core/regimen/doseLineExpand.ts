import { fail, type Issue, issue, type Result, succeed } from "../result/index.ts";
import { instantIso, instantMs, wallClock } from "../time/index.ts";
import type { DoseAmount, DoseException, DoseLine } from "./doseLine.ts";
import { type ScheduledDose, scheduledDoses } from "./scheduledDoses.ts";

/** One dose of a line. Times are epoch milliseconds; `atMs` is when it was or will be taken (for a missed one, when it was due). */
export interface DoseEvent {
  readonly index: number;
  readonly scheduledMs: number;
  readonly atMs: number;
  readonly amount: DoseAmount;
  readonly status: "taken" | "missed" | "late" | "moved";
}

/** More doses than this in one line are refused. */
export const MOST_DOSES = 10_000;

export interface DoseLineSpan {
  readonly zone: string;
  /** Where a line without an end is cut: the last dose is due at or before this instant. */
  readonly untilMs: number;
}

/**
 * Every dose of a line, in the order of the schedule.
 * A repeat every so many hours counts elapsed hours; a clock repeat follows the wall clock, each day at each time, from `start` on.
 * A clock time that the clocks skip or show twice that day is an issue ("dose-clock-skipped", "dose-clock-twice") unless an exception of that dose settles it.
 */
export function doseLineExpand(line: DoseLine, span: DoseLineSpan): Result<readonly DoseEvent[]> {
  const exceptions = new Map<number, DoseException>();
  const issues: Issue[] = [];
  for (const exception of line.except ?? []) {
    if (exceptions.has(exception.index)) issues.push(issue("dose-exception-twice", { dose: exception.index + 1 }));
    if (exception.status !== "missed" && exception.at === undefined) {
      issues.push(issue("dose-exception-needs-at", { dose: exception.index + 1, status: exception.status }));
    }
    exceptions.set(exception.index, exception);
  }

  const events: DoseEvent[] = [];
  const isEndless = isEndlessLine(line);
  for (const dose of scheduledDoses(line, span.zone)) {
    if (isEndless && earliestMs(dose) > span.untilMs) break;
    if (dose.index >= MOST_DOSES) {
      issues.push(issue("dose-too-many", { most: MOST_DOSES }));
      break;
    }
    const event = placeDose(dose, exceptions.get(dose.index), line.amount, span.zone);
    if (event.ok) events.push(event.value);
    else issues.push(...event.issues);
    exceptions.delete(dose.index);
  }
  if (!isEndless) {
    const doses = events.length;
    if (doses === 0 && issues.length === 0) issues.push(issue("dose-none", { start: line.start }));
    for (const index of exceptions.keys()) issues.push(issue("dose-exception-beyond", { dose: index + 1, doses }));
  }
  return issues.length > 0 ? fail(...issues) : succeed(events);
}

/** Whether a line goes on until further notice. */
export function isEndlessLine(line: DoseLine): boolean {
  if (!line.repeat) return false;
  return "every" in line.repeat ? line.repeat.count === undefined : line.repeat.days === undefined;
}

function earliestMs({ found }: ScheduledDose): number {
  if (found.kind === "once") return found.ms;
  return found.kind === "twice" ? found.firstMs : found.afterMs;
}

function placeDose(
  dose: ScheduledDose,
  exception: DoseException | undefined,
  amount: DoseAmount,
  zone: string,
): Result<DoseEvent> {
  if (exception) {
    const scheduledMs = settledMs(dose, exception);
    const isTaken = exception.status !== "missed";
    return succeed({
      index: dose.index,
      scheduledMs,
      atMs: isTaken && exception.at !== undefined ? instantMs(exception.at) : scheduledMs,
      amount: isTaken ? (exception.amount ?? amount) : amount,
      status: exception.status,
    });
  }
  if (dose.found.kind !== "once") return fail(clockIssue(dose, zone));
  return succeed({ index: dose.index, scheduledMs: dose.found.ms, atMs: dose.found.ms, amount, status: "taken" });
}

/** When a dose was due. One whose time came twice was due at the one its exception names, else at the first; a skipped one when the clocks had changed. */
function settledMs(dose: ScheduledDose, exception: DoseException): number {
  const { found } = dose;
  const isSecond = found.kind === "twice" && exception.at !== undefined && instantMs(exception.at) === found.secondMs;
  return isSecond ? found.secondMs : earliestMs(dose);
}

function clockIssue({ found, index, date, time }: ScheduledDose, zone: string): Issue {
  const iso = (ms: number) => instantIso(ms, zone);
  const data = { dose: index + 1, index, date, time, zone };
  if (found.kind === "skipped") {
    const nearest = [found.beforeMs, found.afterMs].map((ms) => wallClock(ms, zone).time);
    return issue("dose-clock-skipped", { ...data, nearest, candidates: [iso(found.beforeMs), iso(found.afterMs)] });
  }
  const both = found.kind === "twice" ? [found.firstMs, found.secondMs] : [];
  return issue("dose-clock-twice", { ...data, candidates: both.map(iso) });
}
