import type { TargetWindow } from "../case/index.ts";
import type { CovariateName } from "../medicine/index.ts";
import { type Quantity, quantityPrint, type UnitCode, unitSpoken } from "../units/index.ts";
import {
  type ConcernData,
  type ConcernWords,
  concentration,
  days,
  figure,
  hours,
  dataNumber as number,
  dataText as text,
  when,
  wordList,
} from "./concernFigures.ts";
import { windowPointWords, windowQuantityWord } from "./windowWords.ts";

/** Concerns that come from the medicine record: one function a code. */
export const recordConcernMessages: Readonly<Record<string, (data: ConcernData) => ConcernWords>> = {
  "outside-population": (data) => ({
    title: `${COVARIATE_WORDS[text(data, "covariate") as CovariateName]} outside the population the figures come from`,
    text: `${isSex(data) ? "The patients studied" : `${amount(number(data, "value"), data.valueUnit as UnitCode)}; the patients studied had ${rangeWords(data)}`}: ${sentence(text(data, "population"))} (${text(data, "source")}). The prediction may not hold.`,
  }),
  "formula-step": (data) => ({
    title: `The record's ${text(data, "words")} jumps close to this patient's ${COVARIATE_WORDS[text(data, "covariate") as CovariateName].toLowerCase()}`,
    text: `${amount(number(data, "here"), data.unit as UnitCode)} at ${amount(number(data, "at"), data.covariateUnit as UnitCode)}, ${amount(number(data, "there"), data.unit as UnitCode)} at ${amount(number(data, "nearAt"), data.covariateUnit as UnitCode)}: the formula is a step (${text(data, "source")}). In a body the change is gradual: look at what each would mean.`,
  }),
  "dose-above-single": (data) => ({
    title: `${lane(data)}: a single dose above the record's maximum`,
    text: `${mg(data, "mg")} ${when(data)}; the record's maximum single dose is ${mg(data, "limitMg")} (${text(data, "source")}; ${text(data, "basis")}).`,
  }),
  "dose-above-daily": (data) => ({
    title: `${lane(data)}: more in a day than the record's maximum`,
    text: `${mg(data, "mg")} on the day of ${when(data)}; the record's maximum daily dose is ${mg(data, "limitMg")} (${text(data, "source")}; ${text(data, "basis")}).`,
  }),
  "product-switch": (data) => ({
    title: `Option ${text(data, "option")} changes the product mg for mg`,
    text: `From ${text(data, "from")} to ${text(data, "to")}, ${mg(data, "mg")} a day in both: ${wordList(differenceWords(data))}. What reaches the circulation is ${figure(number(data, "ratio") * 100)} % of before for the same mg.`,
  }),
  "salt-switch": (data) => ({
    title: `Option ${text(data, "option")} changes the salt: labelled amounts can't be compared`,
    text: `From ${text(data, "from")} to ${text(data, "to")}: ${wordList(differenceWords(data))}. Labelled ${mg(data, "mgBefore")} on the last day given and ${mg(data, "mg")} on the option's first; active ${mg(data, "activeBefore")} and ${mg(data, "activeAfter")}, that is ${figure((number(data, "activeAfter") / number(data, "activeBefore")) * 100)} % of before.`,
  }),
  "level-unit-doubtful": (data) => ({
    title: `The level of ${when(data)} would be usual only in another unit`,
    text: `${printed(data.quantity as Quantity)}, where this medicine is used at ${concentration(data, "low")} to ${concentration(data, "high")}; in ${orList((data.units as readonly UnitCode[]).map((unit) => unitSpoken(unit, "print")))} the same number would be. Check the unit, or confirm the value.`,
  }),
  "level-toxic": (data) => ({
    title: `The level of ${when(data)} reaches the toxic limit`,
    text: `Measured ${concentration(data, "measured")}${data.at === "trough" ? " just before a dose" : ""}; the record's toxic limit${data.at === "trough" ? " for that level" : ""} is ${concentration(data, "from")} (${text(data, "source")}). Look at the patient and at how the sample was drawn before any further dose.`,
  }),
  "level-too-early": (data) => ({
    title: `The level of ${when(data)} was drawn too soon after the dose`,
    text: `${hours(number(data, "afterDoseH"))} after it; the record says not before ${hours(number(data, "earliestH"))} (${text(data, "source")}).`,
  }),
  "level-not-steady": (data) => ({
    title: `The level of ${when(data)} was not drawn at steady state`,
    text: `${span(number(data, "sinceH"))} after the regimen began or changed. ${waits(data)}${data.hasWindow === true ? " The target window is for a level at steady state." : ""}`,
  }),
  "autoinduction-unsettled": (data) => ({
    title: `${capital(text(data, "name"))} speeds up its own elimination: clearance will still rise`,
    text: `${sentence(text(data, "text"))}. ${course(data)} The prediction does not follow it (${text(data, "source")}; ${text(data, "basis")}).`,
  }),
  "interaction-applied": (data) => ({
    title: `Interaction with ${text(data, "medicine")}: applied with the record's factor`,
    text: `${text(data, "detail")}. ${known(data)} It is in the prediction.`,
  }),
  "interaction-own-figure": (data) => ({
    title: `Interaction with ${text(data, "medicine")}: another figure than the record's is applied`,
    text: `${text(data, "detail")}. ${text(data, "parameter") === "clearance" ? "Clearance" : "Volume"} ${percent(number(data, "used"))} of usual is in the prediction, as entered. ${known(data)}`,
  }),
  "interaction-not-applied": (data) => ({
    title: `Interaction with ${text(data, "medicine")}: known to the record, not applied`,
    text: `${text(data, "detail")}. ${known(data)} The prediction does not take it into account: change the event to apply it.`,
  }),
  "level-off-window-time": (data) => ({
    title: `The level of ${when(data)} was drawn at another time than the target window is for`,
    text: `${hours(number(data, "afterDoseH"))} after the dose; the window's level is drawn ${drawnWords(data)} (${text(data, "source")}).`,
  }),
  "level-not-trough": (data) => ({
    title: `The level of ${when(data)} is no trough`,
    text: `${hours(number(data, "afterDoseH"))} after the dose and ${hours(number(data, "leftH"))} before the next; the target window is about the ${windowQuantityWord("trough")}. Compare the predicted lowest with it, not this level.`,
  }),
  "level-above-window": (data) => ({
    title: `The latest level, of ${when(data)}, is above the target window`,
    text: `${measuredBeside(data)} Look at the patient before the next dose, and at what each option makes of it.`,
  }),
  "level-below-window": (data) => ({
    title: `The latest level, of ${when(data)}, is below the target window`,
    text: `${measuredBeside(data)} What each option makes of it stands in the readings.`,
  }),
  "figures-from-memory": (data) => ({
    title: "Figures from memory are in use",
    text: `${capital(text(data, "name"))}: ${wordList(figureNames(data))}. They were recalled and not found in their source: unverified.`,
  }),
  "figures-pieced-together": (data) => ({
    title: "The record's figures were pieced together from different studies",
    text: `${sentence(text(data, "text"))} (${text(data, "source")}). They were never estimated together${data.isFitted === true ? ", so that what levels make of one of them leans on the others" : ""}.`,
  }),
  "linear-approximation": (data) => ({
    title: `${capital(text(data, "name"))}: linear kinetics stand for saturable ones`,
    text: `${sentence(text(data, "text"))} (${text(data, "source")}).`,
  }),
};

