import type { Absorption, BothReadings, DispositionSpan } from "../kinetics/index.ts";
import type { DoseAmount } from "../regimen/index.ts";
import type { Issue } from "../result/index.ts";
import type { UnitCode } from "../units/index.ts";
import type { Band, FitState, IndividualReadings, LevelFit } from "./fitTypes.ts";
import type { TimedLevels } from "./windowTiming.ts";

/**
 * What `derive(case)` returns: everything the screens, the summary and `recompute` show.
 * Plain data (structured-cloneable). Times `…H` are elapsed hours from `clock.originMs`; amounts mg, concentrations mg/L.
 */

/** A value that can be traced: where it came from, with its formula and the numbers put into it. */
export interface Traced {
  readonly value: number;
  readonly unit: UnitCode;
  /** Formula in plain text, names as in the working. */
  readonly formula: string;
  /** The numbers that went in, by the names in the formula, with their units. */
  readonly inputs: readonly { readonly name: string; readonly value: number; readonly unit: UnitCode }[];
  readonly source: string;
  readonly basis: string;
  /** What to know before reading it: used outside the people it was made in, a known bias. */
  readonly remarks?: readonly Issue[];
}

export type DoseStatus = "taken" | "missed" | "late" | "moved" | "after-now" | "before-now";

export interface DoseMark {
  readonly lineId: string;
  readonly index: number;
  readonly product: string;
  readonly atH: number;
  readonly scheduledH: number;
  readonly amount: DoseAmount;
  /** mg of the active moiety; 0 when it does not count (missed, or on the wrong side of the now line). */
  readonly countedMg: number;
  readonly status: DoseStatus;
}

export interface Curve {
  readonly timesH: Float64Array;
  /** mg/L */
  readonly values: Float64Array;
}

export interface PatientFigures {
  /** Latest value at or before the now line. */
  readonly heightCm: number | null;
  readonly weight: Traced | null;
  readonly creatinine: Traced | null;
  readonly idealWeight: Traced | null;
  readonly adjustedWeight: Traced | null;
  readonly bodyMassIndex: Traced | null;
  /** Janmahasatian, kg. */
  readonly leanWeight: Traced | null;
  /** By Mosteller, m²: what formulas and de-indexing use. */
  readonly bodySurface: Traced | null;
  /** By Du Bois, m²: for comparison. */
  readonly bodySurfaceDuBois: Traced | null;
  /** g/L */
  readonly albumin: Traced | null;
  readonly creatinineClearance: Traced | null;
  /** Which weight went into creatinineClearance. */
  readonly clearanceWeight: "actual" | "ideal" | "adjusted" | null;
  /** For comparison: no record's formula uses it. */
  readonly filtrationRate: FiltrationRate | null;
  /** The latest level of phenytoin as it would be with a normal albumin; null for any other medicine. Never in a fit. */
  readonly phenytoinForAlbumin: PhenytoinForAlbumin | null;
}

export interface FiltrationRate {
  /** Adults by CKD-EPI 2021, from 1 to below 18 years by bedside Schwartz. */
  readonly equation: "ckd-epi-2021" | "bedside-schwartz";
  /** mL/min per 1.73 m² */
  readonly perSurface: Traced;
  /** mL/min of this patient; null without a body surface. */
  readonly deindexed: Traced | null;
}

export interface PhenytoinForAlbumin {
  readonly levelId: string;
  /** Epoch milliseconds. */
  readonly levelAtMs: number;
  readonly form: "usual" | "kidney-failure";
  /** Below the formula's normal; otherwise there is nothing to correct. */
  readonly isAlbuminLow: boolean;
  /** mg/L */
  readonly figure: Traced;
}

export interface ProductModel {
  readonly product: string;
  readonly absorption: Absorption;
  /** First-order rate, /h (of the fast part where the input is mixed); null for a zero-order input. */
  readonly absorptionRate: Traced | null;
  /** What else the input needs: durations, fractions, the slow rate; by name. */
  readonly inputFigures: readonly NamedFigure[];
  readonly lag: Traced; // h
  readonly bioavailability: Traced; // 1
  /** null where exchanging absorption and elimination has no meaning. */
  readonly readings: BothReadings | null;
}

export interface NamedFigure {
  /** As in the working: CL, V, Vmax … */
  readonly symbol: string;
  readonly words: string;
  readonly figure: Traced;
}

/** The kinetics of the typical patient: the record's formulas with this patient's figures put in. */
export interface Model {
  readonly kind: DispositionSpan["disposition"]["kind"];
  /** The record's parameters with this patient's numbers put in, in the final state: effects of events included. */
  readonly parameters: readonly NamedFigure[];
  readonly clearance: Traced | null; // L/h; null where it depends on the level
  readonly volume: Traced; // L
  readonly eliminationRate: Traced | null; // /h
  /** Of elimination; of the terminal phase with two compartments; null where it depends on the level. */
  readonly halfLife: Traced | null; // h
  readonly products: readonly ProductModel[];
  /** In force from when, elapsed hours on the case clock; the first from −Infinity. The last is the final state. */
  readonly dispositions: readonly DispositionSpan[];
  /** h after a dose until the distribution phase is over, by product; 0 with one compartment. */
  readonly distributionEndH: Readonly<Record<string, number>>;
}

