import type { Issue } from "../result/index.ts";
import type { AreaMethod } from "./areaUnderCurve.ts";
import type { TerminalLine } from "./terminalLine.ts";

/** Read off the points. h, mg/L, mg·h/L, mg·h²/L. */
export interface ObservedFigures {
  /** Used for every figure below that rests on an area. */
  readonly method: AreaMethod;
  readonly firstTime: number;
  readonly firstLevel: number;
  readonly cmax: number;
  readonly tmax: number;
  /** The last level above 0. */
  readonly tlast: number;
  readonly clast: number;
  /** From the first point to tlast, both ways. */
  readonly auc: Readonly<Record<AreaMethod, number>>;
  readonly aumc: Readonly<Record<AreaMethod, number>>;
}

/** Figures that rest on the area carried on to infinity. */
export interface ToInfinity {
  readonly auc: number; // mg·h/L
  /** Part of the area that lies beyond the last level, 0 to 1. */
  readonly extrapolatedShare: number;
  readonly aumc: number; // mg·h²/L
  /** h; of an oral dose it includes the time of absorption. */
  readonly mrt: number;
  /** CL/F, L/h */
  readonly clearance: number;
  /** Vz/F, L */
  readonly volume: number;
}

export interface AfterOneDose extends ObservedFigures {
  readonly kind: "one-dose";
  readonly terminal: TerminalLine;
  readonly halfLife: number; // h
  /** The level on the terminal line at tlast, mg/L. */
  readonly clastPredicted: number;
  /** Carried on from the last level as measured. */
  readonly observed: ToInfinity;
  /** Carried on from the last level as the line has it. */
  readonly predicted: ToInfinity;
  readonly flags: readonly Issue[];
}

/** Where the level at an end of the interval comes from: drawn then; between two levels; on the terminal line; the level at the other end. */
export type EndLevel = "measured" | "between" | "line" | "other-end";

export interface WithinInterval extends ObservedFigures {
  readonly kind: "interval";
  /** null where no line falls through the last points; terminalIssues then say why. */
  readonly terminal: TerminalLine | null;
  readonly terminalIssues: readonly Issue[];
  readonly halfLife: number | null; // h
  readonly interval: {
    readonly tau: number; // h
    readonly startLevel: number; // mg/L
    readonly startFrom: EndLevel;
    readonly endLevel: number;
    readonly endFrom: EndLevel;
    readonly auc: number; // mg·h/L, over the whole interval
    /** Part of it before the first or beyond the last level drawn, 0 to 1. */
    readonly extrapolatedShare: number;
    readonly average: number; // mg/L
    /** CL/F, L/h */
    readonly clearance: number;
    /** Vz/F, L; null without a terminal line. */
    readonly volume: number | null;
  };
  readonly flags: readonly Issue[];
}

export type Noncompartmental = AfterOneDose | WithinInterval;

/** Above it an area that was not measured is too large a part. Common practice. */
export const EXTRAPOLATED_LIMIT = 0.2;
