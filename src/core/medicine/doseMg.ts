import type { DoseAmount } from "../regimen/index.ts";
import { fail, issue, type Result, succeed } from "../result/index.ts";
import { quantityConvert, type UnitCode } from "../units/index.ts";
import type { Product } from "./medicineRecord.ts";

const MASS_UNITS: readonly UnitCode[] = ["mg", "g", "ug"];

/** Units a dose of this product may be written in: mass always, volume for a liquid. */
export function productDoseUnits(product: Product): readonly UnitCode[] {
  return product.concentration ? [...MASS_UNITS, "mL"] : MASS_UNITS;
}

/**
 * An amount of a product in mg as the product is labelled: what is counted in tablets and printed on an order.
 * mass: converted; volume: mL · concentration (mg/mL)
 * A volume of a product that has no concentration gives "dose-unit-mismatch"; an amount that is not above 0, "dose-amount".
 * Accuracy: mass exact; volume one rounding. Example: 15 mL of 80 mg in 15 mL is 80 mg.
 */
export function doseLabelledMg(amount: DoseAmount, product: Product): Result<number> {
  const { value, unit } = amount;
  if (!Number.isFinite(value) || value <= 0) return fail(issue("dose-amount", { found: value, unit }, ["value"]));
  if (unit !== "mL") return succeed(quantityConvert(amount, "mg"));
  if (product.concentration) return succeed(value * quantityConvert(product.concentration, "mg/mL"));
  return fail(
    issue("dose-unit-mismatch", { unit, product: product.name, allowed: productDoseUnits(product) }, ["unit"]),
  );
}

/**
 * An amount of a product in mg of the active moiety: what the kinetics count.
 * labelled mg · salt factor (1 where the product states none)
 * Issues and accuracy as doseLabelledMg, one more rounding where there is a salt factor.
 * Never for an order or a count of tablets: those are labelled mg.
 * Example: one capsule of 100 mg of a sodium salt with a salt factor of 0.92 is 92 mg.
 */
export function doseMg(amount: DoseAmount, product: Product): Result<number> {
  const labelled = doseLabelledMg(amount, product);
  if (!labelled.ok || !product.saltFactor) return labelled;
  return succeed(labelled.value * product.saltFactor.value);
}
