import { type ConcernRule, concern } from "../concernRule.ts";

/** An option that does not repeat, or whose lines never meet again. */
export const noSteadyState: ConcernRule = ({ options }) =>
  options.flatMap((option) => {
    const reason = option.typical?.noSteadyState;
    return reason === "no-repeat" || reason === "no-common-period"
      ? [concern("no-steady-state", "note", { kind: "option", id: option.id }, { option: option.id, reason })]
      : [];
  });
