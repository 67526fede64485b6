import type { Analysis } from "../../core/analysis/index.ts";

/**
 * An analysis whose fit is being worked out, with an earlier one's in its place, so that bands and intervals stay in sight meanwhile.
 * Whoever shows it marks it as earlier. Where the two don't lie on one clock nothing is carried.
 */
export function fitCarried(to: Analysis, from: Analysis | null): Analysis {
  if (to.fit?.kind !== "pending" || from?.fit?.kind !== "fitted") return to;
  if (from.clock.originMs !== to.clock.originMs) return to;
  return {
    ...to,
    fit: from.fit,
    givenBand: from.givenBand,
    levels: to.levels.map((level) => ({ ...level, fit: from.levels.find(({ id }) => id === level.id)?.fit ?? null })),
    options: to.options.map((option) => {
      const earlier = from.options.find(({ id }) => id === option.id);
      return { ...option, individual: earlier?.individual ?? null, band: earlier?.band ?? null };
    }),
  };
}
