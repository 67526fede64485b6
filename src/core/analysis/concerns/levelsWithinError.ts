import { instantText } from "../../time/index.ts";
import { type ConcernRule, clockMs, concern } from "../concernRule.ts";
import { usedLevels } from "../usedLevels.ts";

/** Two used levels one after the other, no dose between them, that differ by less than the standard deviation of their difference. */
export const levelsWithinError: ConcernRule = (context) => {
  const used = usedLevels(context).filter((level) => !level.belowLimit);
  return used.slice(1).flatMap((later, i) => {
    const earlier = used[i]!;
    if (earlier.assaySd === null || later.assaySd === null || earlier.atH === later.atH) return [];
    const isDosedBetween = context.given.some(
      (mark) => mark.countedMg > 0 && mark.atH >= earlier.atH && mark.atH < later.atH,
    );
    const difference = Math.abs(later.measured - earlier.measured);
    const error = Math.hypot(earlier.assaySd, later.assaySd);
    if (isDosedBetween || difference >= error) return [];
    const times = [earlier, later].map((level) =>
      instantText(clockMs(context, level.atH), context.case.timeZone, "dayClock"),
    );
    return [concern("levels-within-error", "note", { kind: "level", id: later.id }, { times, difference, error })];
  });
};
