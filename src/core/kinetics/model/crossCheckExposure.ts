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

/**
 * Exposure once more, by another road: see crossCheck.
 *
 * Formula: the steps of the integration are the samples, at least 16 between two events, and each also at its middle; where the slope
 * changes sign within a half step the turn is found by halving, and so is the crossing of a window's edge; the area is integrated
 * with the levels.
 * @param history see ModelHistory
 * @param from h
 * @param to h, after `from`
 * @param window mg/L, 0 <= low <= high; optional
 * @returns see Exposure
 * Outside: as crossCheck.
 * Accuracy: levels 1e-8 of the largest, AUC relative 1e-8, hours as far as the slope of the level at the edge allows
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
  const low = window?.low ?? Number.NEGATIVE_INFINITY;
  const high = window?.high ?? Number.POSITIVE_INFINITY;
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
  const beyond = (side: (u: number) => number, a: number, b: number): number => {
    const isFirst = side(a) > 0;
    const isLast = side(b) > 0;
    if (isFirst === isLast) return isFirst ? b - a : 0;
    const edge = passing(side, a, b);
    return isFirst ? edge - a : b - edge;
  };
  const piece = ({ at, levelAt }: CrossCheckStep, a: number, b: number) => {
    sample(levelAt(a), at + a);
    sample(levelAt(b), at + b);
    if (window === undefined) return;
    hoursBelow += beyond((u) => low - levelAt(u), a, b);
    hoursAbove += beyond((u) => levelAt(u) - high, a, b);
  };
  run.goTo(to, (step) => {
    if (covered < step.at) empty(covered, step.at);
    covered = step.at + step.h;
    for (const [a, b] of [
      [0, step.h / 2],
      [step.h / 2, step.h],
    ] as const) {
      const isTurning = step.slopeAt(a) > 0 !== step.slopeAt(b) > 0;
      const turn = isTurning ? passing(step.slopeAt, a, b) : b;
      piece(step, a, turn);
      if (turn < b) piece(step, turn, b);
    }
  });
  if (covered < to) empty(covered, to);

  /** Time before the first dose. */
  function empty(start: number, end: number): void {
    sample(0, start);
    sample(0, end);
    if (low > 0 && window !== undefined) hoursBelow += end - start;
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
