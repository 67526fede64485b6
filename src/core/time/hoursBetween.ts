import { instantMs } from "./instant.ts";
import { MS_PER_HOUR } from "./msPerHour.ts";

/** Elapsed hours from one instant to another; negative when `toIso` is the earlier. */
export function hoursBetween(fromIso: string, toIso: string): number {
  return (instantMs(toIso) - instantMs(fromIso)) / MS_PER_HOUR;
}
