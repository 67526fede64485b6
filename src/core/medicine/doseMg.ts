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
 * An amount of a product in mg.
 * mass: converted; volume: mL · concentration (mg/mL)
 * A volume of a product that has no concentration gives "dose-unit-mismatch"; an amount that is not above 0, "dose-amount".
 * Accuracy: mass exact; volume one rounding. Example: 15 mL of 80 mg in 15 mL is 80 mg.
 */
export function doseMg(amount: DoseAmount, product: Product): Result<number> {
  const { value, unit } = amount;
  if (!Number.isFinite(value) || value <= 0) return fail(issue("dose-amount", { found: value, unit }, ["value"]));
  if (unit !== "mL") return succeed(quantityConvert(amount, "mg"));
  if (product.concentration) return succeed(value * quantityConvert(product.concentration, "mg/mL"));
  return fail(
    issue("dose-unit-mismatch", { unit, product: product.name, allowed: productDoseUnits(product) }, ["unit"]),
  );
}
