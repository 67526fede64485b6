import { type ConcernRule, concern } from "../concernRule.ts";

/** No prediction: a figure the record's formulas need is missing. */
export const modelIncomplete: ConcernRule = ({ modelIssues }) =>
  modelIssues.length === 0 ? [] : [concern("model-incomplete", "stop", { kind: "patient" }, { issues: modelIssues })];
