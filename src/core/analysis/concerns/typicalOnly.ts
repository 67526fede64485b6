import { type ConcernRule, concern } from "../concernRule.ts";

/** Levels stand beside the prediction and none of them could be used; why is in the data. */
export const typicalOnly: ConcernRule = ({ fit, levels }) =>
  levels.length === 0 || fit.kind !== "none" || fit.reason === "all-left-out"
    ? []
    : [concern("levels-not-used", "check", { kind: "case" }, { levels: levels.length, reason: fit.reason })];
