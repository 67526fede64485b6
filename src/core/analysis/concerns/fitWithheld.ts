import { type ConcernRule, concern } from "../concernRule.ts";

/** A fit was tried and can't be shown. "check": the typical curve stays and is right for what it is; a level that no patient could have needs its time or doses put right first. */
export const fitWithheld: ConcernRule = ({ fit }) =>
  fit.kind === "withheld"
    ? [
        concern(
          "fit-withheld",
          fit.reason === "level-not-explained" ? "stop" : "check",
          { kind: "case" },
          { reason: fit.reason, data: fit.data },
        ),
      ]
    : [];
