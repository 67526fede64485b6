import type { TargetWindow } from "../case/index.ts";
import type { Issue } from "../result/index.ts";
import { instantText } from "../time/index.ts";
import { numberPrint, type Quantity, quantityPrint } from "../units/index.ts";
import { albuminConcernMessages } from "./albuminConcernMessages.ts";
import {
  type ConcernData,
  type ConcernWords,
  concentration,
  concentrationWords,
  countWords,
  days,
  figure,
  hours,
  inTypical,
  dataNumber as number,
  dataText as text,
  when,
} from "./concernFigures.ts";
import { fitConcernMessages } from "./fitMessages.ts";
import { issueMessage } from "./issueMessage.ts";
import { recordConcernMessages } from "./recordConcernMessages.ts";
import { windowPointWords } from "./windowWords.ts";

const FACTOR_WORDS: Readonly<Record<string, string>> = {
  smoking: "Smoking",
  "interacting-medicine": "Interacting medicine",
  meal: "Meal",
  vomiting: "Vomiting",
  other: "Event",
};

const DIVISIBLE_WORDS: Readonly<Record<string, string>> = {
  half: ", halves allowed",
  whole: ", whole only",
  unknown: ", taken whole as the record does not say whether they may be halved",
};

const OBSERVATION_WORDS: Readonly<Record<string, string>> = {
  weight: "Weight",
  serumCreatinine: "Creatinine",
  albumin: "Albumin",
  level: "Level",
  window: "Target window up to",
};

function outsideWindow(data: ConcernData, side: "above" | "below"): ConcernWords {
  const isArea = text(data, "unit") === "mg.h/L";
  const print = (value: number) => (isArea ? `${figure(value)} mg hours per L` : concentrationWords(data, value));
  const found = side === "above" ? number(data, "most") : number(data, "least");
  const edge = side === "above" ? number(data, "high") : number(data, "low");
  const name = text(data, "quantity") as TargetWindow["quantity"];
  const afterDoseH = (data.afterDoseH as number | null | undefined) ?? null;
  const point = `${afterDoseH === null ? "" : "level "}${windowPointWords(name, afterDoseH)}`;
  const words = name === "lowest-and-highest" ? (side === "above" ? "highest" : "lowest") : point;
  return {
    title: `Option ${text(data, "option")} settles ${side} the target window${inTypical(data)}`,
    text: `Expected ${words} at steady state${inTypical(data)} ${print(found)}; the window's ${side === "above" ? "upper" : "lower"} edge is ${print(edge)}.`,
  };
}

function unverifiedWords(data: ConcernData): string {
  const parts = [
    [number(data, "memory"), "recalled from memory"],
    [number(data, "commonPractice"), "from common practice"],
    [number(data, "invented"), "invented"],
  ] as const;
  const named = parts.filter(([count]) => count > 0).map(([count, words]) => `${count} ${words}`);
  return named.length === 0 ? "all read in their source" : `${named.join(" and ")}, not verified`;
}

