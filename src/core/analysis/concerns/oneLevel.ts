import { type ConcernRule, concern } from "../concernRule.ts";
import { TAUGHT_LITTLE } from "../taughtThresholds.ts";

/** One level used: what it did not teach is the record's. */
export const oneLevel: ConcernRule = ({ fit }) => {
  if (fit.kind !== "fitted" || fit.fit.levelsUsed.length !== 1) return [];
  const parameters = fit.fit.parameters
    .filter(({ taught, omega }) => omega > 0 && taught < TAUGHT_LITTLE)
    .map(({ words }) => words.charAt(0).toLowerCase() + words.slice(1));
  return parameters.length === 0 ? [] : [concern("one-level", "note", { kind: "case" }, { parameters })];
};
