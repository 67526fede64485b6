import { Temporal } from "temporal-polyfill";
import { twoDigits } from "./calendarWords.ts";

/** What the clock and calendar on the wall show. `weekday` is 1 for Monday to 7 for Sunday. */
export interface WallClock {
  readonly year: number;
  readonly month: number;
  readonly day: number;
  readonly weekday: number;
  readonly hour: number;
  readonly minute: number;
  readonly second: number;
  /** "YYYY-MM-DD" */
  readonly date: string;
  /** "HH:MM" */
  readonly time: string;
}

export function wallClock(ms: number, zone: string): WallClock {
  const at = Temporal.Instant.fromEpochMilliseconds(Math.floor(ms)).toZonedDateTimeISO(zone);
  return {
    year: at.year,
    month: at.month,
    day: at.day,
    weekday: at.dayOfWeek,
    hour: at.hour,
    minute: at.minute,
    second: at.second,
    date: at.toPlainDate().toString(),
    time: `${twoDigits(at.hour)}:${twoDigits(at.minute)}`,
  };
}
