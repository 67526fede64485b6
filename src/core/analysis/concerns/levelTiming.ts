import { type ConcernRule, clockMs, concern } from "../concernRule.ts";

/** A level before any dose, later than the now line, or drawn while the last dose was still being absorbed. */
export const levelTiming: ConcernRule = (context) => {
  const { levels, given, model, clock } = context;
  return levels.flatMap((level) => {
    const at = { atMs: clockMs(context, level.atH), zone: context.case.timeZone };
    const about = { kind: "level", id: level.id } as const;
    if (level.atH > clock.nowH) return [concern("level-after-now", "stop", about, at)];
    if (level.afterDoseH === null) return [concern("level-before-dose", "stop", about, at)];
    const last = given.filter((mark) => mark.countedMg > 0 && mark.atH < level.atH).at(-1);
    const reading = model?.products.find((product) => product.product === last?.product);
    if (!reading || !model) return [];
    // Three absorption half-lives after the lag: 88 % of the dose has left the gut (definition of a half-life).
    const absorbedH = reading.lag.value + (3 * Math.LN2) / reading.absorptionRate.value;
    return level.afterDoseH < absorbedH && level.excluded === null
      ? [concern("level-while-absorbing", "note", about, { ...at, afterDoseH: level.afterDoseH, absorbedH })]
      : [];
  });
};
