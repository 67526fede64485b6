import { fail, issue, type Result } from "../../result/index.ts";
import { instantMs, MS_PER_HOUR, wallClock } from "../../time/index.ts";
import type { DoseTextContext } from "./doseSegment.ts";

const MS_PER_DAY = 24 * MS_PER_HOUR;

/** How a text that names a time but no day is placed. */
export interface FloatingLine {
  /** The start if the first day were this one; an issue where the clocks make it none or two. */
  readonly startOn: (date: string) => Result<string>;
  /** Epoch ms of the last dose of the line with that start; null when it has no end. */
  readonly endFrom: (start: string) => number | null;
  /** Rough length of the line, ms: where the search begins. */
  readonly lengthMs: number;
  /** Weekdays (1 to 7) on which it may start; null: any. */
  readonly weekdays: readonly number[] | null;
}

/**
 * The start of a text without a day. An option begins at the first such time at or after the now line; doses given end with the
 * latest such dose at or before it. Doses given without an end can't be placed: "dose-text-needs-day".
 */
export function floatingStart(
  line: FloatingLine,
  context: Pick<DoseTextContext, "zone" | "nowIso" | "lane">,
): Result<string> {
  const nowMs = instantMs(context.nowIso);
  const needsDay = (): Result<string> => fail(issue("dose-text-needs-day", { expected: "from 4 March 08:00" }));
  let refused: Result<string> | null = null;

  const isOption = context.lane === "option";
  // A line on weekdays may end up to a week before its days do.
  const slackDays = line.weekdays ? 8 : 2;
  const fromMs = isOption ? nowMs : nowMs - line.lengthMs + slackDays * MS_PER_DAY;
  const searchedDays = 6 + slackDays;
  // Noon of a calendar day in UTC, where every day has 24 hours: steps from a late evening would leave out a day of 23.
  const firstDay = instantMs(`${wallClock(fromMs, context.zone).date}T12:00:00Z`);
  for (let step = 0; step < searchedDays; step += 1) {
    const day = wallClock(firstDay + (isOption ? step : -step) * MS_PER_DAY, "UTC");
    if (line.weekdays && !line.weekdays.includes(day.weekday)) continue;
    const start = line.startOn(day.date);
    if (!start.ok) {
      refused ??= start;
      const candidates = start.issues.flatMap(({ data }) =>
        Array.isArray(data.candidates) ? data.candidates.map(String) : [],
      );
      const isInReach = candidates.some((iso) => (isOption ? instantMs(iso) >= nowMs : fitsBefore(line, iso, nowMs)));
      if (isInReach) return start;
      continue;
    }
    if (isOption) {
      if (instantMs(start.value) >= nowMs) return start;
      continue;
    }
    if (line.endFrom(start.value) === null) return needsDay();
    if (fitsBefore(line, start.value, nowMs)) return start;
  }
  return refused ?? needsDay();
}

function fitsBefore(line: FloatingLine, start: string, nowMs: number): boolean {
  const end = line.endFrom(start);
  return end !== null && end <= nowMs;
}
