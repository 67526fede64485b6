import type { UnitCode } from "../units/index.ts";

/**
 * What the levels make of this patient: plain data (structured-cloneable). Every interval is taken from the posterior draws,
 * never from a formula about the most likely values. Times `…H` are elapsed hours on the case clock; concentrations mg/L.
 */

/** 5, 25, 50, 75 and 95 % of the draws: the 50 % interval is q25 to q75, the 90 % interval q05 to q95. */
export interface Spread {
  readonly q05: number;
  readonly q25: number;
  readonly q50: number;
  readonly q75: number;
  readonly q95: number;
}

/** Why there is nothing to fit. */
export type NoFitReason =
  | "no-levels"
  | "all-left-out"
  | "no-model"
  /** The record has no variability between patients (all omega 0). */
  | "no-variability"
  | "no-residual"
  /** Every level was drawn before the first dose. */
  | "before-first-dose";

/** Why a fit was tried and is withheld: the typical curve stays. */
export type FitFailure = "not-converged" | "draws-unreliable" | "level-not-explained";

export type FitState =
  | { readonly kind: "none"; readonly reason: NoFitReason }
  /** Is being worked out: the typical patient is shown meanwhile. */
  | { readonly kind: "pending" }
  | { readonly kind: "withheld"; readonly reason: FitFailure; readonly data: Readonly<Record<string, unknown>> }
  | { readonly kind: "fitted"; readonly fit: IndividualFit };

export interface IndividualFit {
  readonly residualModel: "normal" | "robust";
  readonly method: "importance" | "chain";
  readonly seed: number;
  readonly draws: number;
  /** Of the importance weights; null for a chain. */
  readonly paretoK: number | null;
  readonly effectiveSize: number;
  /** Of a chain; null for importance sampling. */
  readonly rHat: number | null;
  readonly iterations: number;
  readonly gradientNorm: number;
  /** Ids, in time order. */
  readonly levelsUsed: readonly string[];
  readonly levelsLeftOut: readonly string[];
  readonly parameters: readonly FittedParameter[];
  /** Terminal, h; null where it depends on the level. */
  readonly halfLife: FittedFigure | null;
  readonly flipFlop: FlipFlopFinding | null;
}

/** One parameter that varies between patients. */
export interface FittedParameter {
  /** As in the working: CL, V, ka, Vmax, Km, Q, V2, F. */
  readonly symbol: string;
  readonly words: string;
  readonly unit: UnitCode;
  /** The typical patient's. */
  readonly typical: number;
  /** Standard deviation between patients on the ln scale. */
  readonly omega: number;
  /** The most likely value (mode on the ln scale). */
  readonly mostLikely: number;
  readonly eta: number;
  readonly prior: Spread;
  readonly posterior: Spread;
  readonly posteriorMean: number;
  readonly posteriorSd: number;
  /** 1 − posterior sd / prior sd, both on the ln scale: 0 taught nothing, near 1 taught all. Can be a little below 0. */
  readonly taught: number;
  /** Densities on the ln scale over one common grid of the parameter's own values, scaled together so that the highest value is 1. */
  readonly density: { readonly values: Float64Array; readonly prior: Float64Array; readonly posterior: Float64Array };
}

export interface FittedFigure {
  readonly typical: number;
  readonly posterior: Spread;
}

/** The levels do not tell absorption from elimination: both readings stand. */
export interface FlipFlopFinding {
  /** Share of the draws whose absorption is slower than the elimination. */
  readonly shareSlowAbsorption: number;
  readonly isAmbiguous: boolean;
  /** Median of the draws on either side: ka and ke (/h), volume (L); null where no draws lie there. */
  readonly fastAbsorption: { readonly ka: number; readonly ke: number; readonly volume: number } | null;
  readonly slowAbsorption: { readonly ka: number; readonly ke: number; readonly volume: number } | null;
}

/** What the fit says of one level that was used or left out. */
export interface LevelFit {
  /** Concentration of this patient at the level's time, without the residual error. */
  readonly predicted: Spread;
  /** A new measurement there: the residual error is in it. */
  readonly predictive: Spread;
  /** (measured − prediction at the most likely values) / residual sd; null for a level below the limit. */
  readonly standardised: number | null;
  /** The typical patient's measurement there, 95 % limits; outside them the level asks a question. */
  readonly priorPredictive: { readonly low: number; readonly median: number; readonly high: number };
  readonly isOutsidePrior: boolean;
  /** What leaving it out (or taking it in) does to the most likely values: ratio with it / without it, by symbol; null with one level. */
  readonly influence: readonly { readonly symbol: string; readonly ratio: number }[] | null;
  /** Made from the levels drawn before it alone, with the residual error; null where the forecast was withheld. */
  readonly forecast: { readonly predictive: Spread; readonly levelsKnown: number; readonly held: boolean } | null;
}

/** Bands about a curve: median and the 50 % and 90 % limits at each time. */
export interface Band {
  readonly timesH: Float64Array;
  readonly q05: Float64Array;
  readonly q25: Float64Array;
  readonly q50: Float64Array;
  readonly q75: Float64Array;
  readonly q95: Float64Array;
}

/** Chances that add up to 1; null without a window, or where there is nothing it is about. */
export interface WindowChance {
  readonly below: number;
  readonly within: number;
  readonly above: number;
}

/** Readings of one option for this patient, each with its interval. Names as in OptionReadings. */
export interface IndividualReadings {
  readonly span: {
    readonly fromH: number;
    readonly toH: number;
    readonly peak: Spread;
    readonly lowest: Spread;
    readonly average: Spread;
    readonly auc: Spread;
    readonly auc24: Spread;
    readonly hoursBelow: Spread | null;
    readonly hoursWithin: Spread | null;
    readonly hoursAbove: Spread | null;
    /** Of what the window is about (lowest, highest, average, AUC in 24 h, or the whole curve), over the span. */
    readonly chance: WindowChance | null;
    /** Share of the draws whose lowest comes before the option's first dose acts, which no dose of it can change; null without a dose to come. */
    readonly lowestBeforeOption: number | null;
  };
  readonly steadyState: {
    readonly peak: Spread;
    readonly lowest: Spread;
    readonly average: Spread;
    readonly auc24: Spread;
    readonly accumulation: Spread;
    readonly timeTo90H: Spread;
    readonly swing: Spread;
    readonly fluctuation: Spread;
    /** Levels at the time after a dose the window asks for; null where it asks for none. */
    readonly timed: { readonly afterDoseH: number; readonly lowest: Spread; readonly highest: Spread } | null;
    /** As in SteadyStateReadings. */
    readonly highestTrough: Spread | null;
  } | null;
  /** At steady state, of what the window is about; a draw that never settles lies above it. null without a window or a repeat. */
  readonly steadyChance: WindowChance | null;
  /** Share of the draws that never reach a steady state (saturable elimination); their steady-state figures are left out, and of too many such draws no figure is given. */
  readonly shareNeverSteady: number;
  /** Share of the draws that reach the record's toxic limit, one that never settles among them; null without a limit, or where it is for a trough and the option does not repeat. */
  readonly toxicChance: number | null;
  readonly halfLifeH: Spread | null;
}
