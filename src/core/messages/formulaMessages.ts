import { either, said } from "./either.ts";
import type { MessageFunction } from "./messageFunction.ts";

type Data = Parameters<MessageFunction>[0];

/** Faults of a record's formulas, and what they lack of a patient. */
export const formulaMessages: Readonly<Record<string, MessageFunction>> = {
  "formula-too-long": ({ found, maximum }) =>
    `The formula has ${String(found)} characters; at most ${String(maximum)} are read.`,
  "formula-too-large": ({ maximum }) => `The formula has more than ${String(maximum)} parts.`,
  "formula-too-deep": ({ maximum }) => `The formula is nested more than ${String(maximum)} deep.`,
  "formula-character": (data) =>
    `The formula holds ${characterSaid(data)}${placeText(data)}; write numbers with their units, known names, + - * / ^, comparisons, ? :, brackets, exp, ln, sqrt, min and max.`,
  "formula-number": (data) => `The number${placeText(data)} of the formula is too large to be held.`,
  "formula-unreadable": ({ formula }) =>
    `The formula ${said(formula)} cannot be read: look for a missing or stray sign, bracket, comma or branch of a condition.`,
  "formula-implicit": (data) =>
    `A sign is missing in ${partText(data)} of the formula${placeText(data)}: write every * out.`,
  "formula-name": (data) =>
    `The formula uses ${said(data.name)}${placeText(data)}, which is not known: use ${either(data.allowed)}.`,
  "formula-unit-unknown": (data) =>
    `The formula has ${said(data.name)} after a number${placeText(data)}, which is no unit known here: use ${either(data.allowed)}.`,
  "formula-unit-alone": (data) =>
    `The unit ${said(data.name)}${placeText(data)} of the formula has no number before it: write 1 ${String(data.name)}.`,
  "formula-unit-power": (data) =>
    `The power of the unit${placeText(data)} of the formula can be read in two ways: write 2 m^2 for a unit with a whole power up to 3, or (2 m) ^ 2 for the power of the whole.`,
  "formula-arguments": (data) =>
    `The formula gives ${String(data.name)}${placeText(data)} ${String(data.found)} values; it takes ${data.least === data.most ? String(data.least) : `${String(data.least)} to ${String(data.most)}`}.`,
  "formula-dimension": dimensionSaid,
  "formula-exponent": (data) =>
    `The exponent ${partText(data)}${placeText(data)} of the formula must be a plain number as written, for what it raises has a unit (${String(data.found)}).`,
  "formula-power": (data) =>
    `The power ${partText(data)}${placeText(data)} of the formula is too high to have a meaning.`,
  "formula-condition": (data) =>
    `Before the ? stands ${partText(data)}${placeText(data)}, which is no comparison: write for example isFemale == 1.`,
  "formula-comparison": (data) =>
    `The comparison ${partText(data)}${placeText(data)} stands where a number is wanted: a comparison belongs before a ?.`,
  "formula-comparison-chain": (data) =>
    `The formula compares more than two values at once${placeText(data)}: write each comparison by itself.`,
  "formula-needs": ({ name }) =>
    `The prediction needs ${COVARIATE_WORDS[String(name)] ?? String(name)}, which is not known for this patient.`,
  "formula-covariate": ({ name, found, unit }) =>
    `The prediction can't use ${COVARIATE_WORDS[String(name)] ?? String(name)} of ${String(found)} ${String(unit)}.`,
  "formula-result": ({ formula, found }) =>
    `The formula ${said(formula)} gives ${String(found)} for this patient, which is not a usable value.`,
};

/** " (characters 3 to 14)", counted from 1. */
function placeText({ start, end }: Data): string {
  const [from, to] = [Number(start) + 1, Number(end)];
  return from >= to ? ` (character ${from})` : ` (characters ${from} to ${to})`;
}

/** Cut where it is long: the place is told beside it. */
const PART_LENGTH = 60;

function partText({ part }: Data): string {
  const text = String(part);
  return said(text.length > PART_LENGTH ? `${text.slice(0, PART_LENGTH)} …` : text);
}

/** Signs that look like one of ours and are not it. */
const LOOK_ALIKES: Readonly<Record<string, string>> = {
  "\u2212": "-",
  "\u2013": "-",
  "\u2014": "-",
  "\u00d7": "*",
  "\u00b7": "*",
  "\u22c5": "*",
  "\u00f7": "/",
  "\u2044": "/",
  "\u2265": ">=",
  "\u2264": "<=",
};

/** By its code point too: a look-alike can't be told apart by eye, and some have no shape at all. */
function characterSaid({ character, codePoint }: Data): string {
  const instead = LOOK_ALIKES[String(character)];
  return `the character ${String(codePoint)}${instead ? ` (write ${instead})` : ""}`;
}

const PLACES: Readonly<Record<string, (part: string, wanted: string, found: string) => string>> = {
  sum: (part, wanted, found) => `${part} adds or subtracts ${wanted} and ${found}`,
  comparison: (part, wanted, found) => `${part} compares ${wanted} with ${found}`,
  branches: (part, wanted, found) => `the two branches of ${part} give ${wanted} and ${found}`,
  arguments: (part, wanted, found) => `${part} chooses between ${wanted} and ${found}`,
  exponent: (part, wanted, found) => `the exponent ${part} is ${found}; it must be ${wanted}`,
  function: (part, wanted, found) => `${part} is ${found}; what the function takes must be ${wanted}`,
  result: (_, wanted, found) => `it gives ${found} where ${wanted} is wanted`,
};

function dimensionSaid(data: Data): string {
  const words = PLACES[String(data.place)]?.(partText(data), String(data.wanted), String(data.found));
  return `The units of the formula do not fit${placeText(data)}: ${String(words)}.`;
}

const COVARIATE_WORDS: Readonly<Record<string, string>> = {
  weight: "a weight",
  idealWeight: "an ideal weight (from sex and height)",
  adjustedWeight: "an adjusted weight (from sex, height and weight)",
  leanWeight: "a lean weight (from sex, height and weight)",
  height: "a height",
  age: "an age",
  creatinineClearance: "a creatinine clearance (from age, sex, weight and serum creatinine)",
  albumin: "an albumin",
  bodySurface: "a body surface (from height and weight)",
  isFemale: "a sex",
};
