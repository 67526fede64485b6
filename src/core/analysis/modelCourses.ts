import type { Course, Disposition } from "../kinetics/index.ts";
import type { Model } from "./analysisTypes.ts";

/** The one-compartment disposition of a model as the kinetics core takes it. */
export function modelDisposition(model: Model): Disposition {
  return { ke: model.eliminationRate.value, volume: model.volume.value };
}

/** The doses of each product with that product's absorption; products without doses are left out. */
export function modelCourses(
  model: Model,
  doses: ReadonlyMap<string, readonly { readonly time: number; readonly amount: number }[]>,
): Course[] {
  return model.products.flatMap((product) => {
    const own = doses.get(product.product);
    if (!own || own.length === 0) return [];
    return [
      {
        ka: product.absorptionRate.value,
        bioavailability: product.bioavailability.value,
        lag: product.lag.value,
        doses: own,
      },
    ];
  });
}
