import { UNIT_CODES, unitSpoken } from "../units/index.ts";
import type { MessageFunction } from "./messageFunction.ts";

type Data = Parameters<MessageFunction>[0];

const said = (value: unknown): string => `"${String(value)}"`;

/** A unit in words where it is one the program knows; what a user typed otherwise stays as typed. */
function unitWord(unit: unknown): string {
  const known = UNIT_CODES.find((code) => code === unit);
  return known ? unitSpoken(known, "screen") : String(unit);
}

/** "A, B or C" */
function either(list: unknown): string {
  const words = (Array.isArray(list) ? list : [list]).map(String);
  const last = words.at(-1) ?? "";
  return words.length < 2 ? last : `${words.slice(0, -1).join(", ")} or ${last}`;
}

function quoted(list: unknown): string {
  return either((Array.isArray(list) ? list : [list]).map(said));
}

const at = ({ path }: Data): string => (typeof path === "string" && path !== "" ? path : "the whole file");

/** Kinds of value, as the schema calls them, in words. */
const KINDS: Readonly<Record<string, string>> = {
  number: "a number",
  int: "a whole number",
  string: "text in quotes",
  boolean: "true or false",
  array: "a list in square brackets",
  object: "a group of fields in braces",
  record: "a group of fields in braces",
};

/** What a field with a pattern of its own wants, by its name. */
const INSTANT = "an instant with its offset, of a date that exists, such as 2026-03-04T09:00:00+00:00";
const FORMS: Readonly<Record<string, string>> = {
  at: INSTANT,
  now: INSTANT,
  start: INSTANT,
  from: INSTANT,
  to: INSTANT,
  timeZone: "a named time zone such as Europe/Lisbon",
  clock: "a 24-hour clock time such as 08:00",
};

function size(of: unknown): string {
  if (of === "string") return " characters";
  return of === "array" ? " entries" : "";
}

function range({ unit, above, below, least, most }: Data): string {
  const ends = [
    above === undefined ? "" : `above ${String(above)}`,
    below === undefined ? "" : `below ${String(below)}`,
    least === undefined ? "" : `at least ${String(least)}`,
    most === undefined ? "" : `at most ${String(most)}`,
  ].filter((each) => each !== "");
  const number = least !== undefined && least === most ? `exactly ${String(least)}` : ends.join(" and ");
  return unit === "1" ? number : `${number} ${String(unit)}`;
}

const FIGURES: Readonly<Record<string, string>> = {
  molarMass: "molar mass",
  clearance: "clearance",
  volume: "volume",
  exchange: "exchange between the compartments",
  peripheralVolume: "volume of the second compartment",
  maximumRate: "highest rate of elimination",
  halfMaximum: "concentration at half the highest rate",
  absorptionRate: "absorption rate",
  duration: "duration of the input",
  fastFraction: "fraction absorbed fast",
  slowRate: "absorption rate of the slow part",
  slowDuration: "duration of the slow part",
  slowLag: "lag of the slow part",
  saltFactor: "active part of the labelled amount",
  lag: "lag",
  bioavailability: "bioavailability",
  strengths: "strength",
  concentration: "concentration",
  residualProportional: "residual variability (proportional)",
  residualAdditive: "residual variability (additive)",
  windows: "window",
  toxicFrom: "toxic limit",
  maximumSingleDose: "highest single dose",
  maximumDailyDose: "highest daily dose",
  earliestSample: "earliest sampling time",
  steadyStateAfter: "time to steady state",
  correlations: "correlation",
  number: "number of patients",
  ranges: "range in the population",
  drawFrom: "earliest sampling time of the window",
  drawTo: "latest sampling time of the window",
  factor: "factor of the interaction",
  onset: "onset of the interaction",
  settledAfter: "time until autoinduction has settled",
  autoinduction: "statement on autoinduction",
  estimates: "statement on the estimates",
  population: "population",
  doseLimits: "dose limit",
  sampling: "sampling statement",
  cautions: "caution",
};

function figureName({ figure, product }: Data): string {
  const parts = Array.isArray(figure) ? figure : [];
  const word = parts.findLast((each) => typeof each === "string" && Object.hasOwn(FIGURES, each));
  const isOfParameter = parts[0] === "variability" && !/^(residual|correlations)/.test(String(word));
  const spread = isOfParameter ? "variability of the " : "";
  const name = word === undefined ? "figure" : `${spread}${FIGURES[String(word)]}`;
  return typeof product === "string" ? `${name} of the ${product}` : name;
}

