import { fail, type Issue, issue, type Result } from "../result/index.ts";
import { afterOneDose } from "./afterOneDose.ts";
import { type AreaMethod, areaMethodCheck, areaOver } from "./areaUnderCurve.ts";
import { isAllFinite } from "./isAllFinite.ts";
import { type LevelPoint, levelPeakIndex, levelPointIssues } from "./levelPoints.ts";
import type { AfterOneDose, Noncompartmental, ObservedFigures, WithinInterval } from "./noncompartmentalTypes.ts";
import type { PointChoice } from "./pointChoice.ts";
import { TIE_WITHIN, terminalLine } from "./terminalLine.ts";
import { withinInterval } from "./withinInterval.ts";

export interface NoncompartmentalOptions {
  /** mg of the active moiety, above 0. Bioavailability is not put in: clearance and volume come out per bioavailability. */
  readonly dose: number;
  readonly method: AreaMethod;
  /** The steady-state interval, h, above 0; the points then lie within one interval. Without it they follow one single dose. */
  readonly tau?: number;
  /** The user's overrule of the terminal points. */
  readonly terminal?: PointChoice;
  /** Adjusted R² within this of the best is a tie, won by more points. 0: no tie. */
  readonly tieWithin?: number;
}

/**
 * What levels after one dose, or within one steady-state interval, say without a model.
 *
 * Formula: Cmax and Tmax as observed; areas by areasUpTo; terminal rate λ by terminalLine, half-life ln 2/λ.
 * After one dose: AUC∞ = AUC + C/λ with C the last level measured or on the line; AUMC∞ = AUMC + t·C/λ + C/λ²; MRT = AUMC∞/AUC∞;
 * CL/F = dose/AUC∞; Vz/F = CL/F/λ. Within an interval τ at steady state: AUCτ, average AUCτ/τ, CL/F = dose/AUCτ, Vz/F = CL/F/λ.
 * @param points h after the dose and mg/L, in order of time; areas begin at the first point, nothing is carried back to the dose
 * @returns the figures with flags that want a look: see noncompartmentalTypes
 * Outside: an issue each, never NaN: fewer than 3 points, times equal or out of order, negative or no levels, all levels equal, a level of 0
 * after the peak (after one dose), a terminal line that does not fall, a dose or interval of 0 or below, figures beyond double precision.
 * Accuracy: relative 1e-10 against R 4.2.2 on Theoph and Indometh (tests/outside/theophNoncompartmental.test.ts).
 * Source: standard definitions (common practice), docs/methods/noncompartmental.md.
 * @example levels 0, 8, 4, 2, 1 at 0, 1, 2, 3, 4 h after 100 mg, linear-up-log-down: AUC∞ 15.541560327111707, CL/F 6.434360241 L/h
 */
export function noncompartmental(
  points: readonly LevelPoint[],
  options: NoncompartmentalOptions & { readonly tau: number },
): Result<WithinInterval>;
export function noncompartmental(
  points: readonly LevelPoint[],
  options: NoncompartmentalOptions & { readonly tau?: never },
): Result<AfterOneDose>;
export function noncompartmental(
  points: readonly LevelPoint[],
  options: NoncompartmentalOptions,
): Result<Noncompartmental>;
export function noncompartmental(
  points: readonly LevelPoint[],
  options: NoncompartmentalOptions,
): Result<Noncompartmental> {
  const { dose, method, tau, terminal, tieWithin = TIE_WITHIN } = options;
  areaMethodCheck(method);
  const faults = [...levelPointIssues(points), ...amountIssues(dose, tau)];
  if (faults.length > 0) return fail(...faults);
  const observed = observedFigures(points, method);
  const line = terminalLine(points, terminal, tieWithin);
  const found =
    tau === undefined ? afterOneDose(observed, line, dose) : withinInterval(points, observed, line, dose, tau);
  if (!found.ok || isAllFinite(found.value)) return found;
  return fail(issue("nca-figures-infinite", {}, ["points"]));
}

function amountIssues(dose: number, tau: number | undefined): Issue[] {
  const issues: Issue[] = [];
  if (!isAboveZero(dose)) issues.push(issue("nca-dose-not-positive", { dose }, ["dose"]));
  if (tau !== undefined && !isAboveZero(tau)) issues.push(issue("nca-interval-not-positive", { tau }, ["tau"]));
  return issues;
}

const isAboveZero = (value: number) => value > 0 && Number.isFinite(value);

function observedFigures(points: readonly LevelPoint[], method: AreaMethod): ObservedFigures {
  const peak = points[levelPeakIndex(points)]!;
  const last = points.findLastIndex(({ value }) => value > 0);
  const measured = points.slice(0, last + 1);
  const linear = areaOver(measured, "linear");
  const logDown = areaOver(measured, "linear-up-log-down");
  return {
    method,
    firstTime: points[0]!.time,
    firstLevel: points[0]!.value,
    cmax: peak.value,
    tmax: peak.time,
    tlast: points[last]!.time,
    clast: points[last]!.value,
    auc: { linear: linear.auc, "linear-up-log-down": logDown.auc },
    aumc: { linear: linear.aumc, "linear-up-log-down": logDown.aumc },
  };
}
