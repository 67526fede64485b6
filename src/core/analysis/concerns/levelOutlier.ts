import { type ConcernRule, concern } from "../concernRule.ts";
import { levelMisfits } from "../levelMisfit.ts";

/** The one level that stands against at least two others that agree with the curve. */
export const levelOutlier: ConcernRule = (context) =>
  levelMisfits(context)
    .filter((misfit) => misfit.isAlone)
    .map(({ level, gravity, data, others }) =>
      concern("level-outlier", gravity, { kind: "level", id: level.id }, { ...data, others }),
    );
