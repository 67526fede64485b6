import type { LevelResult } from "./analysisTypes.ts";
import type { ConcernContext } from "./concernRule.ts";
import type { LevelFit } from "./fitTypes.ts";

export type UsedLevel = LevelResult & { readonly fit: LevelFit };

/** The levels that went into the fit, in time order; none without a fit. */
export function usedLevels({ fit, levels }: Pick<ConcernContext, "fit" | "levels">): readonly UsedLevel[] {
  if (fit.kind !== "fitted") return [];
  const used = new Set(fit.fit.levelsUsed);
  return levels.filter((level): level is UsedLevel => used.has(level.id) && level.fit !== null);
}
