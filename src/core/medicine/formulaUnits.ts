import { type Dimension, dimensionTimes, PLAIN } from "./formulaDimension.ts";

/** An exact number: how many of the base units (kg, dm, h, mmol) one of a unit is. */
export interface Ratio {
  readonly top: bigint;
  readonly bottom: bigint;
}

/** A unit written in a formula, or made by multiplying and dividing such. */
export interface FormulaUnit {
  readonly dimension: Dimension;
  readonly scale: Ratio;
}

const one = { top: 1n, bottom: 1n };
const of = (dimension: Partial<Dimension>, top: bigint, bottom = 1n): FormulaUnit => ({
  dimension: { ...PLAIN, ...dimension },
  scale: { top, bottom },
});

export const UNIT_ONE: FormulaUnit = { dimension: PLAIN, scale: one };

/** The unit words a formula may use. A year is UCUM's `a` (365.25 d), a month a twelfth of it, a litre a cubic decimetre. */
export const UNIT_WORDS: Readonly<Record<string, FormulaUnit>> = {
  kg: of({ mass: 1 }, 1n),
  g: of({ mass: 1 }, 1n, 1_000n),
  mg: of({ mass: 1 }, 1n, 1_000_000n),
  ug: of({ mass: 1 }, 1n, 1_000_000_000n),
  L: of({ length: 3 }, 1n),
  mL: of({ length: 3 }, 1n, 1_000n),
  h: of({ time: 1 }, 1n),
  min: of({ time: 1 }, 1n, 60n),
  d: of({ time: 1 }, 24n),
  mo: of({ time: 1 }, 1_461n, 2n),
  a: of({ time: 1 }, 8_766n),
  cm: of({ length: 1 }, 1n, 10n),
  m: of({ length: 1 }, 10n),
  m2: of({ length: 2 }, 100n),
  mol: of({ amount: 1 }, 1_000n),
  mmol: of({ amount: 1 }, 1n),
  umol: of({ amount: 1 }, 1n, 1_000n),
  nmol: of({ amount: 1 }, 1n, 1_000_000n),
};

/** a · b^power, exactly; `power` a whole number. */
export function unitTimes(a: FormulaUnit, b: FormulaUnit, power = 1): FormulaUnit {
  return {
    dimension: dimensionTimes(a.dimension, b.dimension, power),
    scale: ratioTimes(a.scale, ratioPower(b.scale, power)),
  };
}

export function ratioTimes(a: Ratio, b: Ratio): Ratio {
  const top = a.top * b.top;
  const bottom = a.bottom * b.bottom;
  const common = commonDivisor(top, bottom);
  return { top: top / common, bottom: bottom / common };
}

export function ratioPower({ top, bottom }: Ratio, power: number): Ratio {
  const times = BigInt(Math.abs(power));
  return power < 0 ? { top: bottom ** times, bottom: top ** times } : { top: top ** times, bottom: bottom ** times };
}

/** The unit a covariate or a result is in: a code such as "mL/min", "L/h", "m2", "1". */
export function unitOfCode(code: string): FormulaUnit {
  if (code === "1") return UNIT_ONE;
  return code.split("/").reduce((unit, word, i) => {
    const known = UNIT_WORDS[word];
    if (!known) throw new RangeError(`code: "${code}" has no part "${word}" among the units of formulas`);
    return unitTimes(unit, known, i === 0 ? 1 : -1);
  }, UNIT_ONE);
}

function commonDivisor(a: bigint, b: bigint): bigint {
  let [x, y] = [a, b];
  while (y !== 0n) [x, y] = [y, x % y];
  return x;
}