/** One function a concern code. */
const concernMessages: Readonly<Record<string, (data: ConcernData) => ConcernWords>> = {
  "model-incomplete": (data) => ({
    title: "No prediction yet",
    text: (data.issues as readonly Issue[]).map(issueMessage).join(" "),
  }),
  "line-not-counted": (data) => ({
    title: `A dose line of ${text(data, "lane") === "given" ? "the given lane" : `option ${text(data, "lane")}`} is not counted`,
    text: issueMessage(data.issue as Issue),
  }),
  "medicine-invented": (data) => ({
    title: "Invented medicine: not for any patient",
    text: `Every figure of ${text(data, "name")} is made up for demonstration.`,
  }),
  "option-toxic": (data) => ({
    title: `Option ${text(data, "option")} reaches the toxic limit${inTypical(data)}`,
    text:
      data.at === "trough"
        ? `Highest predicted just before a dose${inTypical(data)} ${concentration(data, "peak")}; the record's toxic limit for that level is ${concentration(data, "from")} (${text(data, "source")}).`
        : `Highest predicted${inTypical(data)} ${concentration(data, "peak")}; the record's toxic limit is ${concentration(data, "from")} (${text(data, "source")}).`,
  }),
  "level-after-now": (data) => ({
    title: `The level of ${when(data)} lies after the now line`,
    text: "A level can't come from the future: correct its time, or move the now line.",
  }),
  "level-before-dose": (data) => ({
    title: `The level of ${when(data)} was drawn before any counted dose`,
    text: "Enter the doses given before it, or correct its time.",
  }),
  "level-while-absorbing": (data) => ({
    title: `The level of ${when(data)} was drawn while still absorbing`,
    text: `${hours(number(data, "afterDoseH"))} after the dose; absorption takes${inTypical(data)} about ${hours(number(data, "absorbedH"))} (lag and three absorption half-lives). Not a trough.`,
  }),
  "level-far-off": (data) => ({
    title: `The level of ${when(data)} is far from the prediction`,
    text: `Measured ${concentration(data, "measured")}, predicted${inTypical(data)} ${concentration(data, "predicted")}: ${figure(number(data, "ratio"))} times. Wrong time, missed dose, interaction, assay, or a patient unlike the typical one?`,
  }),
  "window-hour-never": (data) => ({
    title: `Option ${text(data, "option")}: no level is ${hours(number(data, "afterDoseH"))} after a dose`,
    text: `The target window is for the level then, and here the next dose always comes sooner, so the option is not held against it. Compare the lowest${inTypical(data)}, ${concentration(data, "lowest")}, with ${concentration(data, "low")} to ${concentration(data, "high")}, knowing that it comes sooner after a dose and so lies higher; or hold a dose for the level, by local policy.`,
  }),
  "option-above-window": (data) => outsideWindow(data, "above"),
  "option-below-window": (data) => outsideWindow(data, "below"),
  "first-dose-close": (data) => ({
    title: `Option ${text(data, "option")} starts soon after the last dose given`,
    text: `Last dose given ${instantText(number(data, "lastMs"), text(data, "zone"), "dayClock")}; the option's first follows ${hours(number(data, "gapH"))} later, its own interval is ${hours(number(data, "intervalH"))}.`,
  }),
  "first-dose-late": (data) => ({
    title: `Option ${text(data, "option")} starts late after the last dose given`,
    text: `Last dose given ${instantText(number(data, "lastMs"), text(data, "zone"), "dayClock")}; the option's first follows ${hours(number(data, "gapH"))} later, its own interval is ${hours(number(data, "intervalH"))}. The level falls meanwhile.`,
  }),
  "dose-not-makeable": (data) => ({
    title: `${quantityPrint({ value: number(data, "amountMg"), unit: "mg" }, { style: "print", microgram: "microgram" })} can't be made from the strengths in the record`,
    text: `Option ${text(data, "option")}, ${text(data, "product")}: ${(data.strengths as number[]).map(figure).join(", ")} mg${DIVISIBLE_WORDS[text(data, "divisible")] ?? ""}.`,
  }),
  "given-after-now": (data) => ({
    title: `${countWords(number(data, "count"), "dose", "doses")} on the given lane after the now line`,
    text: "Shown, not counted. Doses still to come belong in an option.",
  }),
  "option-before-now": (data) => ({
    title: `${countWords(number(data, "count"), "dose", "doses")} of an option before the now line`,
    text: "Shown, not counted. Doses already taken belong in the given lane.",
  }),
  "doses-same-time": (data) => ({
    title: `${data.option === null ? "Doses given" : `Option ${text(data, "option")}`}: ${number(data, "count") === 1 ? "" : `${number(data, "count")} times `}${number(data, "most") === 2 ? "two" : "two or more"} doses of one product stand at one time`,
    text: `${number(data, "count") === 1 ? "At" : "First at"} ${when(data)}. Entered twice, or meant? Every one of them is counted${data.option === null ? ", and what the levels say is read from them" : ""}.`,
  }),
  "window-missing": (data) => ({
    title: "No target window chosen",
    text: `${number(data, "choices") > 1 ? `The record lists ${number(data, "choices")}; which applies is your decision.` : "Choose one, or enter the local one."} Hours in the window can't be given without it.`,
  }),
  "factor-not-used": (data) => ({
    title: `${FACTOR_WORDS[text(data, "kind")] ?? "Event"} recorded, not in the model`,
    text: `${text(data, "detail")}. The prediction does not take it into account.`,
  }),
  "factor-by-hand": (data) => ({
    title: `${FACTOR_WORDS[text(data, "kind")] ?? "Event"}: clearance changed by hand`,
    text: `${text(data, "detail")}. Clearance ${figure(number(data, "clearance") * 100)} % of usual${number(data, "volume") === 1 ? "" : `, volume ${figure(number(data, "volume") * 100)} %`}${number(data, "onsetDays") > 0 ? `, reached in daily steps over ${days(number(data, "onsetDays"))}` : ", at once"}. ${data.source === null ? "That is the user's own figure, not the record's." : `Its source, as entered: ${text(data, "source")}.`}`,
  }),
  "kinetics-change": (data) => ({
    title: "The kinetics change during the course",
    text: `${countWords(number(data, "count"), "change", "changes")}, the last ${instantText(number(data, "lastMs"), text(data, "zone"), "dayClock")}. Steady-state figures refer to the final state.${number(data, "levelsBefore") > 0 ? ` ${countWords(number(data, "levelsBefore"), "level was", "levels were")} drawn before it.` : ""}`,
  }),
  "never-steady": (data) => ({
    title: `Option ${text(data, "option")} never reaches a steady state${inTypical(data)}`,
    text: "More is taken than the typical patient can ever eliminate: the level rises without end.",
  }),
  "roads-differ": (data) => ({
    title: "The cross-check does not agree",
    text: `The figures of ${text(data, "where") === "given" ? "the doses given" : `option ${text(data, "where")}`} come out otherwise by plain numerical integration (by ${numberPrint(number(data, "worst") * 100, { significant: 2 })} % of the largest level). Do not use them; report it.`,
  }),
  "level-while-distributing": (data) => ({
    title: `The level of ${when(data)} was drawn before distribution was over`,
    text: `${hours(number(data, "afterDoseH"))} after the dose; distribution takes${inTypical(data)} until about ${hours(number(data, "distributedH"))} after it. It says little about the tissue.`,
  }),
  "value-confirmed": (data) => ({
    title: "An improbable value was confirmed",
    text: `${OBSERVATION_WORDS[text(data, "kind")] ?? "Value"} ${quantityPrint(data.quantity as Quantity, { style: "print", microgram: "microgram" })}: asked about when entered, and confirmed.`,
  }),
  "flip-flop": (data) => ({
    title: data.close
      ? "Absorption and elimination rates lie close together"
      : "Slower absorption could be slower elimination",
    text: `${text(data, "product")}: ${data.isFitted === true ? "in the typical patient " : ""}the model takes half-life ${hours(number(data, "eliminationHalfLifeH"))} for elimination and ${hours(number(data, "absorptionHalfLifeH"))} for absorption. Elimination of ${hours(number(data, "otherHalfLifeH"))} with volume ${figure(number(data, "otherVolume"))} L gives the same curve; clearance ${figure(number(data, "clearance"))} L per h is the same in both. Levels after this product alone can't tell; an intravenous or immediate-release reference can.`,
  }),
  "level-left-out": (data) => ({
    title: `The level of ${when(data)} is left out`,
    text: `Reason: ${text(data, "reason")}.`,
  }),
  "no-steady-state": (data) => ({
    title: `Option ${text(data, "option")} has no steady state`,
    text:
      text(data, "reason") === "no-repeat"
        ? "It does not repeat. Its readings are over the span shown."
        : "Its lines have no common period within two weeks. Its readings are over the span shown.",
  }),
  "starts-from-nothing": () => ({
    title: "The options start from nothing in the body",
    text: "No dose given is counted. If the patient has been taking the medicine, enter the doses.",
  }),
  "kidney-unknown": (data) => ({
    title: "Kidney function not estimated",
    text: `Missing: ${(data.missing as string[]).join(", ")}.`,
  }),
  "record-not-reviewed": (data) => ({
    title: "Medicine record not independently reviewed",
    text: `${text(data, "name")}, record version ${number(data, "recordVersion")}: of ${number(data, "total")} figures, ${unverifiedWords(data)}. Check against current product information.`,
  }),
  ...albuminConcernMessages,
  ...fitConcernMessages,
  ...recordConcernMessages,
};

export const CONCERN_CODES: readonly string[] = Object.keys(concernMessages);

/** The words of a concern. An unknown code is a programmer's mistake and throws. */
export function concernMessage(concern: { readonly code: string; readonly data: ConcernData }): ConcernWords {
  const words = concernMessages[concern.code];
  if (!words) throw new RangeError(`no message for the concern "${concern.code}"`);
  return words(concern.data);
}

/** Gravity in words: what stands before a concern's title. */
export const GRAVITY_WORDS = { stop: "Do not rely", check: "Check", note: "Note" } as const;
