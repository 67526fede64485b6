import { type ClockOnDay, clockOnDay, instantMs, localDays, MS_PER_HOUR, wallClock } from "../time/index.ts";
import type { DoseLine, DoseRepeat } from "./doseLine.ts";

/** A dose where the line puts it. A clock time of a day on which it is skipped or comes twice is not an instant yet. */
export interface ScheduledDose {
  readonly index: number;
  readonly found: ClockOnDay;
  /** Of a clock time that is not one instant on its day. */
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
    yield* clockDoses(startMs, line.repeat, zone);
  }
}

function* clockDoses(
  startMs: number,
  { clock, days = Number.POSITIVE_INFINITY, weekdays }: Extract<DoseRepeat, { clock: string[] }>,
  zone: string,
): Generator<ScheduledDose, void, undefined> {
  const times = [...new Set(clock)].sort();
  let index = 0;
  let day = 0;
  let weekday = 0;
  let isAfterPlain = false;
  for (const { startMs: midnight, isPlain } of localDays(startMs, zone)) {
    if (day >= days) return;
    day += 1;
    // The calendar is asked only after a day with a change of the clocks, which may have left a date out.
    if (weekdays) weekday = isAfterPlain ? (weekday % 7) + 1 : wallClock(midnight, zone).weekday;
    isAfterPlain = isPlain;
    if (weekdays && !weekdays.includes(weekday)) continue;
    const date = isPlain ? "" : wallClock(midnight, zone).date;
    for (const time of times) {
      const onDay = isPlain ? timeOnPlainDay(midnight, time) : clockOnDay(date, time, zone);
      const found = placeAfterStart(onDay, startMs);
      if (!found) continue;
      yield found.kind === "once" ? { index, found } : { index, found, date, time };
      index += 1;
    }
  }
}

function timeOnPlainDay(midnight: number, time: string): ClockOnDay {
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
