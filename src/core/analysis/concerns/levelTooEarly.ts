import { quantityConvert } from "../../units/index.ts";
import { type ConcernRule, clockMs, concern } from "../concernRule.ts";
import { sourceText } from "../typicalModel.ts";

/** A level drawn sooner after a dose than the record's source allows. */
export const levelTooEarly: ConcernRule = (context) => {
  const record = context.case.medicine;
  const { earliestSample } = record;
  if (!earliestSample) return [];
  const earliestH = quantityConvert(earliestSample, "h");
  return context.levels.flatMap((level) => {
    if (level.excluded !== null || level.afterDoseH === null || level.atH > context.clock.nowH) return [];
    if (level.afterDoseH >= earliestH) return [];
    return [
      concern(
        "level-too-early",
        "check",
        { kind: "level", id: level.id },
        {
          atMs: clockMs(context, level.atH),
          zone: context.case.timeZone,
          afterDoseH: level.afterDoseH,
          earliestH,
          source: sourceText(record, earliestSample.source),
        },
      ),
    ];
  });
};
