import { quantityConvert } from "../../units/index.ts";
import { type ConcernRule, concern } from "../concernRule.ts";
import { sourceText } from "../typicalModel.ts";

/** The highest predicted concentration reaches the record's toxic limit. */
export const optionToxic: ConcernRule = ({ case: { medicine, fit }, options }) => {
  const limit = medicine.toxicFrom;
  if (!limit) return [];
  const from = quantityConvert({ value: limit.value, unit: limit.unit }, "mg/L", medicine.molarMass.value);
  return options.flatMap((option) => {
    // Where the order rests on this patient, the chance of reaching it is said instead (optionChanceToxic).
    if (!option.typical || (option.individual && fit.use === "individual")) return [];
    const peak = Math.max(option.typical.span.peak, option.typical.steadyState?.peak ?? 0);
    return peak >= from
      ? [
          concern(
            "option-toxic",
            "stop",
            { kind: "option", id: option.id },
            { option: option.id, peak, from, source: sourceText(medicine, limit.source) },
          ),
        ]
      : [];
  });
};
