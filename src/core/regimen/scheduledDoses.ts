import { type ClockOnDay, clockOnDay, instantMs, localMidnight, MS_PER_HOUR, wallClock } from "../time/index.ts";
import type { DoseLine } from "./doseLine.ts";

/** A dose where the line puts it. A clock time of a day on which it is skipped or comes twice is not an instant yet. */
export interface ScheduledDose {
  readonly index: number;
  readonly found: ClockOnDay;
  /** Of a clock repeat. */
  readonly date?: string;
  readonly time?: string;
}

/** The doses of a line in order, exceptions aside: endless when the line has no end. */
export function* scheduledDoses(line: DoseLine, zone: string): Generator<ScheduledDose, void, undefined> {
  const startMs = instantMs(line.start);
  if (!line.repeat) {
    yield { index: 0, found: { kind: "once", ms: startMs } };
  } else if ("every" in line.repeat) {
    const { every, count = Number.POSITIVE_INFINITY } = line.repeat;
    for (let index = 0; index < count; index += 1) {
      yield { index, found: { kind: "once", ms: startMs + Math.round(index * every.value * MS_PER_HOUR) } };
    }
  } else {
    yield* clockDoses(startMs, line.repeat.clock, line.repeat.days ?? Number.POSITIVE_INFINITY, zone);
  }
}

function* clockDoses(
  startMs: number,
  clock: readonly string[],
  days: number,
  zone: string,
): Generator<ScheduledDose, void, undefined> {
  const times = [...new Set(clock)].sort();
  let index = 0;
  let midnight = localMidnight(startMs, zone);
  for (let day = 0; day < days; day += 1) {
    const nextMidnight = localMidnight(midnight + 36 * MS_PER_HOUR, zone);
    const { date } = wallClock(midnight, zone);
    for (const time of times) {
      const found = placeAfterStart(timeOnDay(midnight, nextMidnight, date, time, zone), startMs);
      if (found) {
        yield { index, found, date, time };
        index += 1;
      }
    }
    midnight = nextMidnight;
  }
}

/** On a day of 24 hours that begins at 00:00 the clocks don't change, so the look-up in the zone's table is saved. */
function timeOnDay(midnight: number, nextMidnight: number, date: string, time: string, zone: string): ClockOnDay {
  if (nextMidnight - midnight !== 24 * MS_PER_HOUR) return clockOnDay(date, time, zone);
  const [hours = 0, minutes = 0] = time.split(":").map(Number);
  return { kind: "once", ms: midnight + (hours * 60 + minutes) * 60_000 };
}

/** null for a dose before the line's start. A start that is one of the two instants of a time says which is meant. */
function placeAfterStart(found: ClockOnDay, startMs: number): ClockOnDay | null {
  switch (found.kind) {
    case "once":
      return found.ms >= startMs ? found : null;
    case "skipped":
      return found.beforeMs >= startMs ? found : null;
    case "twice":
      if (startMs === found.firstMs) return { kind: "once", ms: found.firstMs };
      if (startMs > found.firstMs) return startMs <= found.secondMs ? { kind: "once", ms: found.secondMs } : null;
      return found;
  }
}
