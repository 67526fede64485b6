import { decimalOf, decimalScaled } from "./decimal.ts";
import type { Quantity, UnitCode } from "./quantity.ts";
import { UNIT_TABLE, type UnitDimension } from "./unitTable.ts";

/**
 * The number of `to` units in a quantity.
 *
 * same dimension: value · factor(from) / factor(to)
 * mass → molar concentration: nmol/L = ug/L · 1000 / M; molar → mass: ug/L = nmol/L · M / 1000
 * mass → amount of substance: mmol = ug / (1000 · M); amount → mass: ug = mmol · 1000 · M
 *
 * @param quantity any finite value in any unit of the table
 * @param to unit wanted
 * @param molarMassGPerMol M, g/mol, greater than 0; needed only between mass and mole
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

  const steps = stepsPerMole(source.dimension, target.dimension);
  if (!steps) {
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
  return steps.isToMolar
    ? decimalScaled(value, source.factor * steps.molar * down, target.factor * steps.mass * molarTop)
    : decimalScaled(value, source.factor * steps.mass * molarTop, target.factor * steps.molar * down);
}

/** M gram make 1 mole: molar = mass · steps.molar / (M · steps.mass), in the table's smallest steps. null for any other pair. */
function stepsPerMole(
  from: UnitDimension,
  to: UnitDimension,
): { readonly isToMolar: boolean; readonly molar: bigint; readonly mass: bigint } | null {
  const isFromMass = from === "mass" || from === "mass concentration";
  const pair = isFromMass ? `${from}|${to}` : `${to}|${from}`;
  // ug/L and nmol/L; ug and mmol.
  if (pair === "mass concentration|molar concentration") return { isToMolar: isFromMass, molar: 1000n, mass: 1n };
  if (pair === "mass|amount of substance") return { isToMolar: isFromMass, molar: 1n, mass: 1000n };
  return null;
}
