import { type ConcernRule, concern } from "../concernRule.ts";

/** Levels without any counted dose, or options on top of no history: the prediction starts from nothing in the body. */
export const historyAssumed: ConcernRule = ({ given, options }) =>
  given.some((mark) => mark.countedMg > 0) || options.every((option) => option.doses.length === 0)
    ? []
    : [concern("starts-from-nothing", "note", { kind: "given" })];
