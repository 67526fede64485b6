import { type ConcernRule, clockMs, concern } from "../concernRule.ts";

/** A measured level beyond this ratio of the predicted one, either way, is pointed out (our own rule, not a published limit). */
export const FAR_RATIO = 1.5;

export const levelFarOff: ConcernRule = (context) =>
  context.levels.flatMap((level) => {
    // With a fit the prior predictive check says it better: it knows how much patients differ.
    if (level.fit !== null) return [];
    if (level.predicted === null || level.excluded !== null || level.belowLimit || level.predicted <= 0) return [];
    const ratio = level.measured / level.predicted;
    return ratio > FAR_RATIO || ratio < 1 / FAR_RATIO
      ? [
          concern(
            "level-far-off",
            "check",
            { kind: "level", id: level.id },
            {
              atMs: clockMs(context, level.atH),
              zone: context.case.timeZone,
              measured: level.measured,
              predicted: level.predicted,
              ratio,
              isFitted: context.fit.kind === "fitted",
            },
          ),
        ]
      : [];
  });
