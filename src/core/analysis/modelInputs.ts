import type { ModelHistory, ModelInput } from "../kinetics/index.ts";
import type { Model } from "./analysisTypes.ts";

type Doses = ReadonlyMap<string, readonly { readonly time: number; readonly amount: number }[]>;

/** The doses of each product with that product's absorption; products without doses are left out. */
export function modelInputs(model: Model, doses: Doses): ModelInput[] {
  return model.products.flatMap((product) => {
    const own = doses.get(product.product);
    if (!own || own.length === 0) return [];
    return [
      {
        absorption: product.absorption,
        bioavailability: product.bioavailability.value,
        lag: product.lag.value,
        doses: own,
      },
    ];
  });
}

/** Doses and kinetics as the kinetics core takes them, whatever the kind. */
export function modelHistory(model: Model, doses: Doses): ModelHistory {
  return { dispositions: model.dispositions, inputs: modelInputs(model, doses) };
}

/** The kinetics a course of doses settles into: those in force last. */
export function finalDisposition(model: Model): ModelHistory["dispositions"][number]["disposition"] {
  return model.dispositions.at(-1)!.disposition;
}
