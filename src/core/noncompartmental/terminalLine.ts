import { fail, issue, type Result, succeed } from "../result/index.ts";
import { FEWEST_POINTS, type LevelPoint, levelPeakIndex } from "./levelPoints.ts";
import { type LogLine, logLineFit } from "./logLine.ts";
import { type PointChoice, pointChoiceIndices } from "./pointChoice.ts";

export interface TerminalCandidate extends LogLine {
  /** Which of the points lie on the line, by their place. */
  readonly indices: readonly number[];
  /** 1 − (1 − R²)(n − 1)/(n − 2): R² less what more points would give by chance. */
  readonly adjustedRSquared: number;
}

export interface TerminalLine extends TerminalCandidate {
  readonly chosenBy: "fit" | "user";
  readonly fromTime: number;
  readonly toTime: number;
}

/** Adjusted R² this close to the best counts as equal; then more points are better. Common practice. */
export const TIE_WITHIN = 1e-4;

/** A fall of less than this part over all the points of the line is none: no assay could tell it. */
const LEAST_FALL = 1e-9;

/** Every line through the last 3, 4, … points after the peak, fewest points first. All those levels must be above 0. */
export function terminalCandidates(points: readonly LevelPoint[]): TerminalCandidate[] {
  const candidates: TerminalCandidate[] = [];
  for (let start = points.length - FEWEST_POINTS; start > levelPeakIndex(points); start--) {
    candidates.push(candidate(points, range(start, points.length)));
  }
  return candidates;
}

/**
 * The terminal line: the rate at which the last levels fall.
 *
 * Formula: least squares of ln c on t over the last n ≥ 3 points after the highest level (which is left out), n with the best adjusted R²;
 * within `tieWithin` of the best, the most points. With `choice` the user's points instead, the highest level allowed among them.
 * @param points checked before (levelPointIssues)
 * @param choice the user's overrule: hours from and to, both included, or the places of the points
 * @param tieWithin difference in adjusted R², 0 or more
 * @returns rate in 1/h, intercept ln(mg/L)
 * Outside: an issue for all levels equal, a level of 0 after the peak, fewer than 3 points, a point before the peak, a line that does not fall.
 * Accuracy: relative 1e-10 against R 4.2.2 (tests/outside/theophNoncompartmental.test.ts).
 * Source: best adjusted R² is common practice; definition in docs/methods/noncompartmental.md.
 * @example levels 8, 4, 2, 1 at 1, 2, 3, 4 h: rate 0.693147180559945 (3 points)
 */
export function terminalLine(
  points: readonly LevelPoint[],
  choice?: PointChoice,
  tieWithin: number = TIE_WITHIN,
): Result<TerminalLine> {
  if (!(tieWithin >= 0)) throw new RangeError(`tieWithin is ${tieWithin}; allowed: 0 or more`);
  const first = points[0]!.value;
  if (points.every(({ value }) => value === first)) return fail(issue("nca-levels-equal", { value: first }));
  const chosen = choice === undefined ? chosenByFit(points, tieWithin) : chosenByUser(points, choice);
  if (!chosen.ok) return chosen;
  const line = chosen.value;
  const fromTime = points[line.indices[0]!]!.time;
  const toTime = points[line.indices.at(-1)!]!.time;
  if (line.rate * (toTime - fromTime) <= LEAST_FALL) {
    return fail(issue("nca-terminal-rises", { count: line.indices.length, fromTime, toTime }, ["terminal"]));
  }
  return succeed({ ...line, chosenBy: choice === undefined ? "fit" : "user", fromTime, toTime });
}

function chosenByFit(points: readonly LevelPoint[], tieWithin: number): Result<TerminalCandidate> {
  const peak = levelPeakIndex(points);
  const zero = points.findIndex(({ value }, i) => i > peak && value === 0);
  if (zero !== -1) return zeroFault(points, zero);
  const candidates = terminalCandidates(points);
  const best = Math.max(...candidates.map((each) => each.adjustedRSquared));
  const found = candidates.findLast((each) => each.adjustedRSquared >= best - tieWithin);
  if (found) return succeed(found);
  return fail(
    issue("nca-terminal-few", { found: points.length - 1 - peak, needed: FEWEST_POINTS, picked: false }, ["terminal"]),
  );
}

function chosenByUser(points: readonly LevelPoint[], choice: PointChoice): Result<TerminalCandidate> {
  const indices = pointChoiceIndices(points, choice, "terminal");
  if (!indices.ok) return indices;
  const peak = levelPeakIndex(points);
  const early = indices.value.find((i) => i < peak);
  if (early !== undefined) {
    const data = { time: points[early]!.time, peakTime: points[peak]!.time };
    return fail(issue("nca-terminal-before-peak", data, ["terminal"]));
  }
  const zero = indices.value.find((i) => points[i]!.value === 0);
  if (zero !== undefined) return zeroFault(points, zero);
  if (indices.value.length < FEWEST_POINTS) {
    return fail(
      issue("nca-terminal-few", { found: indices.value.length, needed: FEWEST_POINTS, picked: true }, ["terminal"]),
    );
  }
  return succeed(candidate(points, indices.value));
}

function zeroFault(points: readonly LevelPoint[], index: number): Result<never> {
  return fail(issue("nca-level-zero-logged", { time: points[index]!.time }, ["points", index, "value"]));
}

function candidate(points: readonly LevelPoint[], indices: readonly number[]): TerminalCandidate {
  const line = logLineFit(indices.map((i) => points[i]!));
  const n = indices.length;
  return { ...line, indices, adjustedRSquared: 1 - ((1 - line.rSquared) * (n - 1)) / (n - 2) };
}

function range(from: number, to: number): number[] {
  return Array.from({ length: to - from }, (_, i) => from + i);
}
