import type { LevelWindow } from "../exposureTally.ts";
import type { Exposure } from "../historyExposure.ts";
import { CrossCheckRun, type CrossCheckStep } from "./crossCheckRun.ts";
import { exposureArgumentsCheck } from "./modelExposure.ts";
import type { ModelHistory } from "./modelHistory.ts";

/** Halvings of a step: 2^-45 of it. */
const HALVINGS = 45;

/** Where within [from, to] a quantity passes from one side of 0 to the other, by halving. */
function passing(value: (u: number) => number, from: number, to: number): number {
  const isAbove = value(from) > 0;
  let low = from;
  let high = to;
  for (let i = 0; i < HALVINGS; i++) {
    const middle = (low + high) / 2;
    if (value(middle) > 0 === isAbove) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/** A point of a step: h into it, and the level there, mg/L. */
interface Point {
  readonly u: number;
  readonly level: number;
}

/** For how long the level is above the edge (`sign` 1) or below it (−1) between two points without a turn between them, h. */
function hoursBeyond(step: CrossCheckStep, a: Point, b: Point, edge: number, sign: 1 | -1): number {
  const isFirst = sign * (a.level - edge) > 0;
  const isLast = sign * (b.level - edge) > 0;
  if (isFirst === isLast) return isFirst ? b.u - a.u : 0;
  const at = passing((u) => step.levelAt(u) - edge, a.u, b.u);
  return isFirst ? at - a.u : b.u - at;
}

/**
 * Exposure once more, by another road: see crossCheck.
 *
 * Formula: the steps of the integration are the samples, at least 16 between two events; where the slope changes sign within a step
 * the turn is found by halving, and so is the crossing of a window's edge; the area is integrated with the levels.
 * @param history see ModelHistory
 * @param from h
 * @param to h, after `from`
 * @param window mg/L, 0 <= low <= high; optional
 * @returns see Exposure
 * Outside: as crossCheck.
 * Accuracy: levels and average 1e-8 of the largest, hours 1e-5 as far as the slope of the level at the edge allows
 * (tests/core/kinetics/model/crossCheck.test.ts).
 * Source: see DormandPrince.
 * @example crossCheckExposure({ dispositions: [{ from: -Infinity, disposition: { kind: "one-compartment", clearance: 3, volume: 30 } }],
 *   inputs: [{ absorption: { kind: "zero-order", duration: 4 }, bioavailability: 1, lag: 0, doses: [{ time: 0, amount: 300 }] }] }, 0, 24).timeOfPeak // 4
 */
export function crossCheckExposure(history: ModelHistory, from: number, to: number, window?: LevelWindow): Exposure {
  exposureArgumentsCheck(from, to, window);
  const run = new CrossCheckRun(history);
  run.goTo(from);
  run.areaReset();
  let peak = Number.NEGATIVE_INFINITY;
  let timeOfPeak = from;
  let lowest = Number.POSITIVE_INFINITY;
  let timeOfLowest = from;
  let hoursBelow = 0;
  let hoursAbove = 0;
  let covered = from;

  const sample = (level: number, time: number) => {
    if (level > peak) {
      peak = level;
      timeOfPeak = time;
    }
    if (level < lowest) {
      lowest = level;
      timeOfLowest = time;
    }
  };
  sample(run.level, from);
  run.goTo(to, (step) => {
    if (covered < step.at) empty(covered, step.at);
    covered = step.at + step.h;
    const points: Point[] = [{ u: 0, level: step.startLevel }];
    if (step.startSlope > 0 !== step.endSlope > 0) {
      const turn = passing(step.slopeAt, 0, step.h);
      points.push({ u: turn, level: step.levelAt(turn) });
    }
    points.push({ u: step.h, level: step.endLevel });
    for (const [i, point] of points.entries()) {
      sample(point.level, step.at + point.u);
      if (i === 0 || window === undefined) continue;
      hoursBelow += hoursBeyond(step, points[i - 1]!, point, window.low, -1);
      hoursAbove += hoursBeyond(step, points[i - 1]!, point, window.high, 1);
    }
  });
  if (covered < to) empty(covered, to);

  /** Time before the first dose. */
  function empty(start: number, end: number): void {
    sample(0, start);
    sample(0, end);
    if (window !== undefined && window.low > 0) hoursBelow += end - start;
  }

  const total = to - from;
  const auc = run.area;
  return {
    peak,
    timeOfPeak,
    lowest,
    timeOfLowest,
    auc,
    average: auc / total,
    hoursBelow,
    hoursWithin: Math.max(0, total - hoursBelow - hoursAbove),
    hoursAbove,
  };
}
