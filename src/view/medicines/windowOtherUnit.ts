import type { RecordWindow } from "../../core/medicine/index.ts";
import { type Quantity, quantityConvert, type UnitCode } from "../../core/units/index.ts";

const MASS: readonly UnitCode[] = ["mg/L", "ug/L"];
const MOLAR: readonly UnitCode[] = ["mmol/L", "umol/L", "nmol/L"];

/** A window of a mass concentration by amount, and the other way round; null for an exposure. The unit is the largest in which its high end is 1 or more. */
export function windowOtherUnit(
  { low, high }: Pick<RecordWindow, "low" | "high">,
  molarMass: number,
): { readonly low: Quantity; readonly high: Quantity } | null {
  if (high.unit === "mg.h/L") return null;
  const units = MASS.includes(high.unit) ? MOLAR : MASS;
  const unit = units.find((each) => quantityConvert(high, each, molarMass) >= 1) ?? (units.at(-1) as UnitCode);
  const other = (end: Quantity) => ({ value: rounded(quantityConvert(end, unit, molarMass)), unit });
  return { low: other(low), high: other(high) };
}

/** Three digits: a converted end is for the eye. */
function rounded(value: number): number {
  return Number(value.toPrecision(3));
}
