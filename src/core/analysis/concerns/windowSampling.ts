import { quantityConvert } from "../../units/index.ts";
import { type ConcernRule, clockMs, concern } from "../concernRule.ts";
import { windowDrawn } from "../windowDrawn.ts";

/** A level drawn at another time after the dose than the window is about: the two are not to be compared as they stand. */
export const windowSampling: ConcernRule = (context) => {
  const { window, timeZone, medicine } = context.case;
  if (!window) return [];
  const earliest = medicine.earliestSample;
  return context.levels.flatMap((level) => {
    const { afterDoseH } = level;
    if (level.excluded !== null || afterDoseH === null || level.atH > context.clock.nowH) return [];
    // Sooner than the record allows at all is levelTooEarly's to say.
    if (earliest && afterDoseH < quantityConvert(earliest, "h")) return [];
    const drawn = windowDrawn(context, level);
    if (drawn === null || drawn.kind === "as-meant") return [];
    const { kind, ...found } = drawn;
    const code = kind === "off-hours" ? "level-off-window-time" : "level-not-trough";
    const atMs = clockMs(context, level.atH);
    const data = { atMs, zone: timeZone, afterDoseH, quantity: window.quantity, ...found };
    return [concern(code, "check", { kind: "level", id: level.id }, data)];
  });
};
