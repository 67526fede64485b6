import type { UnitCode } from "./quantity.ts";
import { unitDimension } from "./unitTable.ts";

/** Whether a value in `a` can be converted to `b`; `molarMass: true` says that the substance's molar mass is at hand. */
export function unitsCompatible(
  a: UnitCode,
  b: UnitCode,
  options: { readonly molarMass: boolean } = { molarMass: false },
): boolean {
  const [first, second] = [unitDimension(a), unitDimension(b)];
  if (first === second) return true;
  const pair = [first, second].sort().join("|");
  return options.molarMass && pair === "mass concentration|molar concentration";
}
