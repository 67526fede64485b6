import { quantityConvert } from "../../units/index.ts";
import { type ConcernRule, concern } from "../concernRule.ts";
import type { IndividualReadings, Spread } from "../fitTypes.ts";
import { sourceText } from "../typicalModel.ts";

/** This patient's highest concentration, or the highest just before a dose at steady state where the limit is for that, may reach the record's toxic limit: 1 in 20 is pointed out, 1 in 4 is grave. Read off the quantiles, so "at least". */
export const optionChanceToxic: ConcernRule = ({ case: { medicine }, options }) => {
  const limit = medicine.toxicFrom;
  if (!limit) return [];
  const at = medicine.toxicAt ?? "any";
  const from = quantityConvert({ value: limit.value, unit: limit.unit }, "mg/L", medicine.molarMass.value);
  return options.flatMap((option) => {
    if (!option.individual) return [];
    const peak = highest(option.individual, at);
    if (!peak) return [];
    const chance =
      peak.q05 >= from ? 0.95 : peak.q50 >= from ? 0.5 : peak.q75 >= from ? 0.25 : peak.q95 >= from ? 0.05 : 0;
    return chance === 0
      ? []
      : [
          concern(
            "option-chance-toxic",
            chance >= 0.25 ? "stop" : "check",
            { kind: "option", id: option.id },
            {
              option: option.id,
              at,
              chance,
              from,
              median: peak.q50,
              low: peak.q05,
              high: peak.q95,
              source: sourceText(medicine, limit.source),
            },
          ),
        ];
  });
};

function highest({ span, steadyState }: IndividualReadings, at: "any" | "trough"): Spread | null {
  if (at === "trough") return steadyState?.highestTrough ?? null;
  return steadyState && steadyState.peak.q95 > span.peak.q95 ? steadyState.peak : span.peak;
}
