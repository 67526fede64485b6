import { absorbedAfter } from "../absorbedAfter.ts";
import { type ConcernRule, clockMs, concern } from "../concernRule.ts";

/** A level before any dose, later than the now line, or drawn while the last dose was still being absorbed. */
export const levelTiming: ConcernRule = (context) => {
  const { levels, given, model, clock } = context;
  return levels.flatMap((level) => {
    const at = {
      atMs: clockMs(context, level.atH),
      zone: context.case.timeZone,
      isFitted: context.fit.kind === "fitted",
    };
    const about = { kind: "level", id: level.id } as const;
    if (level.excluded !== null) return [];
    if (level.atH > clock.nowH) return [concern("level-after-now", "stop", about, at)];
    if (level.afterDoseH === null) return [concern("level-before-dose", "stop", about, at)];
    const last = given.filter((mark) => mark.countedMg > 0 && mark.atH < level.atH).at(-1);
    const reading = model?.products.find((product) => product.product === last?.product);
    if (!reading || !model) return [];
    // Sooner than the record's source allows is levelTooEarly's to say.
    const earliestH = context.case.medicine.earliestSample?.value ?? 0;
    if (level.afterDoseH < earliestH) return [];
    const distributedH = model.distributionEndH[reading.product] ?? 0;
    if (distributedH > reading.lag.value && level.afterDoseH < distributedH) {
      return [
        concern("level-while-distributing", "check", about, { ...at, afterDoseH: level.afterDoseH, distributedH }),
      ];
    }
    const absorbedH = reading.lag.value + absorbedAfter(reading.absorption);
    return level.afterDoseH < absorbedH
      ? [concern("level-while-absorbing", "note", about, { ...at, afterDoseH: level.afterDoseH, absorbedH })]
      : [];
  });
};
