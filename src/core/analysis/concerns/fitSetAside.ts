import { type ConcernRule, concern } from "../concernRule.ts";

/** There is a fit, and the case is set to order by the typical patient all the same. */
export const fitSetAside: ConcernRule = ({ case: value, fit }) =>
  fit.kind === "fitted" && value.fit.use === "typical"
    ? [concern("fit-set-aside", "check", { kind: "case" }, { levels: fit.fit.levelsUsed.length })]
    : [];
