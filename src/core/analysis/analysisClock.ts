import type { Case } from "../case/index.ts";
import { type DoseLine, doseLineEndMs, doseLinePeriodHours } from "../regimen/index.ts";
import { instantMs, localMidnight, midnightsBetween } from "../time/index.ts";

const HOUR_MS = 3_600_000;
const DAY_MS = 24 * HOUR_MS;

/** How much of the past is drawn at most; earlier doses still count. */
const LONGEST_PAST_MS = 14 * DAY_MS;
/** The future shown: at least three days, at most two weeks; open-ended lines are followed for four half-lives (94 % of the way to steady state). */
const SHORTEST_FUTURE_MS = 3 * DAY_MS;
const LONGEST_FUTURE_MS = 14 * DAY_MS;
const HALF_LIVES_SHOWN = 4;

export interface AnalysisClock {
  readonly originMs: number;
  readonly nowMs: number;
  readonly untilMs: number;
  readonly nowH: number;
  readonly fromH: number;
  readonly toH: number;
  /** Where the span of the readings ends: with the first course that does, so that no option's washout is counted; else with the span shown. */
  readonly readingsToH: number;
  readonly midnightsH: readonly number[];
}

/**
 * The span of a case: from local midnight before the first thing that happened (at most two weeks back)
 * to local midnight after the options have run or settled (three days to two weeks ahead). Hour 0 is its beginning.
 */
export function analysisClock(value: Case, halfLifeH: number | null, isSaturable = false): AnalysisClock {
  const zone = value.timeZone;
  const nowMs = instantMs(value.now);
  const past = [...value.given.map((line) => line.start), ...value.levels.map((level) => level.at)]
    .map(instantMs)
    .filter((ms) => ms <= nowMs);
  const earliest = Math.max(Math.min(nowMs, ...past), nowMs - LONGEST_PAST_MS);
  const originMs = localMidnight(earliest, zone);

  // Without a half-life (saturable elimination) the approach is slow: as far as is ever shown.
  const settle = isSaturable ? LONGEST_FUTURE_MS : (halfLifeH ?? 0) * HALF_LIVES_SHOWN * HOUR_MS;
  const ends = value.options.flatMap((option) =>
    option.lines.map((line) => {
      const end = doseLineEndMs(line, zone);
      return end === null ? instantMs(line.start) + settle : end + (doseLinePeriodHours(line) ?? 24) * HOUR_MS;
    }),
  );
  const wanted = Math.max(nowMs + SHORTEST_FUTURE_MS, ...ends);
  const latest = Math.min(wanted, nowMs + LONGEST_FUTURE_MS);
  const untilMs = nextMidnight(latest, zone);

  const courseEnds = value.options
    .map((option) => courseEndMs(option.lines, zone))
    .filter((end): end is number => end !== null && end > nowMs);
  const readingsToMs = Math.min(untilMs, ...courseEnds);

  const hours = (ms: number) => (ms - originMs) / HOUR_MS;
  return {
    originMs,
    nowMs,
    untilMs,
    nowH: hours(nowMs),
    fromH: 0,
    toH: hours(untilMs),
    readingsToH: hours(readingsToMs),
    midnightsH: [...new Set([originMs, ...midnightsBetween(originMs, untilMs, zone), untilMs])]
      .sort((a, b) => a - b)
      .map(hours),
  };
}

function nextMidnight(ms: number, zone: string): number {
  const midnight = localMidnight(ms, zone);
  if (midnight === ms) return ms;
  // 36 h on is inside the next day whatever the length of this one (23, 24 or 25 h).
  return localMidnight(midnight + 36 * HOUR_MS, zone);
}

/** When a course of repeating lines is over: one interval after its last dose; null when it goes on, or is no course. */
function courseEndMs(lines: readonly DoseLine[], zone: string): number | null {
  const repeating = lines.filter((line) => line.repeat !== undefined);
  if (repeating.length === 0) return null;
  const ends = repeating.map((line) => {
    const end = doseLineEndMs(line, zone);
    return end === null ? Number.POSITIVE_INFINITY : end + (doseLinePeriodHours(line) ?? 0) * HOUR_MS;
  });
  const last = Math.max(...ends);
  return Number.isFinite(last) ? last : null;
}
