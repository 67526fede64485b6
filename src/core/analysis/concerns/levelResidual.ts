import { type ConcernRule, concern } from "../concernRule.ts";
import { levelMisfits } from "../levelMisfit.ts";

/** A used level that this patient's curve does not meet. */
export const levelResidual: ConcernRule = (context) =>
  levelMisfits(context)
    .filter((misfit) => !misfit.isAlone)
    .map(({ level, gravity, data }) => concern("level-residual", gravity, { kind: "level", id: level.id }, data));
