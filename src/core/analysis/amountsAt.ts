import { modelAmounts } from "../kinetics/index.ts";
import type { Analysis } from "./analysisTypes.ts";
import { countedByProduct } from "./caseDoses.ts";
import { modelHistory } from "./modelInputs.ts";

/** Where the medicine is, mg of the active moiety that reaches the circulation, one figure a time. */
export interface AmountsOverTime {
  /** Taken and not yet absorbed. */
  readonly gut: readonly number[];
  /** In the central compartment; the whole body in a model without a second one. */
  readonly body: readonly number[];
  /** 0 in a model without a second compartment. */
  readonly peripheral: readonly number[];
  readonly eliminated: readonly number[];
  /** F × all doses taken before that time, counted from the doses alone: what the other four must add up to. */
  readonly taken: readonly number[];
}

/**
 * Where the medicine is at chosen instants, by the same sweep that draws the curve.
 * `option`: an option's id, or null for the doses given alone. `hours`: elapsed hours on the case clock, ascending. null without a prediction.
 */
export function amountsOverTime(
  analysis: Analysis,
  option: string | null,
  hours: readonly number[],
): AmountsOverTime | null {
  if (!analysis.typical) return null;
  const doses = option === null ? [] : (analysis.options.find((candidate) => candidate.id === option)?.doses ?? []);
  const history = modelHistory(analysis.typical, countedByProduct([...analysis.given, ...doses]));
  const { gut, body, peripheral, eliminated } = modelAmounts(history, hours);
  const taken = hours.map((at) => {
    let sum = 0;
    for (const { bioavailability, doses: own } of history.inputs) {
      for (const { time, amount } of own) if (time < at) sum += bioavailability * amount;
    }
    return sum;
  });
  return { gut: [...gut], body: [...body], peripheral: [...peripheral], eliminated: [...eliminated], taken };
}