export const RECORD_CONCERN_CODES: readonly string[] = Object.keys(recordConcernMessages);

const COVARIATE_WORDS: Readonly<Record<CovariateName, string>> = {
  weight: "Weight",
  idealWeight: "Ideal weight",
  adjustedWeight: "Adjusted weight",
  leanWeight: "Lean weight",
  height: "Height",
  age: "Age",
  creatinineClearance: "Creatinine clearance",
  albumin: "Albumin",
  bodySurface: "Body surface",
  isFemale: "Sex",
};

const PRINT = { style: "print", microgram: "microgram" } as const;
const amount = (value: number, unit: UnitCode): string => quantityPrint({ value, unit }, { ...PRINT, significant: 3 });
const mg = (data: ConcernData, key: string): string =>
  quantityPrint({ value: number(data, key), unit: "mg" }, { ...PRINT, significant: 6 });
const printed = (quantity: Quantity): string => quantityPrint(quantity, { ...PRINT, significant: 4 });
const orList = (words: readonly string[]): string => wordList(words).replace(/ and ([^,]*)$/, " or $1");
/** "Measured 9.1 mg per L; the window for the lowest is 4 to 8 mg per L." */
function measuredBeside(data: ConcernData): string {
  const { afterDoseH } = data as { readonly afterDoseH: number | null };
  const point = windowPointWords(text(data, "quantity") as TargetWindow["quantity"], afterDoseH);
  const measured = `${data.belowLimit === true ? "below the assay's limit of " : ""}${concentration(data, "measured")}`;
  return `Measured ${measured}; the window for the ${afterDoseH === null ? "" : "level "}${point} is ${concentration(data, "low")} to ${concentration(data, "high")}.`;
}