/** Faults of a medicine record, of its formulas and of amounts of its products; and those that any stored file can have. */
export const medicineMessages: Readonly<Record<string, MessageFunction>> = {
  "field-unknown": (data) => `The field ${at(data)} is not known here.`,
  "field-missing": (data) => `The field ${at(data)} is missing.`,
  "value-wrong-kind": (data) =>
    `${at(data)} is ${String(data.found)}; it must be ${KINDS[String(data.allowed)] ?? String(data.allowed)}.`,
  "value-not-listed": (data) => `${at(data)} is ${String(data.found)}; it must be ${either(data.allowed)}.`,
  "value-too-small": (data) =>
    `${at(data)} is ${String(data.found)}; it must be at least ${String(data.minimum)}${size(data.of)}.`,
  "value-too-big": (data) =>
    `${at(data)} is ${String(data.found)}; it must be at most ${String(data.maximum)}${size(data.of)}.`,
  "value-malformed": (data) =>
    `${at(data)} is ${String(data.found)}; it must be ${FORMS[String(data.key)] ?? "written in another form"}.`,

  "record-figure-without-source": (data) =>
    `The ${figureName(data)}${typeof data.medicine === "string" ? ` in the record of ${data.medicine}` : ""} has no ${String(data.missing)} (${String(data.path)}): every figure needs one.`,
  "record-source-unknown": (data) =>
    `${at(data)} names the source ${said(data.source)}, which the record does not list.`,
  "record-basis-invented": (data) => `${at(data)} says "invented", which only a record marked as invented may hold.`,
  "record-invented-name": ({ name }) => `The invented medicine ${said(name)} must say "invented" in its name.`,
  "record-unit": (data) => `${at(data)} is ${said(data.found)}; the unit here is ${quoted(data.allowed)}.`,
  "record-range": (data) => `${at(data)} is ${String(data.found)}; it must be ${range(data)}.`,
  "record-product-content": ({ product, isLiquid }) =>
    isLiquid
      ? `The liquid ${said(product)} must state a concentration and no strengths.`
      : `The product ${said(product)} must state at least one strength and no concentration.`,
  "record-absorption-rate": ({ product, isZeroOrder }) =>
    isZeroOrder
      ? `The product ${said(product)} is absorbed evenly over a duration and must state no absorption rate.`
      : `The product ${said(product)} must state an absorption rate.`,
  "record-slow-part": ({ product, hasBoth }) =>
    `The slow part of the product ${said(product)} states ${hasBoth ? "both a rate and a duration" : "neither a rate nor a duration"}: it must state exactly one.`,
  "record-duplicate": (data) => `${at(data)} stands there a second time (${String(data.found)}).`,
  "record-name-turns": (data) => `${at(data)} holds a hidden mark that turns the direction of text.`,
  "record-newer": ({ found, known }) =>
    `The record is of version ${String(found)}, made by a newer version of the program; this one reads up to version ${String(known)}.`,
  "record-population-range": ({ covariate, low, high, unit }) =>
    low === null && high === null
      ? `The range of ${COVARIATE_NAMES_SAID[String(covariate)] ?? String(covariate)} in the population states neither its low nor its high end.`
      : `The range of ${COVARIATE_NAMES_SAID[String(covariate)] ?? String(covariate)} in the population, ${String(low ?? "open")} to ${String(high ?? "open")} ${String(unit)}, is not possible: its ends must be 0 or more, the low one not above the high one.`,
  "record-variability": (data) =>
    `${at(data)} varies something that the record's kinetics do not have: use ${either(data.possible)}.`,
  "record-correlation-between": (data) =>
    data.first === data.second
      ? `${at(data)} names the same parameter twice.`
      : `${at(data)} names ${either(data.missing)}, for which the record states no variability.`,
  "record-correlations": () =>
    "The correlations of the record are not possible together: no figures could vary in this way.",
  "record-limits": ({ single, daily }) =>
    `The highest single dose, ${String(single)} mg, is above the highest daily dose, ${String(daily)} mg.`,
  "record-display-unit": ({ displayUnit, found }) =>
    `Shown in ${unitWord(displayUnit)} the highest concentration of the record is ${String(found)}: choose a unit in which it is between 0.01 and 100000.`,
  "record-salt": ({ product }) => `The product ${said(product)} states a salt factor and must name the salt.`,
  "window-unit": (data) => `${at(data)} is ${said(data.found)}; a window of this kind is in ${quoted(data.allowed)}.`,
  "window-units-differ": ({ low, high }) =>
    `The window's low end is in ${unitWord(low)} and its high end in ${unitWord(high)}: both must be in one unit.`,
  "window-draw-order": ({ from, to }) =>
    `The level of a window can't be drawn from ${String(from)} to ${String(to)} h after a dose: the second must be the later.`,
  "window-order": ({ low, high, unit }) =>
    `A window from ${String(low)} to ${String(high)} ${String(unit)} is empty: the low end must be 0 or more and below the high end.`,

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

  "dose-amount": ({ found, unit }) =>
    `A dose of ${String(found)} ${String(unit)} can't be given: write an amount above 0.`,
  "dose-unit-mismatch": ({ unit, product, allowed }) =>
    `The ${String(product)} is not measured in ${unitWord(unit)}: write ${either((allowed as readonly unknown[]).map(unitWord))}.`,
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

const COVARIATE_NAMES_SAID: Readonly<Record<string, string>> = {
  weight: "weight",
  idealWeight: "ideal weight",
  adjustedWeight: "adjusted weight",
  leanWeight: "lean weight",
  height: "height",
  age: "age",
  creatinineClearance: "creatinine clearance",
  albumin: "albumin",
  bodySurface: "body surface",
  isFemale: "sex",
};

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
