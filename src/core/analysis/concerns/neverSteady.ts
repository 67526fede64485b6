import { type ConcernRule, concern } from "../concernRule.ts";

/** Saturable elimination and a dose rate it can't keep up with: the level rises without end. */
export const neverSteady: ConcernRule = ({ options }) =>
  options.flatMap((option) =>
    option.typical?.noSteadyState === "dose-rate-at-or-above-vmax"
      ? [concern("never-steady", "stop", { kind: "option", id: option.id }, { option: option.id })]
      : [],
  );
