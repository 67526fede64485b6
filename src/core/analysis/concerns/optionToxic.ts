import type { MedicineRecord } from "../../medicine/index.ts";
import { quantityConvert } from "../../units/index.ts";
import type { OptionReadings } from "../analysisTypes.ts";
import { type ConcernRule, concern } from "../concernRule.ts";
import { sourceText } from "../typicalModel.ts";

/** The highest predicted concentration, or the highest just before a dose where the limit is for that, reaches the record's toxic limit. */
export const optionToxic: ConcernRule = ({ case: { medicine, fit }, options, fit: state }) => {
  const limit = medicine.toxicFrom;
  if (!limit) return [];
  const isFitted = state.kind === "fitted";
  const at = medicine.toxicAt ?? "any";
  const from = quantityConvert({ value: limit.value, unit: limit.unit }, "mg/L", medicine.molarMass.value);
  return options.flatMap((option) => {
    // Where the order rests on this patient, the chance of reaching it is said instead (optionChanceToxic).
    if (!option.typical || (fit.use === "individual" && (option.individual?.toxicChance ?? null) !== null)) return [];
    const peak = highest(option.typical, at);
    return peak >= from
      ? [
          concern(
            "option-toxic",
            "stop",
            { kind: "option", id: option.id },
            { option: option.id, at, peak, from, source: sourceText(medicine, limit.source), isFitted },
          ),
        ]
      : [];
  });
};

type ToxicAt = NonNullable<MedicineRecord["toxicAt"]>;

function highest({ span, steadyState }: OptionReadings, at: ToxicAt): number {
  return at === "trough"
    ? Math.max(span.highestTrough ?? 0, steadyState?.highestTrough ?? 0)
    : Math.max(span.peak, steadyState?.peak ?? 0);
}
