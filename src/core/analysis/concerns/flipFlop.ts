import { productOf } from "../../medicine/index.ts";
import { type ConcernRule, concern } from "../concernRule.ts";

/** Slow absorption and slow elimination can't be told apart from oral levels: said for a modified-release product in use, and for close rates. */
export const flipFlop: ConcernRule = ({ case: value, model, given, options, fit }) => {
  if (!model) return [];
  // This patient's own ambiguity says more.
  if (fit.kind === "fitted" && fit.fit.flipFlop?.isAmbiguous) return [];
  const used = new Set([...given, ...options.flatMap((option) => option.doses)].map((mark) => mark.product));
  return model.products.flatMap((reading) => {
    const product = productOf(value.medicine, reading.product);
    const { readings } = reading;
    if (!used.has(reading.product) || readings === null) return [];
    const close = readings.reason === "rates-within-20-percent";
    if (product.release !== "modified" && !close) return [];
    return [
      concern(
        "flip-flop",
        close ? "check" : "note",
        { kind: "medicine", id: product.id },
        {
          product: product.name,
          close,
          isFitted: fit.kind === "fitted",
          flipped: readings.assumed.flipFlop,
          eliminationHalfLifeH: readings.assumed.eliminationHalfLife,
          absorptionHalfLifeH: readings.assumed.absorptionHalfLife,
          otherVolume: readings.alternative.volume,
          otherHalfLifeH: readings.alternative.eliminationHalfLife,
          clearance: readings.assumed.clearance,
        },
      ),
    ];
  });
};
