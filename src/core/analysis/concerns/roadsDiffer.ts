import { type ConcernRule, concern } from "../concernRule.ts";

/** The two roads to the figures do not meet: something in the program is wrong. */
export const roadsDiffer: ConcernRule = ({ crossCheck }) =>
  crossCheck === null || crossCheck.isAgreed
    ? []
    : [concern("roads-differ", "stop", { kind: "case" }, { worst: crossCheck.worst, where: crossCheck.where })];
