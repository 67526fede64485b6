import { quantityConvert } from "../../units/index.ts";
import { type ConcernRule, clockMs, concern } from "../concernRule.ts";
import { isTroughTime, untilNextDose } from "../troughTime.ts";
import { sourceText } from "../typicalModel.ts";

/** A measured level reaches the record's toxic limit; where that is for the level just before a dose, only a level drawn then. */
export const levelToxic: ConcernRule = (context) => {
  const { medicine, timeZone } = context.case;
  const limit = medicine.toxicFrom;
  if (!limit) return [];
  const at = medicine.toxicAt ?? "any";
  const from = quantityConvert({ value: limit.value, unit: limit.unit }, "mg/L", medicine.molarMass.value);
  return context.levels.flatMap((level) => {
    const { id, atH, measured, afterDoseH } = level;
    if (level.excluded !== null || level.belowLimit || atH > context.clock.nowH || measured < from) return [];
    if (at === "trough") {
      const leftH = afterDoseH === null ? null : untilNextDose(context, atH, afterDoseH);
      if (afterDoseH === null || leftH === null || !isTroughTime(afterDoseH, leftH)) return [];
    }
    const data = {
      atMs: clockMs(context, atH),
      zone: timeZone,
      at,
      measured,
      from,
      source: sourceText(medicine, limit.source),
    };
    return [concern("level-toxic", "stop", { kind: "level", id }, data)];
  });
};
