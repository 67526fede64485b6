import type { FitFailure, FitState, NoFitReason } from "../analysis/index.ts";
import type { TargetWindow } from "../case/index.ts";
import { numberPrint } from "../units/index.ts";
import {
  type ConcernData,
  type ConcernWords,
  concentration,
  countWords,
  figure,
  hours,
  dataNumber as number,
  dataText as text,
  when,
  wordList,
} from "./concernFigures.ts";
import { chanceWords, fitWords, influenceWords, windowChanceWords } from "./fitWords.ts";
import { likelihoodWords } from "./likelihoodWords.ts";

/** Why the levels say nothing of this patient. */
const NO_FIT: Readonly<Record<NoFitReason, string>> = {
  "no-levels": "No level has been entered.",
  "all-left-out": "Every level is left out.",
  "no-model": "There is no prediction yet that levels could adjust.",
  "no-variability":
    "The medicine record does not say how much patients differ, so levels cannot tell this patient from the typical one.",
  "no-residual": "The medicine record states no residual error, so levels cannot be weighed against the prediction.",
  "before-first-dose": "Every level was drawn before the first counted dose.",
};

export function noFitSentence(reason: NoFitReason): string {
  return NO_FIT[reason];
}

/** Why a fit was tried and is not shown. `data` may carry paretoK, rHat and iterations; what is not there is not said. */
const FAILURES: Readonly<Record<FitFailure, (data: ConcernData) => string>> = {
  "not-converged": ({ iterations }) =>
    `The search for this patient's most likely figures did not come to rest${typeof iterations === "number" ? ` in ${figure(iterations)} steps` : ""}. Check the levels, their times and the doses before them.`,
  "draws-unreliable": ({ paretoK, rHat }) => {
    const found = [
      ...(typeof paretoK === "number" ? [`Pareto k ${numberPrint(paretoK, { decimals: 2 })}, allowed to 0.7`] : []),
      ...(typeof rHat === "number" ? [`chain R-hat ${numberPrint(rHat, { decimals: 2 })}`] : []),
    ];
    return `The draws of what the levels leave possible can't be trusted${found.length > 0 ? ` (${found.join("; ")})` : ""}, so no interval is shown.`;
  },
  "level-not-explained": () =>
    "A level can't have come from the doses entered, whatever the patient: none of the medicine could have been there. Check its time and the doses before it.",
};

export function fitFailureSentence(reason: FitFailure, data: ConcernData): string {
  return FAILURES[reason](data);
}

/** One line on what the figures rest on. `levels`: how many the case has, used or not. */
export function fitLine(fit: FitState, levels: number, use: "typical" | "individual" = "individual"): string {
  switch (fit.kind) {
    case "fitted": {
      const out = fit.fit.levelsLeftOut.length;
      return `${fitWords.individual}: ${countWords(fit.fit.levelsUsed.length, "level", "levels")} used${out > 0 ? `, ${out} left out` : ""}${use === "typical" ? fitWords.setAside : ""}`;
    }
    case "pending":
      return fitWords.pending;
    case "none":
      return levels === 0 ? fitWords.none : `${fitWords.only}. ${noFitSentence(fit.reason)}`;
    case "withheld":
      return `${fitWords.withheld}. ${fitFailureSentence(fit.reason, fit.data)}`;
  }
}

const beyond = (z: number): string =>
  `${figure(Math.abs(z))} residual standard deviations ${z > 0 ? "above" : "below"}`;
const parts = (data: ConcernData): readonly string[] => data.parameters as readonly string[];
const times = (data: ConcernData): string => wordList(data.times as readonly string[]);

const misfit = (data: ConcernData): string =>
  `Measured ${concentration(data, "measured")}, ${beyond(number(data, "standardised"))} what this patient's curve gives there.`;
const outcome = (data: ConcernData): string => {
  const influence = influenceWords(data.influence as Parameters<typeof influenceWords>[0]);
  const robust =
    text(data, "residualModel") === "robust"
      ? " The robust residuals keep its pull small."
      : " Robust residuals would weigh it less.";
  return `${influence === "" ? "" : ` ${influence}.`}${robust}`;
};

