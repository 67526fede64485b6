import { productOf } from "../../medicine/index.ts";
import { type ConcernRule, concern } from "../concernRule.ts";

/** Slow absorption and slow elimination can't be told apart from oral levels: said for a modified-release product in use, and for close rates. */
export const flipFlop: ConcernRule = ({ case: value, model, given, options }) => {
  if (!model) return [];
  const used = new Set([...given, ...options.flatMap((option) => option.doses)].map((mark) => mark.product));
  return model.products.flatMap((reading) => {
    const product = productOf(value.medicine, reading.product);
    if (!used.has(reading.product)) return [];
    const close = Math.abs(reading.absorptionRate.value / model.eliminationRate.value - 1) <= 0.2;
    if (product.release !== "modified" && !close) return [];
    return [
      concern(
        "flip-flop",
        close ? "check" : "note",
        { kind: "medicine", id: product.id },
        {
          product: product.name,
          close,
          flipped: reading.readings.assumed.flipFlop,
          eliminationHalfLifeH: reading.readings.assumed.eliminationHalfLife,
          absorptionHalfLifeH: reading.readings.assumed.absorptionHalfLife,
          otherVolume: reading.readings.alternative.volume,
          otherHalfLifeH: reading.readings.alternative.eliminationHalfLife,
          clearance: reading.readings.assumed.clearance,
        },
      ),
    ];
  });
};
