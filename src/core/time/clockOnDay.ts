import { Temporal } from "temporal-polyfill";

/** What a wall-clock time on a date stands for: one instant, none (clocks went forward) or two (clocks went back). */
export type ClockOnDay =
  | { readonly kind: "once"; readonly ms: number }
  /** `beforeMs`: the last whole minute before the gap; `afterMs`: the first instant after it. */
  | { readonly kind: "skipped"; readonly beforeMs: number; readonly afterMs: number }
  | { readonly kind: "twice"; readonly firstMs: number; readonly secondMs: number };

const MS_PER_MINUTE = 60_000;

/** Looks a date ("YYYY-MM-DD") and time ("HH:MM" or "HH:MM:SS") up in a zone. Malformed or unreal ones throw RangeError. */
export function clockOnDay(date: string, time: string, zone: string): ClockOnDay {
  const plain = Temporal.PlainDateTime.from(`${date}T${time}`, { overflow: "reject" });
  const earlier = plain.toZonedDateTime(zone, { disambiguation: "earlier" });
  const later = plain.toZonedDateTime(zone, { disambiguation: "later" });
  if (earlier.epochMilliseconds === later.epochMilliseconds) return { kind: "once", ms: earlier.epochMilliseconds };
  if (earlier.toPlainDateTime().equals(plain)) {
    return { kind: "twice", firstMs: earlier.epochMilliseconds, secondMs: later.epochMilliseconds };
  }
  const change = earlier.getTimeZoneTransition("next");
  if (!change) throw new RangeError(`zone: ${zone} skips ${date} ${time} but names no change of the clocks`);
  return { kind: "skipped", beforeMs: change.epochMilliseconds - MS_PER_MINUTE, afterMs: change.epochMilliseconds };
}
