import type { OptionReadings, OptionResult } from "../../core/analysis/index.ts";
import { summaryReadingWords as words } from "../../core/messages/index.ts";
import type { SummaryInput } from "./summaryInput.ts";
import { chosenOption } from "./summaryOrder.ts";

interface ShownReadings {
  readonly option: OptionResult;
  readonly readings: OptionReadings;
  readonly patient: string;
}

/** The typical patient's readings of the chosen option. */
export function shownReadings(input: SummaryInput): ShownReadings | null {
  const chosen = chosenOption(input.case);
  const option = input.analysis.options.find(({ id }) => id === chosen?.id);
  if (!option) return null;
  return option.typical ? { option, readings: option.typical, patient: words.typical } : null;
}
