import type { Concern } from "../../core/analysis/index.ts";
import { concernMessage, GRAVITY_WORDS, issueMessage, summaryBannerWords as words } from "../../core/messages/index.ts";
import type { Issue } from "../../core/result/index.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryBanner, SummaryConcern } from "./summaryModel.ts";
import { chosenOption, type OrderResult } from "./summaryOrder.ts";

/** What must not be overlooked, printed across the sheet: why it is not for use, limits of the model, what was not checked. */
export function summaryBanners(
  input: SummaryInput,
  refusal: Issue | null,
  order: OrderResult | null,
): readonly SummaryBanner[] {
  const { medicine } = input.case;
  return [
    ...(refusal ? [stop(words.notForUse(issueMessage(refusal)))] : []),
    ...(order?.notMakeable ?? []).map((text) => stop(words.notMakeable(text))),
    ...(order?.empty ?? []).map((text) => stop(words.nothingLeft(text))),
    ...concernsOfOption(input)
      .filter(({ gravity }) => gravity === "stop")
      .map((concern) => stop(concernWords(concern))),
    ...(medicine.review.status === "reviewed" ? [] : [{ gravity: "check" as const, ...words.unchecked }]),
  ];
}

function stop(text: { readonly title: string; readonly text: string }): SummaryBanner {
  return { gravity: "stop", ...text };
}

/** Concerns of the case as a whole and of the chosen option; those of other options are in the details only. */
export function concernsOfOption(input: SummaryInput): readonly Concern[] {
  const chosen = chosenOption(input.case)?.id;
  return input.analysis.concerns.filter(
    ({ about }) => about.kind !== "option" || about.id === undefined || about.id.split("/")[0] === chosen,
  );
}

export function concernText(concern: Concern): SummaryConcern {
  return { gravity: concern.gravity, word: GRAVITY_WORDS[concern.gravity], ...concernWords(concern) };
}

function concernWords(concern: Concern): { readonly title: string; readonly text: string } {
  const { title, text } = concernMessage(concern);
  return { title, text: withoutUnitStops(text) };
}

/** The symbol of a unit with a full stop after it. */
const UNIT_STOP = /(\d\s?(?:kg|mg|mcg|g|ng|mL|dL|mmol|h|min|cm)|\bper\s(?:L|mL|kg|h|min))\.(?=\s|$)/g;

/** A full stop after the symbol of a unit can be read as a digit: the sentences are joined by a semicolon, and the last ends without. */
function withoutUnitStops(text: string): string {
  return text.replace(UNIT_STOP, "$1;").replace(/;$/, "");
}
