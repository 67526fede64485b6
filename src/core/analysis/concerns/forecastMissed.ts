import { type ConcernRule, clockMs, concern } from "../concernRule.ts";
import { usedLevels } from "../usedLevels.ts";

/** A level outside the 90 % interval forecast from the levels before it: this patient has changed, or one of them is not what it seems. */
export const forecastMissed: ConcernRule = (context) =>
  usedLevels(context).flatMap((level) => {
    const { forecast } = level.fit;
    if (!forecast || forecast.held || forecast.levelsKnown === 0) return [];
    const about = { kind: "level", id: level.id } as const;
    return [
      concern("forecast-missed", "check", about, {
        atMs: clockMs(context, level.atH),
        zone: context.case.timeZone,
        measured: level.measured,
        low: forecast.predictive.q05,
        high: forecast.predictive.q95,
      }),
    ];
  });
