import { type DoseLine, doseLineEndMs } from "../../core/regimen/index.ts";
import { instantMs, MS_PER_HOUR } from "../../core/time/index.ts";
import { shownReadings } from "./shownReadings.ts";
import type { SummaryInput } from "./summaryInput.ts";
import { chosenOption } from "./summaryOrder.ts";
import type { SummaryPrint } from "./summaryPrint.ts";

/**
 * Epoch ms from which the chosen option is within 90 % of its steady state; null when it has none.
 * The analysis counts from the first dose of the pattern. A lead-in that goes on beyond that (a higher first week, a loading dose)
 * is itself forgotten at the same rate, so the wait starts anew at its last dose.
 */
export function steadyFromMs(input: SummaryInput, print: SummaryPrint): number | null {
  const steady = shownReadings(input)?.readings.steadyState;
  const option = chosenOption(input.case);
  if (!steady || !option) return null;
  const ends = option.lines.map((line) => lineEndMs(line, input.case.timeZone));
  const last = Math.max(...ends);
  const leadIns = ends.filter((end) => end < last && end + steady.periodH * MS_PER_HOUR <= last);
  return Math.max(print.ms(steady.steady90AtH), ...leadIns.map((end) => end + steady.timeTo90H * MS_PER_HOUR));
}

/** Infinity for a line until further notice. */
function lineEndMs(line: DoseLine, zone: string): number {
  if (!line.repeat) return instantMs(line.start);
  return doseLineEndMs(line, zone) ?? Number.POSITIVE_INFINITY;
}
