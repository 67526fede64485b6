import { quantityConvert } from "../../units/index.ts";
import { type ConcernRule, clockMs, concern } from "../concernRule.ts";

/** Beyond the record's windows by this factor, either way, a slip of the unit is likelier than the value (units slip by 1000). Our own rule, common practice; the same is asked when a level is typed. */
export const RANGE_FACTOR = 20;

/** A level out of any sane range that counts: files and other tools can bring what the form would have asked about. */
export const levelOutOfRange: ConcernRule = (context) => {
  const { medicine } = context.case;
  const windows = medicine.windows.filter((window) => window.high.unit === "mg/L");
  if (windows.length === 0) return [];
  const inMgPerL = (edge: (typeof windows)[number]["high"]) =>
    quantityConvert({ value: edge.value, unit: edge.unit }, "mg/L", medicine.molarMass.value);
  const high = Math.max(...windows.map((window) => inMgPerL(window.high)));
  const low = Math.min(...windows.map((window) => inMgPerL(window.low) || inMgPerL(window.high)));
  return context.levels.flatMap((level) => {
    if (level.excluded !== null || level.belowLimit) return [];
    if (level.measured <= high * RANGE_FACTOR && level.measured >= low / RANGE_FACTOR) return [];
    return [
      concern(
        "level-out-of-range",
        "stop",
        { kind: "level", id: level.id },
        { atMs: clockMs(context, level.atH), zone: context.case.timeZone, measured: level.measured, low, high },
      ),
    ];
  });
};