const percent = (share: number): string => `${figure(share * 100)} %`;
const capital = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1);
const sentence = (words: string): string => words.replace(/\.$/, "");
const isSex = (data: ConcernData): boolean => text(data, "covariate") === "isFemale";
const lane = (data: ConcernData): string => (data.option === null ? "Doses given" : `Option ${text(data, "option")}`);

function rangeWords(data: ConcernData): string {
  const unit = data.unit as UnitCode;
  const { low, high } = data as { readonly low: number | null; readonly high: number | null };
  if (low === null) return `at most ${amount(high ?? 0, unit)}`;
  return high === null ? `at least ${amount(low, unit)}` : `${figure(low)} to ${amount(high, unit)}`;
}

/** "54 hours", from 3 days on in days. */
function span(hoursLong: number): string {
  return hoursLong < 72 ? hours(hoursLong) : days(hoursLong / 24);
}

function waits(data: ConcernData): string {
  const { recordH, modelH } = data as { readonly recordH: number | null; readonly modelH: number | null };
  const parts = [
    ...(recordH === null ? [] : [`The record waits ${span(recordH)} (${text(data, "source")}).`]),
    ...(modelH === null ? [] : [`For the typical patient 90 % of the way takes ${span(modelH)}.`]),
  ];
  return parts.join(" ");
}

function course(data: ConcernData): string {
  const { courseD, settledD } = data as { readonly courseD: number | null; readonly settledD: number | null };
  const young = courseD === null ? "No dose has been given yet" : `The course is ${days(courseD)} old`;
  return settledD === null ? `${young}.` : `${young}; it settles after about ${days(settledD)}.`;
}

function known(data: ConcernData): string {
  const parameter = text(data, "parameter") === "clearance" ? "clearance" : "volume";
  const { onsetDays } = data as { readonly onsetDays: number | null };
  const onset = onsetDays === null ? "" : ` within ${days(onsetDays)}`;
  return `By the record: ${sentence(text(data, "text"))}, ${parameter} ${percent(number(data, "factor"))} of usual${onset} (${text(data, "source")}; ${text(data, "basis")}).`;
}

function differenceWords(data: ConcernData): readonly string[] {
  const salt = (key: string) => (data[key] === null ? "the active moiety" : `the ${text(data, key)} salt`);
  return (data.differs as readonly string[]).map((kind) => {
    if (kind === "salt") return `one is labelled as ${salt("fromSalt")}, the other as ${salt("toSalt")}`;
    if (kind === "release") return `${text(data, "fromRelease")} and ${text(data, "toRelease")} release differ`;
    return "bioavailability differs";
  });
}

function drawnWords(data: ConcernData): string {
  const { fromH, toH } = data as { readonly fromH: number | null; readonly toH: number | null };
  if (fromH === null) return `up to ${hours(toH ?? 0)} after it`;
  return toH === null ? `from ${hours(fromH)} after it` : `${figure(fromH)} to ${hours(toH)} after it`;
}

/** What stands at a path of the record, in words: "clearance", "bioavailability of 12-hour tablet". */
function figureNames(data: ConcernData): readonly string[] {
  const names = data.names as readonly { readonly path: readonly (string | number)[]; readonly product?: string }[];
  return names.map(({ path, product }) => {
    if (product !== undefined) return `${FIGURE_WORDS[String(path[2])] ?? String(path[2])} of ${product}`;
    if (path[0] === "kinetics" || path[0] === "variability") {
      const name = FIGURE_WORDS[String(path[1])] ?? String(path[1]);
      return path[0] === "variability" ? `variability of ${name}` : name;
    }
    return FIGURE_WORDS[String(path[0])] ?? String(path[0]);
  });
}

const FIGURE_WORDS: Readonly<Record<string, string>> = {
  molarMass: "molar mass",
  clearance: "clearance",
  volume: "volume",
  centralVolume: "central volume",
  peripheralVolume: "peripheral volume",
  exchange: "exchange between the compartments",
  maximumRate: "maximum rate of elimination",
  halfMaximum: "level of half the maximum rate",
  absorptionRate: "absorption rate",
  bioavailability: "bioavailability",
  saltFactor: "active part of the labelled amount",
  lag: "lag",
  input: "shape of the input",
  strengths: "strengths",
  concentration: "concentration",
  residualProportional: "the residual error",
  residualAdditive: "the residual error",
  correlations: "correlations",
  windows: "the target window",
  toxicFrom: "the toxic limit",
  earliestSample: "earliest sampling time",
  steadyStateAfter: "time to steady state",
};
