import { type ConcernRule, concern } from "../concernRule.ts";

export const noSteadyState: ConcernRule = ({ options }) =>
  options.flatMap((option) =>
    option.typical?.noSteadyState
      ? [
          concern(
            "no-steady-state",
            "note",
            { kind: "option", id: option.id },
            { option: option.id, reason: option.typical.noSteadyState },
          ),
        ]
      : [],
  );
