import type { OptionReadings } from "../../core/analysis/index.ts";
import { steadyWithheldWords, summaryReadingWords } from "../../core/messages/index.ts";
import { shownPatient } from "./shownPatient.ts";
import { shownReadings } from "./shownReadings.ts";
import type { SummaryInput } from "./summaryInput.ts";

/** Why the sheet has no steady-state figure of the patient it shows, in a sentence; null where it has, or has no readings at all. */
export function noSteadyText(input: SummaryInput): string | null {
  const typical = shownReadings(input)?.readings;
  const patient = shownPatient(input);
  const readings = patient.kind === "individual" ? patient.readings : typical;
  if (!readings || readings.steadyState) return null;
  // Of this patient's draws too many never settle; else it is the option, which is the same for any patient.
  const withheld = "shareNeverSteady" in readings ? steadyWithheldWords(readings) : null;
  return withheld ?? noSteadySentence(typical?.noSteadyState ?? null);
}

function noSteadySentence(reason: OptionReadings["noSteadyState"]): string {
  switch (reason) {
    case "dose-rate-at-or-above-vmax":
      return summaryReadingWords.neverSteady;
    case "no-common-period":
      return summaryReadingWords.noCommonPeriod;
    default:
      return summaryReadingWords.noRepeat;
  }
}
