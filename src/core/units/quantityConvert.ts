import { decimalOf, decimalScaled } from "./decimal.ts";
import type { Quantity, UnitCode } from "./quantity.ts";
import { UNIT_TABLE } from "./unitTable.ts";

/**
 * The number of `to` units in a quantity.
 *
 * same dimension: value · factor(from) / factor(to)
 * mass → molar concentration: nmol/L = ug/L · 1000 / M; molar → mass: ug/L = nmol/L · M / 1000
 *
 * @param quantity any finite value in any unit of the table
 * @param to unit wanted
 * @param molarMassGPerMol M, g/mol, greater than 0; needed only between mass and molar concentration
 * @returns the value in `to`
 *
 * Outside: throws RangeError when the dimensions differ, when a mass ↔ molar conversion lacks the molar mass, and for a value that is not finite.
 * Accuracy: exact rational arithmetic on the shortest decimals of value and molar mass, rounded once to double (relative error ≤ 1.2e-16).
 * Source: UCUM definitions of the units; 1 mol of a substance weighs M gram by definition.
 * Example: 5 mg is 0.005 g; 10 mg/L of theophylline (180.17 g/mol) is 55.50313592717988 umol/L.
 */
export function quantityConvert(quantity: Quantity, to: UnitCode, molarMassGPerMol?: number): number {
  const value = decimalOf(quantity.value);
  if (quantity.unit === to) return quantity.value;
  const source = UNIT_TABLE[quantity.unit];
  const target = UNIT_TABLE[to];
  if (source.dimension === target.dimension) return decimalScaled(value, source.factor, target.factor);

  const isToMolar = source.dimension === "mass concentration" && target.dimension === "molar concentration";
  const isToMass = source.dimension === "molar concentration" && target.dimension === "mass concentration";
  if (!isToMolar && !isToMass) {
    throw new RangeError(
      `to: ${quantity.unit} (${source.dimension}) cannot be converted to ${to} (${target.dimension})`,
    );
  }
  if (molarMassGPerMol === undefined || !(molarMassGPerMol > 0) || !Number.isFinite(molarMassGPerMol)) {
    throw new RangeError(
      `molarMassGPerMol: ${molarMassGPerMol}; ${quantity.unit} to ${to} needs a molar mass above 0 g/mol`,
    );
  }
  const molarMass = decimalOf(molarMassGPerMol);
  const up = molarMass.exponent >= 0 ? 10n ** BigInt(molarMass.exponent) : 1n;
  const down = molarMass.exponent < 0 ? 10n ** BigInt(-molarMass.exponent) : 1n;
  const molarTop = molarMass.digits * up;
  return isToMolar
    ? decimalScaled(value, source.factor * 1000n * down, target.factor * molarTop)
    : decimalScaled(value, source.factor * molarTop, target.factor * 1000n * down);
}