function outsideChance(data: ConcernData, side: "above" | "below", other: "above" | "below"): ConcernWords {
  return {
    title: `Option ${text(data, "option")}: chance of lying ${side} the window in this patient ${chanceWords(number(data, side))}`,
    text: `Of ${windowChanceWords(data.quantity as TargetWindow["quantity"], (data.afterDoseH as number | null | undefined) ?? null)} ${data.isSteady ? "at steady state" : "over the span shown"}. Chance of lying ${other} the window ${chanceWords(number(data, other))}.`,
  };
}

/** Fewer draws that never settle make no difference to a chance in whole per cents. */
const NEVER_SAID_FROM = 0.01;

function chanceToxic(data: ConcernData): ConcernWords {
  const isTrough = data.at === "trough";
  const chance = number(data, "chance");
  const words = likelihoodWords(chance, {
    may: "may reach",
    likely: "is likely to reach",
    almostCertain: "almost certainly reaches",
  });
  const found =
    data.median === null
      ? ""
      : `; median highest${isTrough || data.isSteady === true ? "" : " over the span shown"} ${concentration(data, "median")}, 90 % between ${concentration(data, "low")} and ${concentration(data, "high")}`;
  const where = isTrough
    ? " just before a dose at steady state"
    : data.isSteadyCounted === true
      ? ", over the span shown or at steady state,"
      : " over the span shown";
  const never = number(data, "shareNeverSteady");
  const counted = never >= NEVER_SAID_FROM ? `, levels that never settle (${chanceWords(never)}) counted in,` : "";
  return {
    title: `Option ${text(data, "option")} ${words} the toxic limit in this patient`,
    text: `With a chance of ${chanceWords(chance)}${counted} the highest${where} reaches the record's toxic limit${isTrough ? " for that level" : ""}, ${concentration(data, "from")} (${text(data, "source")})${found}.`,
  };
}

