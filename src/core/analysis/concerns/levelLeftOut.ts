import { type ConcernRule, clockMs, concern } from "../concernRule.ts";

export const levelLeftOut: ConcernRule = (context) =>
  context.levels
    .filter((level) => level.excluded !== null)
    .map((level) =>
      concern(
        "level-left-out",
        "note",
        { kind: "level", id: level.id },
        {
          atMs: clockMs(context, level.atH),
          zone: context.case.timeZone,
          reason: level.excluded,
        },
      ),
    );
