import { type DoseLine, doseLineCount, doseLineScheduledMs, MOST_DOSES } from "../../regimen/index.ts";
import { clockOnDay } from "../../time/index.ts";

/** Which dose of a clock repeat is due at this clock time of this date; null when none is. */
export function lineDueIndex(
  line: DoseLine,
  { date, time }: { readonly date: string; readonly time: string },
  zone: string,
): number | null {
  const found = clockOnDay(date, time, zone);
  const dueMs = found.kind === "once" ? found.ms : found.kind === "twice" ? found.firstMs : found.afterMs;
  let low = 0;
  let high = Math.min(doseLineCount(line, zone), MOST_DOSES) - 1;
  while (low <= high) {
    const middle = Math.floor((low + high) / 2);
    const ms = doseLineScheduledMs(line, middle, zone);
    if (ms === dueMs) return middle;
    if (ms < dueMs) low = middle + 1;
    else high = middle - 1;
  }
  return null;
}