export interface SpanReadings {
  readonly fromH: number;
  readonly toH: number;
  readonly peak: number;
  readonly timeOfPeakH: number;
  readonly lowest: number;
  readonly timeOfLowestH: number;
  readonly average: number;
  readonly auc: number; // mg·h/L
  readonly auc24: number; // mg·h/L, average × 24 h
  /** null when the case has no concentration window. */
  readonly hoursBelow: number | null;
  readonly hoursWithin: number | null;
  readonly hoursAbove: number | null;
  /** Highest level just before a dose that follows another, mg/L; null where there is none, or the record's toxic limit is not for it. */
  readonly highestTrough: number | null;
}

export interface SteadyStateReadings {
  /** The repeating pattern these refer to, h. */
  readonly periodH: number;
  readonly dosePerPeriodMg: number;
  readonly peak: number;
  /** Hours from the dose before it to the peak. */
  readonly peakAfterDoseH: number;
  readonly lowest: number;
  readonly lowestAfterDoseH: number;
  readonly average: number;
  readonly auc24: number;
  readonly swing: number;
  readonly fluctuation: number;
  /** AUC over the period at steady state / AUC over the first period. */
  readonly accumulation: number;
  /** Elapsed hours from the first dose of the pattern until 90 % of the way to steady state (slower of ka and ke). */
  readonly timeTo90H: number;
  /** The same as an instant on the case clock. */
  readonly steady90AtH: number;
  readonly slower: "absorption" | "elimination";
  /** Levels at the time after a dose the window asks for; null where it asks for none. */
  readonly timed: TimedLevels | null;
  /** Highest level just before a dose, or at the time after it the window asks for, mg/L; null where the record's toxic limit is not for it. */
  readonly highestTrough: number | null;
}

export interface OptionReadings {
  readonly span: SpanReadings;
  /** null with a reason code (messages) when the option has no repeating pattern. */
  readonly steadyState: SteadyStateReadings | null;
  readonly noSteadyState: "no-repeat" | "no-common-period" | "dose-rate-at-or-above-vmax" | null;
  /** mg as labelled, and mg of the active moiety; the same but for a salt. */
  readonly dailyDoseMg: number | null;
  readonly activeDailyDoseMg: number | null;
  /** null where it depends on the level. */
  readonly halfLifeH: number | null;
  /** Whether the kinetics change after the now line: steady-state figures then refer to the final state. */
  readonly refersToFinalState: boolean;
}

export interface OptionResult {
  readonly id: string;
  readonly doses: readonly DoseMark[];
  readonly curve: Curve | null;
  readonly typical: OptionReadings | null;
  /** null until the levels have been fitted, or where they cannot be. */
  readonly individual: IndividualReadings | null;
  readonly band: Band | null;
}

/** The second road: the same figures by plain numerical integration. */
export interface CrossCheck {
  /** Largest difference found anywhere, as a share of the largest level. */
  readonly worst: number;
  /** What differed most: "given", or an option's id. */
  readonly where: string;
  readonly isAgreed: boolean;
}

export interface LevelResult {
  readonly id: string;
  readonly atH: number;
  /** mg/L */
  readonly measured: number;
  /** Half-width of the assay bar, mg/L (one residual standard deviation of the record), null if the record has none. */
  readonly assaySd: number | null;
  readonly predicted: number | null;
  /** measured − predicted, mg/L */
  readonly difference: number | null;
  /** Hours since the last counted dose before it. */
  readonly afterDoseH: number | null;
  readonly excluded: string | null;
  readonly belowLimit: boolean;
  /** null until the levels have been fitted. */
  readonly fit: LevelFit | null;
}

export type Gravity = "stop" | "check" | "note";

export interface Concern {
  /** Stable: code, or code:subject. */
  readonly id: string;
  readonly code: string;
  readonly gravity: Gravity;
  readonly about: {
    readonly kind: "case" | "patient" | "given" | "level" | "option" | "medicine";
    readonly id?: string;
  };
  readonly data: Readonly<Record<string, unknown>>;
}

export interface Analysis {
  readonly clock: {
    /** Epoch milliseconds of hour 0: local midnight of the first day shown. */
    readonly originMs: number;
    readonly timeZone: string;
    readonly nowH: number;
    /** Span shown and swept. */
    readonly fromH: number;
    readonly toH: number;
    /** End of the span of the readings (it begins at the now line). */
    readonly readingsToH: number;
    /** Local midnights inside the span, for day lines (daylight-saving safe). */
    readonly midnightsH: readonly number[];
  };
  readonly patient: PatientFigures;
  /** null when something needed is missing; the concerns say what. */
  readonly typical: Model | null;
  /** What the levels make of this patient. */
  readonly fit: FitState;
  readonly given: readonly DoseMark[];
  readonly givenCurve: Curve | null;
  readonly givenBand: Band | null;
  readonly levels: readonly LevelResult[];
  readonly options: readonly OptionResult[];
  readonly concerns: readonly Concern[];
  /** null until it has been made (it follows the figures), or without a prediction. */
  readonly crossCheck: CrossCheck | null;
  /** SHA-256 over the canonical JSON of the inputs that matter, hex. */
  readonly fingerprint: string;
  readonly engine: string;
}
