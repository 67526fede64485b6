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
  const dateAt = (ms: number) => wallClock(ms, context.zone).date;
  const needsDay = (): Result<string> => fail(issue("dose-text-needs-day", { expected: "from 4 March 08:00" }));
  let refused: Result<string> | null = null;

  const isOption = context.lane === "option";
  const fromMs = isOption ? nowMs : nowMs - line.lengthMs + 2 * MS_PER_DAY;
  const SEARCHED_DAYS = 8;
  for (let step = 0; step < SEARCHED_DAYS; step += 1) {
    const start = line.startOn(dateAt(fromMs + (isOption ? step : -step) * MS_PER_DAY));
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
