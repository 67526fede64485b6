import { type ConcernRule, concern } from "../concernRule.ts";

/** A dose line that can't be placed on the clock or doesn't fit its product: its doses are not counted. */
export const linesUnreadable: ConcernRule = ({ lineIssues }) =>
  lineIssues.map(({ lane, lineId, issue }) =>
    concern(
      "line-not-counted",
      "stop",
      lane === "given" ? { kind: "given", id: lineId } : { kind: "option", id: `${lane}/${lineId}` },
      { lane, issue },
    ),
  );
