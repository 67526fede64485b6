import type { Gravity } from "./analysisTypes.ts";
import { type ConcernContext, clockMs } from "./concernRule.ts";
import { type UsedLevel, usedLevels } from "./usedLevels.ts";

/** Residual standard deviations: about 1 in 20 and 1 in 400 lie beyond them where the errors are normal (definition). */
export const RESIDUAL_CHECK = 2;
export const RESIDUAL_STOP = 3;

/** With fewer others it can't be said which of them is the odd one. */
const FEWEST_OTHERS = 2;

export interface Misfit {
  readonly level: UsedLevel;
  readonly standardised: number;
  /** How many other levels could be weighed against the curve. */
  readonly others: number;
  /** The only one that does not fit, among at least three. */
  readonly isAlone: boolean;
  readonly gravity: Gravity;
  /** For the sentence. */
  readonly data: Readonly<Record<string, unknown>>;
}

/**
 * Used levels beyond 2 residual standard deviations of this patient's curve. Beyond 3 with normal residuals the whole fit is
 * bent towards a level it can't meet: this patient's figures are not to be relied on until the level is explained. Robust
 * residuals have let go of it, so there it stays a "check".
 */
export function levelMisfits(context: ConcernContext): readonly Misfit[] {
  const residualModel = context.fit.kind === "fitted" ? context.fit.fit.residualModel : "normal";
  const weighed = usedLevels(context).flatMap((level) =>
    level.fit.standardised === null ? [] : [{ level, standardised: level.fit.standardised }],
  );
  const off = weighed.filter(({ standardised }) => Math.abs(standardised) > RESIDUAL_CHECK);
  return off.map(({ level, standardised }) => ({
    level,
    standardised,
    others: weighed.length - 1,
    isAlone: off.length === 1 && weighed.length > FEWEST_OTHERS,
    gravity: Math.abs(standardised) > RESIDUAL_STOP && residualModel === "normal" ? "stop" : "check",
    data: {
      atMs: clockMs(context, level.atH),
      zone: context.case.timeZone,
      measured: level.measured,
      standardised,
      influence: level.fit.influence,
      residualModel,
    },
  }));
}
