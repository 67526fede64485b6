import { UNIT_CODES, unitSpoken } from "../units/index.ts";
import { either, said } from "./either.ts";
import { formulaMessages } from "./formulaMessages.ts";
import type { MessageFunction } from "./messageFunction.ts";
import { recordWords } from "./recordWords.ts";

type Data = Parameters<MessageFunction>[0];

/** A unit in words where it is one the program knows; what a user typed otherwise stays as typed. */
function unitWord(unit: unknown): string {
  const known = UNIT_CODES.find((code) => code === unit);
  return known ? unitSpoken(known, "screen") : String(unit);
}

/** What a population's range is of: covariates as on screen, but a range is of "sex", not of "female sex". */
function rangedWord(covariate: unknown): string {
  return covariate === "isFemale" ? "sex" : (recordWords.covariates[String(covariate)] ?? String(covariate));
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

/** Faults of a medicine record and of amounts of its products; and those that any stored file can have. */
export const medicineMessages: Readonly<Record<string, MessageFunction>> = {
  "field-unknown": (data) => `The field ${at(data)} is not known here.`,
  "record-format": ({ found, allowed }) =>
    `The file is a ${said(found)}, not a medicine record (${said(allowed)}).${found === "ebbline-case" ? " Import it on the screen of cases: its record comes with it." : ""}`,
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
      ? `The range of ${rangedWord(covariate)} in the population states neither its low nor its high end.`
      : `The range of ${rangedWord(covariate)} in the population, ${String(low ?? "open")} to ${String(high ?? "open")} ${String(unit)}, is not possible: its ends must be 0 or more, the low one not above the high one.`,
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

  ...formulaMessages,

  "dose-amount": ({ found, unit }) =>
    `A dose of ${String(found)} ${String(unit)} can't be given: write an amount above 0.`,
  "dose-unit-mismatch": ({ unit, product, allowed }) =>
    `The ${String(product)} is not measured in ${unitWord(unit)}: write ${either((allowed as readonly unknown[]).map(unitWord))}.`,
};
