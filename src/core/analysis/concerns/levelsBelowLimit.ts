import { instantText } from "../../time/index.ts";
import { type ConcernRule, clockMs, concern } from "../concernRule.ts";
import { usedLevels } from "../usedLevels.ts";

/** Levels that say only that the concentration was below the assay's limit. */
export const levelsBelowLimit: ConcernRule = (context) => {
  const below = usedLevels(context).filter((level) => level.belowLimit);
  const times = below.map((level) => instantText(clockMs(context, level.atH), context.case.timeZone, "dayClock"));
  return below.length === 0
    ? []
    : [concern("levels-below-limit", "note", { kind: "case" }, { count: below.length, times })];
};
