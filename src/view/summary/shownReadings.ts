import type { OptionReadings, OptionResult } from "../../core/analysis/index.ts";
import type { SummaryInput } from "./summaryInput.ts";
import { chosenOption } from "./summaryOrder.ts";

interface ShownReadings {
  readonly option: OptionResult;
  readonly readings: OptionReadings;
}

/** The typical patient's readings of the chosen option; this patient's stand in shownPatient. */
export function shownReadings(input: SummaryInput): ShownReadings | null {
  const chosen = chosenOption(input.case);
  const option = input.analysis.options.find(({ id }) => id === chosen?.id);
  return option?.typical ? { option, readings: option.typical } : null;
}
