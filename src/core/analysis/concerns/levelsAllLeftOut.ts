import { type ConcernRule, concern } from "../concernRule.ts";

/** The user left every level out: nothing adjusts the typical patient. */
export const levelsAllLeftOut: ConcernRule = ({ fit, levels }) =>
  fit.kind === "none" && fit.reason === "all-left-out"
    ? [concern("levels-all-left-out", "check", { kind: "case" }, { levels: levels.length })]
    : [];
