import { type Issue, issue } from "../result/index.ts";

/** A measured level: h after the dose, 0 or more; mg/L, 0 or more. */
export interface LevelPoint {
  readonly time: number;
  readonly value: number;
}

/** A peak and two levels after it, or three on the terminal line: nothing can be said of fewer. */
export const FEWEST_POINTS = 3;

/** Everything that bars any reading of the points; empty when they can be used. Points stand in order of time. */
export function levelPointIssues(points: readonly LevelPoint[]): Issue[] {
  const issues = points.flatMap((point, i) => pointIssues(point, points[i - 1], i));
  if (issues.length > 0) return issues;
  if (points.length < FEWEST_POINTS) {
    return [issue("nca-points-few", { found: points.length, needed: FEWEST_POINTS }, ["points"])];
  }
  if (points.every(({ value }) => value === 0)) return [issue("nca-levels-zero", {}, ["points"])];
  return [];
}

function pointIssues({ time, value }: LevelPoint, before: LevelPoint | undefined, index: number): Issue[] {
  const at = (field: "time" | "value") => ["points", index, field];
  if (!Number.isFinite(time)) return [issue("nca-time-unusable", { position: index + 1 }, at("time"))];
  if (!Number.isFinite(value)) return [issue("nca-level-unusable", { time }, at("value"))];
  if (time < 0) return [issue("nca-time-negative", { time }, at("time"))];
  if (value < 0) return [issue("nca-level-negative", { time, value }, at("value"))];
  if (!before || !Number.isFinite(before.time) || time > before.time) return [];
  if (time === before.time) return [issue("nca-times-equal", { time }, at("time"))];
  return [issue("nca-times-unsorted", { time, before: before.time }, at("time"))];
}

/** Where the highest level stands; the first of several equal ones. */
export function levelPeakIndex(points: readonly LevelPoint[]): number {
  let peak = 0;
  for (const [i, { value }] of points.entries()) if (value > points[peak]!.value) peak = i;
  return peak;
}
