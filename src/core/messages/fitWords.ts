import {
  type FittedFigure,
  type FittedParameter,
  type LevelFit,
  TAUGHT_LITTLE,
  TAUGHT_MUCH,
} from "../analysis/index.ts";
import type { TargetWindow } from "../case/index.ts";
import { numberPrint } from "../units/index.ts";
import { figure, hours, wordList } from "./concernFigures.ts";
import { windowPointWords } from "./windowWords.ts";

/** Fixed words about this patient's figures. */
export const fitWords = {
  /** Behind the levels used, where the order does not rest on them. */
  setAside: ". The order rests on the typical patient",
  typical: "typical",
  individual: "this patient",
  typicalPatient: "typical patient",
  interval: "90 % interval",
  level: "level",
  leftOut: (reason: string) => `left out: ${reason}`,
  forecast: (levelsKnown: number): string => `forecast before it (${knownWords(levelsKnown)}), 90 %:`,
  forecastHead: (levelsKnown: number): string => `Forecast before it was known (${knownWords(levelsKnown)})`,
  noForecast: "No forecast before it: the levels before it alone gave none",
  onlyLevel: "The only level used: without it there is the typical patient",
  priorRange: "Of patients like this one 95 % would have",
  outsidePrior: "it lies outside",
  findingsHead: "What each level says",
  predictedBy:
    "Typical: from the medicine record and the patient's values alone. This patient: with the levels used; 90 % interval of the curve, without the assay's error.",
  held: (held: boolean) => (held ? "held" : "did not hold"),
  keyHead: "How to read it",
  keyIndividual: "this patient, median",
  keyTypical: "typical patient",
  keyBand: "50 % and 90 % intervals",
  keyForecast: "forecast before a level was known, 90 %; dashed: did not hold",
  profileHint:
    "Arrow keys move by an hour, with Shift by a quarter. L goes to the next level, Shift and L to the one before.",
  taughtTitle: "What the levels taught",
  openTaught: "What the levels taught",
  chanceHead: (quantity: string) => `Chance of ${quantity} lying within the window`,
  chanceSteady: "at steady state",
  chanceBeside: (below: string, above: string) => `below ${below}, above ${above}`,
  chanceOption: (option: string) => `Option ${option}`,
  chanceHourNever: "No chance is given: the next dose always comes before the hour the window is for.",
  chanceTaken: "Of this patient, from what the levels leave possible.",
  /** In the cell of a figure that is not given, and at the table why. */
  notGiven: "not given",
  ofOptions: (options: readonly string[], sentence: string) =>
    `${options.length === 1 ? "Option" : "Options"} ${wordList(options)}: ${lowered(sentence)}`,
  ofPatient: (option: string, sentence: string) => `Option ${option}, this patient: ${lowered(sentence)}`,
  typicalNever: (option: string) =>
    `Option ${option}, typical patient: more is taken than can be eliminated, so there is no steady state.`,
  within: "within",
  below: "below",
  above: "above",
  progress: "part of the fit worked out",
  stale: "being worked out again; what is shown is from before the last change",
  pending: "this patient: being worked out; the typical patient is shown meanwhile",
  only: "typical patient only",
  none: "typical patient only: no level",
  withheld: "this patient is withheld; the typical patient stays",
  prior: "before the levels (patients like this one)",
  posterior: "with the levels (this patient)",
  mostLikely: "most likely",
  median: "median",
  halfLife: "Half-life",
  taught: "taught",
  halfLifeIs: ({ typical, posterior }: FittedFigure): string =>
    `${hours(posterior.q50)}, ${fitWords.interval} ${figure(posterior.q05)} to ${hours(posterior.q95)}; ${fitWords.typical} ${hours(typical)}`,
  residualModel: "Residuals",
  residualModels: {
    normal: { label: "normal", detail: "every level counts by its error" },
    robust: { label: "robust", detail: "a level far off counts less (Student t, 4 degrees of freedom)" },
  },
  use: "The order rests on",
  uses: { individual: "this patient", typical: "the typical patient" },
  working: "How it was worked out",
  levelsUsed: "Levels used",
  levelsLeftOut: "Levels left out",
  noLevelsLeftOut: "none",
  seeWorking: "working",
} as const;

function knownWords(levels: number): string {
  return levels === 0 ? "no level known" : levels === 1 ? "1 level known" : `${levels} levels known`;
}

/** What a chance of a window is about, with its article: "the lowest", "the level 12 hours after the dose", "the whole curve". */
export function windowChanceWords(quantity: TargetWindow["quantity"], afterDoseH: number | null): string {
  if (quantity === "lowest-and-highest") return "the whole curve";
  return `the ${afterDoseH === null ? "" : "level "}${windowPointWords(quantity, afterDoseH)}`;
}

/** A chance in words: never "0 %" or "100 %". */
export function chanceWords(share: number): string {
  if (share < 0.01) return "under 1\u00a0%";
  if (share > 0.99) return "over 99\u00a0%";
  return `${numberPrint(share * 100, { decimals: 0 })}\u00a0%`;
}

export function taughtWord(taught: number): "much" | "something" | "little" {
  return taught >= TAUGHT_MUCH ? "much" : taught >= TAUGHT_LITTLE ? "something" : "little";
}

const lowered = (words: string): string => words.charAt(0).toLowerCase() + words.slice(1);

/** "The levels taught much about clearance, little about absorption." */
export function taughtSentence(
  parameters: readonly Pick<FittedParameter, "words" | "taught">[],
  levels: number,
): string {
  const clauses = (["much", "something", "little"] as const).flatMap((word) => {
    const names = parameters.filter(({ taught }) => taughtWord(taught) === word).map(({ words }) => lowered(words));
    return names.length === 0 ? [] : [`${word} about ${wordList(names)}`];
  });
  return clauses.length === 0 ? "" : `The ${levels === 1 ? "level" : "levels"} taught ${clauses.join(", ")}.`;
}

/** Below this share a change is called none. */
const NO_CHANGE = 0.005;

/** "Without it clearance would be 12 % higher": from ratios with it / without it. Empty where nothing is known. */
export function influenceWords(
  influence: LevelFit["influence"],
  nameOf: (symbol: string) => string = (symbol) => SYMBOL_WORDS[symbol] ?? symbol,
  isLeftOut = false,
): string {
  if (influence === null || influence.length === 0) return "";
  const lead = isLeftOut ? "With it" : "Without it";
  const clauses = influence.flatMap(({ symbol, ratio }) => {
    const change = isLeftOut ? ratio - 1 : 1 / ratio - 1;
    const size = numberPrint(Math.abs(change) * 100, { decimals: 0 });
    return Math.abs(change) < NO_CHANGE
      ? []
      : [`${nameOf(symbol)} would be ${size} % ${change > 0 ? "higher" : "lower"}`];
  });
  return clauses.length === 0 ? `${lead} nothing would change` : `${lead} ${wordList(clauses)}`;
}

const SYMBOL_WORDS: Readonly<Record<string, string>> = {
  CL: "clearance",
  V: "volume",
  V1: "volume",
  ka: "absorption rate",
  Vmax: "highest elimination rate",
  Km: "half-saturation concentration",
  Q: "exchange",
  V2: "second volume",
  F: "bioavailability",
};

/** What a symbol of the working stands for in a sentence. */
export function symbolWords(symbol: string): string {
  return SYMBOL_WORDS[symbol] ?? symbol;
}
