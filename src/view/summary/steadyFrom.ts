import { shownReadings } from "./shownReadings.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryPrint } from "./summaryPrint.ts";

/** Epoch ms from which the chosen option is within 90 % of its steady state; null when it has none. */
export function steadyFromMs(input: SummaryInput, print: SummaryPrint): number | null {
  const steady = shownReadings(input)?.readings.steadyState;
  return steady ? print.ms(steady.steady90AtH) : null;
}
