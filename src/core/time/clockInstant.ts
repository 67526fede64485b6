import { fail, issue, type Result, succeed } from "../result/index.ts";
import { clockOnDay } from "./clockOnDay.ts";
import { instantIso } from "./instant.ts";
import { wallClock } from "./wallClock.ts";

/**
 * The instant of a wall-clock time on a date. A time that the clocks skip or show twice that day is an issue, never a guess:
 * "clock-skipped" carries the nearest valid times, "clock-twice" the two instants, both as `candidates`.
 */
export function clockInstant(date: string, time: string, zone: string): Result<string> {
  const found = clockOnDay(date, time, zone);
  const iso = (ms: number) => instantIso(ms, zone);
  switch (found.kind) {
    case "once":
      return succeed(iso(found.ms));
    case "skipped": {
      const nearest = [found.beforeMs, found.afterMs].map((ms) => wallClock(ms, zone).time);
      return fail(
        issue("clock-skipped", { date, time, zone, nearest, candidates: [iso(found.beforeMs), iso(found.afterMs)] }),
      );
    }
    case "twice":
      return fail(issue("clock-twice", { date, time, zone, candidates: [iso(found.firstMs), iso(found.secondMs)] }));
  }
}
