import type { Analysis, OptionResult } from "../../core/analysis/index.ts";
import { fitWords, steadyWithheldWords } from "../../core/messages/index.ts";

/** Rows of the readings that this patient has figures in at steady state. */
const OWN_STEADY: ReadonlySet<string> = new Set([
  "peak",
  "lowest",
  "timed",
  "average",
  "auc24",
  "accumulation",
  "timeTo90",
]);

/** Whether a figure of this patient would stand in this row, were it not for the draws that never settle. */
export function isSteadyWithheld(row: string, { individual }: OptionResult): boolean {
  return OWN_STEADY.has(row) && individual !== null && steadyWithheldWords(individual) !== null;
}

/** Why steady-state figures are missing, though the option repeats: of this patient, and of the typical one beside it. */
export function steadyWithheldNotes({ options }: Analysis): readonly string[] {
  return options.flatMap(({ id, individual, typical }) => {
    const own = individual && steadyWithheldWords(individual);
    return [
      ...(own ? [fitWords.ofPatient(id, own)] : []),
      ...(typical?.noSteadyState === "dose-rate-at-or-above-vmax" ? [fitWords.typicalNever(id)] : []),
    ];
  });
}
