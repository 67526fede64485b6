import { concentrationSense } from "../../medicine/index.ts";
import { type ConcernRule, clockMs, concern } from "../concernRule.ts";

/**
 * A level that counts and makes no sense as it stands: beyond twenty times what the record knows, or everyday only in another unit and not confirmed.
 * Files and other tools can bring what the form would have asked about.
 */
export const levelOutOfRange: ConcernRule = (context) => {
  const { medicine, levels: entered } = context.case;
  return context.levels.flatMap((level) => {
    const sense = concentrationSense({ value: level.measured, unit: "mg/L" }, medicine);
    if (!sense || level.excluded !== null) return [];
    const { lowMgPerL: low, highMgPerL: high } = sense;
    const about = { kind: "level", id: level.id } as const;
    const at = { atMs: clockMs(context, level.atH), zone: context.case.timeZone };
    const data = { ...at, measured: level.measured, low, high };
    if (sense.isFar && !level.belowLimit) return [concern("level-out-of-range", "stop", about, data)];
    // As it was typed: the number is what may be meant in another unit.
    const typed = entered.find((each) => each.id === level.id);
    const typedSense = typed && concentrationSense(typed.quantity, medicine);
    return typedSense?.verdict === "other-unit" && !typed?.confirmed
      ? [
          concern("level-unit-doubtful", "check", about, {
            ...data,
            quantity: typed?.quantity,
            units: typedSense.units,
          }),
        ]
      : [];
  });
};
