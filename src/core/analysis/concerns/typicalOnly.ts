import { type ConcernRule, concern } from "../concernRule.ts";

/** This version compares levels with the typical patient; it does not adjust the prediction to them. */
export const typicalOnly: ConcernRule = ({ levels }) =>
  levels.length === 0 ? [] : [concern("levels-not-used", "check", { kind: "case" }, { levels: levels.length })];
