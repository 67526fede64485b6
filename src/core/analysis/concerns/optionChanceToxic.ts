import { quantityConvert } from "../../units/index.ts";
import { type ConcernRule, concern } from "../concernRule.ts";
import type { IndividualReadings, Spread } from "../fitTypes.ts";
import { sourceText } from "../typicalModel.ts";

/** Chances of reaching the toxic limit from which it is pointed out, and is grave. Our choice, no published limit. */
const POINTED_OUT_FROM = 0.05;
const GRAVE_FROM = 0.25;

/** This patient's highest concentration, or the highest just before a dose at steady state where the limit is for that, may reach the record's toxic limit. */
export const optionChanceToxic: ConcernRule = ({ case: { medicine }, options }) => {
  const limit = medicine.toxicFrom;
  if (!limit) return [];
  const at = medicine.toxicAt ?? "any";
  const from = quantityConvert({ value: limit.value, unit: limit.unit }, "mg/L", medicine.molarMass.value);
  return options.flatMap((option) => {
    const { individual } = option;
    const chance = individual?.toxicChance ?? 0;
    if (!individual || chance < POINTED_OUT_FROM) return [];
    const { peak, isSteady } = highest(individual, at);
    return [
      concern(
        "option-chance-toxic",
        chance >= GRAVE_FROM ? "stop" : "check",
        { kind: "option", id: option.id },
        {
          option: option.id,
          at,
          chance,
          from,
          median: peak?.q50 ?? null,
          low: peak?.q05 ?? null,
          high: peak?.q95 ?? null,
          isSteady,
          isSteadyCounted: individual.steadyState !== null || individual.shareNeverSteady > 0,
          shareNeverSteady: individual.shareNeverSteady,
          source: sourceText(medicine, limit.source),
        },
      ),
    ];
  });
};

/** The figure said beside the chance: where no steady-state figure is given, that of the span; before a dose there is none then. */
function highest(
  { span, steadyState }: IndividualReadings,
  at: "any" | "trough",
): { readonly peak: Spread | null; readonly isSteady: boolean } {
  if (at === "trough") return { peak: steadyState?.highestTrough ?? null, isSteady: true };
  return steadyState && steadyState.peak.q95 > span.peak.q95
    ? { peak: steadyState.peak, isSteady: true }
    : { peak: span.peak, isSteady: false };
}
