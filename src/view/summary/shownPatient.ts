import type { IndividualFit, IndividualReadings } from "../../core/analysis/index.ts";
import { fitFailureSentence, noFitSentence, summaryPatientWords as words } from "../../core/messages/index.ts";
import type { SummaryInput } from "./summaryInput.ts";
import { chosenOption } from "./summaryOrder.ts";

/** Whom the sheet is worked out for: this patient, or the typical one and why. */
export type ShownPatient =
  | {
      readonly kind: "individual";
      readonly fit: IndividualFit;
      /** Of the chosen option; null when there is none. */
      readonly readings: IndividualReadings | null;
    }
  | { readonly kind: "typical"; readonly reason: string };

export function shownPatient({ case: value, analysis }: SummaryInput): ShownPatient {
  const { fit } = analysis;
  if (fit.kind === "none") return { kind: "typical", reason: noFitSentence(fit.reason) };
  if (fit.kind === "pending") return { kind: "typical", reason: words.pending };
  if (fit.kind === "withheld") return { kind: "typical", reason: fitFailureSentence(fit.reason, fit.data) };
  if (value.fit.use === "typical") return { kind: "typical", reason: words.setAside(fit.fit.levelsUsed.length) };
  const chosen = chosenOption(value)?.id;
  const readings = analysis.options.find(({ id }) => id === chosen)?.individual ?? null;
  return { kind: "individual", fit: fit.fit, readings };
}
