import { type ConcernRule, clockMs, concern } from "../concernRule.ts";
import { usedLevels } from "../usedLevels.ts";

/** Prior predictive check: outside what 95 % of such patients would have on these doses, residual error included. */
export const levelOutsidePrior: ConcernRule = (context) =>
  usedLevels(context).flatMap((level) => {
    const { isOutsidePrior, priorPredictive } = level.fit;
    return isOutsidePrior
      ? [
          concern(
            "level-outside-prior",
            "check",
            { kind: "level", id: level.id },
            {
              atMs: clockMs(context, level.atH),
              zone: context.case.timeZone,
              measured: level.measured,
              low: priorPredictive.low,
              high: priorPredictive.high,
            },
          ),
        ]
      : [];
  });
