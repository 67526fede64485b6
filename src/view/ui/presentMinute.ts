import { instantIso } from "../../core/time/index.ts";

/** The machine's clock, cut to the minute, as an instant of the case's zone. The one place where the entry screens read a clock. */
export function presentMinute(zone: string, nowMs: number = Date.now()): string {
  return instantIso(Math.floor(nowMs / 60_000) * 60_000, zone);
}
