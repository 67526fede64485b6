import type { Absorption } from "../kinetics/index.ts";
import type { Figure } from "./figureSchema.ts";
import type { Product } from "./medicineRecord.ts";

/**
 * How a product is absorbed, as the kinetics take it: rates in 1/h, durations in h.
 * A product without an `input` is first-order by its absorption rate. A product that a record could not hold throws a RangeError.
 */
export function productAbsorption(product: Product): Absorption {
  const { input } = product;
  if (input === undefined)
    return { kind: "first-order", ka: stated(product, "absorptionRate", product.absorptionRate) };
  if (input.kind === "zero-order") return { kind: "zero-order", duration: input.duration.value };
  return {
    kind: "mixed",
    fastFraction: input.fastFraction.value,
    fastKa: stated(product, "absorptionRate", product.absorptionRate),
    slow: input.slowDuration
      ? { kind: "zero-order", duration: input.slowDuration.value }
      : { kind: "first-order", ka: stated(product, "input.slowRate", input.slowRate) },
    slowLag: input.slowLag.value,
  };
}

function stated(product: Product, name: string, figure: Figure | undefined): number {
  if (figure) return figure.value;
  throw new RangeError(`${name}: not stated for the product "${product.id}"`);
}
