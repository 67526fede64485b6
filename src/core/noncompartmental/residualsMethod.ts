import { fail, type Issue, issue, type Result, succeed } from "../result/index.ts";
import { isAllFinite } from "./isAllFinite.ts";
import { type LevelPoint, levelPeakIndex, levelPointIssues } from "./levelPoints.ts";
import { type LogLine, logLineAt, logLineFit } from "./logLine.ts";
import { type PointChoice, pointChoiceIndices } from "./pointChoice.ts";
import { type TerminalLine, terminalLine } from "./terminalLine.ts";

export interface Residual {
  readonly time: number; // h
  readonly level: number; // mg/L, as measured
  readonly line: number; // mg/L, the terminal line carried back
  readonly residual: number; // mg/L, line − level
  /** Whether it counts towards the absorption rate. */
  readonly isUsed: boolean;
}

export interface ResidualsReading {
  readonly terminal: TerminalLine;
  /** The rate of the terminal line, 1/h. */
  readonly ke: number;
  /** One for each point before the terminal line begins. */
  readonly residuals: readonly Residual[];
  /** The rate at which the residuals fall, 1/h; null with the reason among the flags. */
  readonly ka: number | null;
  /** The line through the logarithms of the residuals. */
  readonly residualLine: LogLine | null;
  /** Where the two lines meet, h; below 0 when they meet before the dose. */
  readonly meetingTime: number | null;
  /** The estimated lag, h: where the lines meet, 0 when that is before the dose. */
  readonly lag: number | null;
  readonly flags: readonly Issue[];
}

export interface ResidualsOptions {
  /** The user's overrule of the terminal points. */
  readonly terminal?: PointChoice;
  /** Which residuals count; without it those of levels above 0 up to the highest. Only residuals above 0 have a logarithm. */
  readonly residual?: PointChoice;
  readonly tieWithin?: number;
}

/** From here on the two rates are told apart well: D. W. A. Bourne, PHAR 7632/7633 course notes, University of Oklahoma, ch. 9 page c0902. */
export const RATES_APART = 5;
/** Below it the rates run into each other. Common practice. */
export const RATES_TOO_NEAR = 3;

/**
 * Absorption rate by the method of residuals (curve stripping).
 *
 * Formula: residual(t) = exp(intercept − ke·t) − C(t), terminal line by terminalLine; ka = −slope of ln residual on t by least squares over
 * the residuals above 0; the lines meet at (residual intercept − terminal intercept)/(ka − ke), the estimate of the lag.
 * @param points h after one single dose and mg/L, in order of time
 * @returns rates in 1/h, times in h
 * Outside: an issue for whatever bars a terminal line; fewer than two residuals above 0, or residuals that do not fall, leave ka null with a
 * flag; ka below 5 × ke is flagged as doubtful, below 3 × ke as unreliable. ka is the faster rate of the two: which of them is absorption
 * oral levels alone do not tell.
 * Accuracy: relative 1e-12 against least squares in R (tests/outside/residualsExamples.test.ts).
 * Source: D. W. A. Bourne, PHAR 7632/7633 course notes, University of Oklahoma, ch. 9 page c0902.
 * @example W05 of tests/fixtures/worked_examples.json, terminal from 3 h, residuals to 1 h: ke 0.19936, ka 2.03296
 */
export function residualsMethod(
  points: readonly LevelPoint[],
  options: ResidualsOptions = {},
): Result<ResidualsReading> {
  const faults = levelPointIssues(points);
  if (faults.length > 0) return fail(...faults);
  const line = terminalLine(points, options.terminal, options.tieWithin);
  if (!line.ok) return line;
  const terminal = line.value;
  const picked = options.residual ? pointChoiceIndices(points, options.residual, "residual") : succeed(null);
  if (!picked.ok) return picked;
  const peak = levelPeakIndex(points);
  const residuals = points.slice(0, terminal.indices[0]).map(({ time, value }, i): Residual => {
    const onLine = logLineAt(terminal, time);
    const residual = onLine - value;
    const isPicked = picked.value ? picked.value.includes(i) : value > 0 && i <= peak;
    return { time, level: value, line: onLine, residual, isUsed: isPicked && residual > 0 };
  });
  const found = { terminal, ke: terminal.rate, residuals, ...absorption(residuals, terminal) };
  return isAllFinite(found) ? succeed(found) : fail(issue("nca-figures-infinite", {}, ["points"]));
}

function absorption(
  residuals: readonly Residual[],
  terminal: TerminalLine,
): Pick<ResidualsReading, "ka" | "residualLine" | "meetingTime" | "lag" | "flags"> {
  const none = { ka: null, residualLine: null, meetingTime: null, lag: null };
  const used = residuals.filter((each) => each.isUsed).map(({ time, residual }) => ({ time, value: residual }));
  if (used.length < 2) return { ...none, flags: [issue("nca-residuals-few", { found: used.length, needed: 2 })] };
  const residualLine = logLineFit(used);
  const ka = residualLine.rate;
  if (ka <= 0) return { ...none, residualLine, flags: [issue("nca-residuals-rise", { count: used.length })] };
  const ratio = ka / terminal.rate;
  const meetingTime =
    ka === terminal.rate ? null : (residualLine.intercept - terminal.intercept) / (ka - terminal.rate);
  return {
    ka,
    residualLine,
    meetingTime,
    lag: meetingTime === null ? null : Math.max(0, meetingTime),
    flags: ratioFlags(ratio),
  };
}

function ratioFlags(ratio: number): Issue[] {
  if (ratio < RATES_TOO_NEAR) return [issue("nca-rates-too-near", { ratio, limit: RATES_TOO_NEAR })];
  if (ratio < RATES_APART) return [issue("nca-rates-near", { ratio, limit: RATES_APART })];
  return [];
}
