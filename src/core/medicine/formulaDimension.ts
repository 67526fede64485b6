/** What kind of quantity a part of a formula is: its powers of mass, length, time and amount of substance. A plain number has none. */
export interface Dimension {
  readonly mass: number;
  readonly length: number;
  readonly time: number;
  readonly amount: number;
}

const BASES = ["mass", "length", "time", "amount"] as const;

export const PLAIN: Dimension = { mass: 0, length: 0, time: 0, amount: 0 };

/** Powers that fractional exponents bring about are compared to this. */
const SAME = 1e-9;

export function dimensionIs(a: Dimension, b: Dimension): boolean {
  return BASES.every((base) => Math.abs(a[base] - b[base]) < SAME);
}

/** a · b^power */
export function dimensionTimes(a: Dimension, b: Dimension, power = 1): Dimension {
  return {
    mass: a.mass + b.mass * power,
    length: a.length + b.length * power,
    time: a.time + b.time * power,
    amount: a.amount + b.amount * power,
  };
}

/** The largest power in it, without its sign. */
export function dimensionSize(dimension: Dimension): number {
  return Math.max(...BASES.map((base) => Math.abs(dimension[base])));
}

const ALONE: Readonly<Record<(typeof BASES)[number], string>> = {
  mass: "mass",
  length: "length",
  time: "time",
  amount: "amount of substance",
};

/** In words or units a pharmacist reads: "mass", "L/h/kg", "mg/L", "a plain number". Always the same text for the same dimension. */
export function dimensionText(dimension: Dimension): string {
  if (dimensionIs(dimension, PLAIN)) return "a plain number";
  const alone = BASES.find((base) => dimensionIs(dimension, { ...PLAIN, [base]: 1 }));
  if (alone) return ALONE[alone];
  const powers = unitPowers(dimension).filter(([, power]) => Math.abs(power) >= SAME);
  const above = powers.filter(([, power]) => power > 0).map(([unit, power]) => powerText(unit, power));
  const below = powers.filter(([, power]) => power < 0).map(([unit, power]) => `/${powerText(unit, -power)}`);
  return `${above.join("\u00b7") || "1"}${below.join("")}`;
}

/** Volume in litres where the length is a cube, else centimetres; a mass in mg above the line, in kg below it. */
function unitPowers({ mass, length, time, amount }: Dimension): [string, number][] {
  const isVolume = Math.abs(length / 3 - Math.round(length / 3)) < SAME;
  const isSurface = Math.abs(Math.abs(length) - 2) < SAME;
  return [
    ["mg", Math.max(mass, 0)],
    ["mmol", amount],
    ["h", time],
    isVolume ? ["L", length / 3] : isSurface ? ["m2", length / 2] : ["cm", length],
    ["kg", Math.min(mass, 0)],
  ];
}

function powerText(unit: string, power: number): string {
  const rounded = Math.round(power * 1e6) / 1e6;
  return rounded === 1 ? unit : `${unit}^${rounded}`;
}