/** Concerns about what the levels made of this patient, one function a code. */
export const fitConcernMessages: Readonly<Record<string, (data: ConcernData) => ConcernWords>> = {
  "levels-not-used": (data) => ({
    title: "Predictions are for the typical patient",
    text: `${countWords(number(data, "levels"), "level is", "levels are")} shown beside the prediction but not used to adjust it. ${noFitSentence(data.reason as NoFitReason)}`,
  }),
  "levels-all-left-out": (data) => ({
    title: "All levels are left out",
    text: `${number(data, "levels") === 1 ? "The only level is" : `All ${figure(number(data, "levels"))} levels are`} left out: the prediction is that of the typical patient alone.`,
  }),
  "fit-withheld": (data) => ({
    title: "This patient's figures are withheld",
    text: `${fitFailureSentence(data.reason as FitFailure, data.data as ConcernData)} The typical patient's curve stays; the levels did not adjust it.`,
  }),
  "fit-set-aside": (data) => ({
    title: "The order rests on the typical patient",
    text: `${countWords(number(data, "levels"), "level adjusts", "levels adjust")} this patient's curve, but the case is set to order by the typical patient's figures.`,
  }),
  "level-out-of-range": (data) => ({
    title: `The level of ${when(data)} is out of any usual range`,
    text: `${concentration(data, "measured")}; the record's windows lie between ${concentration(data, "low")} and ${concentration(data, "high")}. Check the unit and the value; a slip here pulls every figure with it.`,
  }),
  "level-residual": (data) => ({
    title: `The level of ${when(data)} does not fit the others and the doses`,
    text: `${misfit(data)} Wrong time, missed dose, interaction or assay?${outcome(data)}`,
  }),
  "level-outlier": (data) => ({
    title: `The level of ${when(data)} stands alone against the other levels`,
    text: `${misfit(data)} The other ${figure(number(data, "others"))} agree with the curve. Wrong time, missed dose, interaction or assay?${outcome(data)}`,
  }),
  "level-outside-prior": (data) => ({
    title: `The level of ${when(data)} is unusual for this medicine`,
    text: `Measured ${concentration(data, "measured")}; of patients like this one on these doses 95 % would have between ${concentration(data, "low")} and ${concentration(data, "high")}. An error, a wrong time, doses not taken, or an unusual patient?`,
  }),
  "forecast-missed": (data) => ({
    title: `The level of ${when(data)} is not what the levels before it foretold`,
    text: `Measured ${concentration(data, "measured")}; the 90 % interval forecast was ${concentration(data, "low")} to ${concentration(data, "high")}. Has the patient changed (an interaction, illness, doses not taken), or is one of the levels or times wrong? The fit lies between them.`,
  }),
  "parameter-unusual": (data) => ({
    title: `${text(data, "words")} lies far from the typical patient's`,
    text: `${figure(number(data, "ratio"))} times the typical, ${figure(Math.abs(number(data, "omegas")))} standard deviations between patients away. Few patients are so; errors in doses or times look the same.`,
  }),
  "levels-taught-little": (data) => ({
    title: `The levels taught little about ${wordList(parts(data))}`,
    text: data.isDecisive
      ? `What they say of it is mostly what the medicine record already said. The dose rests on it: another level would help.`
      : "What they say of it is mostly what the medicine record already said.",
  }),
  "parameters-held": (data) => ({
    title: `The levels do not adjust ${wordList(parts(data))}`,
    text: `The medicine record states no variation between patients for ${parts(data).length === 1 ? "it: it stays the typical patient's, and no interval has its doubt in it" : "them: they stay the typical patient's, and no interval has their doubt in it"}.`,
  }),
  "one-level": (data) => ({
    title: "This patient rests on one level",
    text: `One level can settle one figure: ${wordList(parts(data))} ${parts(data).length === 1 ? "stays" : "stay"} near what the medicine record says.`,
  }),
  "levels-absorption-only": (data) => ({
    title: "Every level was drawn while a dose was still being absorbed",
    text: `${times(data)}. They say more about how fast the dose came in than about how fast it leaves: a level late in the interval would settle clearance.`,
  }),
  "levels-before-steady": (data) => ({
    title: `${countWords(number(data, "count"), "level was", "levels were")} drawn before steady state`,
    text: `${times(data)}; 90 % of the way takes about ${hours(number(data, "steadyH"))} from the first dose. Fine for the fit, which follows every dose, but not a trough at steady state.`,
  }),
  "flip-flop-ambiguous": (data) => ({
    title: "The levels don't tell slow absorption from slow elimination",
    text: `Either absorption half-life ${hours(number(data, "fastAbsorptionH"))}, elimination ${hours(number(data, "fastEliminationH"))}, volume ${figure(number(data, "fastVolume"))} L; or absorption ${hours(number(data, "slowAbsorptionH"))}, elimination ${hours(number(data, "slowEliminationH"))}, volume ${figure(number(data, "slowVolume"))} L (chance ${chanceWords(number(data, "shareSlow"))}). Clearance is much the same in both. What settles it: levels early after a dose of an immediate-release or intravenous form, or a known volume.`,
  }),
  "levels-below-limit": (data) => ({
    title: `${countWords(number(data, "count"), "level is", "levels are")} below the assay's limit`,
    text: `${times(data)}. Used as what it is, a level somewhere below the limit: neither as zero nor as half the limit.`,
  }),
  "levels-within-error": (data) => ({
    title: `Two levels differ by less than the assay's error`,
    text: `${times(data)}: ${concentration(data, "difference")} apart, the error of their difference is ${concentration(data, "error")}. Together they say how high the curve lies, hardly how it falls.`,
  }),
  "levels-same-time": (data) => ({
    title: `${countWords(number(data, "count"), "level has", "levels have")} the same time: ${text(data, "time")}`,
    text: "Two measurements of one sample, or a wrong time? Both are used.",
  }),
  "levels-before-change": (data) => ({
    title: `${data.isAll ? "Every level was" : countWords(number(data, "count"), "level was", "levels were")} drawn before the kinetics changed`,
    text: `Last change ${text(data, "time")}. What ${number(data, "count") === 1 ? "it says" : "they say"} is carried across the change in proportion; ${data.isAll ? "no level shows what the change did to this patient." : "levels after it count for more."}`,
  }),
  "option-chance-above": (data) => outsideChance(data, "above", "below"),
  "option-chance-below": (data) => outsideChance(data, "below", "above"),
  "option-chance-toxic": chanceToxic,
  "never-steady-chance": (data) => ({
    title: `Option ${text(data, "option")} ${likelihoodWords(number(data, "share"), {
      may: "may never reach",
      likely: "is likely never to reach",
      almostCertain: "almost certainly never reaches",
    })} a steady state in this patient`,
    text: `With a chance of ${chanceWords(number(data, "share"))} more is taken than this patient can ever eliminate, and the level rises without end. No steady-state figures are given for this patient.`,
  }),
};

export const FIT_CONCERN_CODES: readonly string[] = Object.keys(fitConcernMessages);
