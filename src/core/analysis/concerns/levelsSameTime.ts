import { instantText } from "../../time/index.ts";
import { type ConcernRule, clockMs, concern } from "../concernRule.ts";
import { usedLevels } from "../usedLevels.ts";

/** Used levels that share one clock time: one concern a time. */
export const levelsSameTime: ConcernRule = (context) => {
  const used = usedLevels(context);
  const times = new Set(used.map((level) => level.atH));
  return [...times].flatMap((atH) => {
    const same = used.filter((level) => level.atH === atH);
    const time = instantText(clockMs(context, atH), context.case.timeZone, "dayClock");
    return same.length > 1
      ? [concern("levels-same-time", "check", { kind: "level", id: same[1]!.id }, { count: same.length, time })]
      : [];
  });
};
