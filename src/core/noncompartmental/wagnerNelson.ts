import { fail, type Issue, issue, type Result, succeed } from "../result/index.ts";
import { type AreaMethod, areaMethodCheck, areasUpTo } from "./areaUnderCurve.ts";
import { isAllFinite } from "./isAllFinite.ts";
import { type LevelPoint, levelPointIssues } from "./levelPoints.ts";

export interface AbsorbedPoint {
  readonly time: number; // h
  /** Area up to here, mg·h/L. */
  readonly auc: number;
  /** Absorbed up to here per volume, mg/L. */
  readonly perVolume: number;
  /** Part of all that is absorbed, about 0 to 1; noise and the choice of lines can take it above 1. */
  readonly fraction: number;
  /** 1 − fraction. */
  readonly remaining: number;
}

export interface WagnerNelson {
  readonly points: readonly AbsorbedPoint[];
  /** All that is absorbed per volume, mg/L: ke·AUC∞. */
  readonly totalPerVolume: number;
  readonly flags: readonly Issue[];
}

/** Above 1 by more than this is more than rounding. */
const ABOVE_ONE = 1e-9;

/**
 * Fraction absorbed over time, without a model of absorption.
 *
 * Formula: A(t)/V = C(t) + ke·AUC(0→t); all of it ke·AUC∞ = C(last) + ke·AUC(0→last); fraction their ratio.
 * @param points h after one single dose, the first at 0, and mg/L, in order of time
 * @param ke elimination rate, 1/h, above 0, best from levels after an intravenous dose
 * @param method how the area is formed
 * @returns one row a point; the last is 1 by definition
 * Outside: an issue for bad points, a first point not at the dose, or ke of 0 or below. A fraction above 1 is kept and flagged, and so is a
 * first level above 0.
 * Accuracy: relative 1e-13 of the printed sums (tests/outside/wagnerNelsonExamples.test.ts).
 * Source: Wagner & Nelson's equation as in D. W. A. Bourne, PHAR 7632/7633 course notes, University of Oklahoma, ch. 9 page Ch0903.
 * @example W07 of tests/fixtures/worked_examples.json, ke 0.2: 1.32, 2.22, 2.91 … 4.9 mg/L absorbed per volume
 */
export function wagnerNelson(points: readonly LevelPoint[], ke: number, method: AreaMethod): Result<WagnerNelson> {
  areaMethodCheck(method);
  const faults = levelPointIssues(points);
  if (!(ke > 0 && Number.isFinite(ke))) faults.push(issue("nca-rate-not-positive", { rate: ke }, ["ke"]));
  const first = points[0];
  if (faults.length === 0 && first && first.time !== 0) {
    faults.push(issue("nca-dose-level-missing", { time: first.time }, ["points", 0, "time"]));
  }
  if (faults.length > 0) return fail(...faults);
  const areas = areasUpTo(points, method);
  const perVolume = points.map(({ value }, i) => value + ke * areas[i]!.auc);
  const totalPerVolume = perVolume.at(-1)!;
  const rows = points.map(({ time }, i): AbsorbedPoint => {
    const fraction = perVolume[i]! / totalPerVolume;
    return { time, auc: areas[i]!.auc, perVolume: perVolume[i]!, fraction, remaining: 1 - fraction };
  });
  const found = { points: rows, totalPerVolume, flags: flags(points, rows) };
  return isAllFinite(found) ? succeed(found) : fail(issue("nca-figures-infinite", {}, ["points"]));
}

function flags(points: readonly LevelPoint[], rows: readonly AbsorbedPoint[]): Issue[] {
  const found: Issue[] = [];
  const value = points[0]!.value;
  if (value > 0) found.push(issue("nca-level-at-dose", { value }));
  const highest = rows.reduce((most, row) => (row.fraction > most.fraction ? row : most));
  if (highest.fraction > 1 + ABOVE_ONE) {
    found.push(issue("nca-absorbed-above-all", { fraction: highest.fraction, time: highest.time }));
  }
  return found;
}
