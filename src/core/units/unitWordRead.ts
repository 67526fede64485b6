import { UNIT_CODES, type UnitCode } from "./quantity.ts";

const STANDARD_SURFACE = "{1.73_m2}";

/** Spoken and written forms of the pieces a unit is made of, lower case; μ and µ have become u before the look-up. */
const SPELLINGS: Readonly<Record<string, readonly string[]>> = {
  kg: ["kg", "kgs", "kilogram", "kilograms", "kilo", "kilos"],
  g: ["g", "gram", "grams"],
  mg: ["mg", "milligram", "milligrams"],
  ug: ["ug", "mcg", "microgram", "micrograms"],
  ng: ["ng", "nanogram", "nanograms"],
  "[lb_av]": ["[lb_av]", "lb", "lbs", "pound", "pounds"],
  m: ["m", "metre", "metres", "meter", "meters"],
  cm: ["cm", "centimetre", "centimetres", "centimeter", "centimeters"],
  "[in_i]": ["[in_i]", "in", "inch", "inches"],
  m2: ["m2", "m\u00b2"],
  [STANDARD_SURFACE]: [STANDARD_SURFACE],
  L: ["l", "litre", "litres", "liter", "liters"],
  dL: ["dl", "decilitre", "decilitres", "deciliter", "deciliters"],
  mL: ["ml", "millilitre", "millilitres", "milliliter", "milliliters"],
  a: ["a", "y", "yr", "yrs", "year", "years"],
  mo: ["mo", "month", "months"],
  d: ["d", "day", "days"],
  h: ["h", "hr", "hrs", "hour", "hours"],
  min: ["min", "mins", "minute", "minutes"],
  mol: ["mol", "mole", "moles"],
  mmol: ["mmol", "millimol", "millimole", "millimoles"],
  umol: ["umol", "micromol", "micromole", "micromoles"],
  nmol: ["nmol", "nanomol", "nanomole", "nanomoles"],
  "%": ["%", "percent"],
  "1": ["1"],
};

const CODE_OF: ReadonlyMap<string, string> = new Map(
  Object.entries(SPELLINGS).flatMap(([code, words]) => words.map((word) => [word, code] as const)),
);
const KNOWN: ReadonlySet<string> = new Set(UNIT_CODES);

function isUnitCode(code: string): code is UnitCode {
  return KNOWN.has(code);
}

/** The unit a person means by a word such as "micrograms", "µmol/L", "mg per litre" or a UCUM code; null when it is not one of ours. */
export function unitWordRead(word: string): UnitCode | null {
  const lower = word
    .trim()
    .replace(/[\u00b5\u03bc]/g, "u")
    .toLowerCase()
    .replace(/\s*\bper\b\s*/g, "/")
    .replace(/(?<![\d{])1\.73\s*m[2\u00b2]/g, STANDARD_SURFACE)
    .replace(/\s*([/·*.])\s*/g, "$1")
    .replace(/[·*]|\s+/g, ".");
  const parts = lower
    .split("/")
    .map((part) =>
      (part.startsWith("{") ? [part] : part.split("."))
        .map((piece) => (piece === "" ? "" : (CODE_OF.get(piece) ?? "?")))
        .join("."),
    );
  const code = parts.join("/");
  return isUnitCode(code) ? code : null;
}
