import { instantText } from "../../time/index.ts";
import { type ConcernRule, clockMs, concern } from "../concernRule.ts";
import { usedLevels } from "../usedLevels.ts";

/** Used levels from before the kinetics last changed: what they taught is carried over in proportion. */
export const levelsBeforeChange: ConcernRule = (context) => {
  const last = context.model && context.model.dispositions.length > 1 ? context.model.dispositions.at(-1)! : null;
  const used = usedLevels(context);
  const before = last ? used.filter((level) => level.atH < last.from) : [];
  if (!last || before.length === 0) return [];
  const isAll = before.length === used.length;
  const time = instantText(clockMs(context, last.from), context.case.timeZone, "dayClock");
  return [
    concern(
      "levels-before-change",
      isAll ? "check" : "note",
      { kind: "patient" },
      { count: before.length, isAll, time },
    ),
  ];
};
