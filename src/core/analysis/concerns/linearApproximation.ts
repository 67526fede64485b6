import { type ConcernRule, concern } from "../concernRule.ts";
import { sourceText } from "../typicalModel.ts";

/** How a record says that its linear kinetics stand for saturable ones: by a caution of this category, or one whose text begins so. */
export const LINEAR_APPROXIMATION = "linear-approximation";
const BEGINS = /^linear approximation/i;

/** A saturable medicine described by linear kinetics: the prediction holds near the doses studied, and is too low for a rise of the dose. */
export const linearApproximation: ConcernRule = ({ case: { medicine } }) =>
  medicine.cautions
    .filter(({ category, text }) => category === LINEAR_APPROXIMATION || BEGINS.test(text))
    .map(({ text, source }, i) =>
      concern(
        "linear-approximation",
        "check",
        { kind: "medicine", id: `linear-${i}` },
        { name: medicine.name, text, source: sourceText(medicine, source) },
      ),
    );
