import type { UnitCode } from "./quantity.ts";
import { unitDimension } from "./unitTable.ts";

const PAIRS_BY_MOLAR_MASS: ReadonlySet<string> = new Set([
  "amount of substance|mass",
  "mass concentration|molar concentration",
]);

/** Whether a value in `a` can be converted to `b`; `molarMass: true` says that the substance's molar mass is at hand. */
export function unitsCompatible(
  a: UnitCode,
  b: UnitCode,
  options: { readonly molarMass: boolean } = { molarMass: false },
): boolean {
  const [first, second] = [unitDimension(a), unitDimension(b)];
  if (first === second) return true;
  return options.molarMass && PAIRS_BY_MOLAR_MASS.has([first, second].sort().join("|"));
}
