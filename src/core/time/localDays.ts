import { Temporal } from "temporal-polyfill";
import { MS_PER_HOUR } from "./msPerHour.ts";

export interface LocalDay {
  readonly startMs: number;
  /** Start of the next day. */
  readonly endMs: number;
  /** The clocks don't change on it: it starts at 00:00 and each of its 24 hours comes once. */
  readonly isPlain: boolean;
}

const MS_PER_DAY = 24 * MS_PER_HOUR;
const zoned = (ms: number, zone: string) =>
  Temporal.Instant.fromEpochMilliseconds(Math.floor(ms)).toZonedDateTimeISO(zone);

/**
 * The local days of a zone from the one that holds `ms` on, without end. Between two changes of the clocks they are counted in
 * steps of 24 h; the zone's table is asked only around a change, which makes long regimens cheap.
 */
export function* localDays(ms: number, zone: string): Generator<LocalDay, never, undefined> {
  let startMs = zoned(ms, zone).startOfDay().epochMilliseconds;
  for (;;) {
    const start = zoned(startMs, zone);
    const changeMs = start.getTimeZoneTransition("next")?.epochMilliseconds ?? Number.POSITIVE_INFINITY;
    const isAtMidnight = start.hour === 0 && start.minute === 0 && start.second === 0;
    for (; isAtMidnight && startMs + MS_PER_DAY < changeMs; startMs += MS_PER_DAY) {
      yield { startMs, endMs: startMs + MS_PER_DAY, isPlain: true };
    }
    const endMs = zoned(startMs, zone).toPlainDate().add({ days: 1 }).toZonedDateTime(zone).epochMilliseconds;
    yield { startMs, endMs, isPlain: false };
    startMs = endMs;
  }
}
