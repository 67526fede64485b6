import { expm1Excess } from "../numerics/index.ts";
import type { LevelPoint } from "./levelPoints.ts";

/** "linear": straight lines between levels. "linear-up-log-down": straight where the level rises or stays, exponential where it falls. */
export type AreaMethod = "linear-up-log-down" | "linear";

export interface Area {
  /** mg·h/L */
  readonly auc: number;
  /** Area under time × level, mg·h²/L. */
  readonly aumc: number;
}

export function areaMethodCheck(method: AreaMethod): void {
  if (method !== "linear" && method !== "linear-up-log-down") {
    throw new RangeError(`method is ${String(method)}; allowed: linear-up-log-down, linear`);
  }
}

/**
 * Areas under the levels and under time × level, from the first point up to each point.
 *
 * Formula, for a stretch of d hours from (t1, c1) to (t2, c2): linear d·(c1 + c2)/2 and d·(t1·c1 + t2·c2)/2; exponential, for c1 > c2 > 0 and
 * x = ln(c1/c2): d·(c1 − c2)/x and t1·d·(c1 − c2)/x + d²·(c1 − c2 − x·c2)/x².
 * @param points h and mg/L, in order of time, none negative
 * @returns one area a point, the first 0; mg·h/L and mg·h²/L
 * Outside: points are to be checked before (levelPointIssues).
 * Accuracy: relative 1e-14, however little the level falls (tests/core/noncompartmental/areaUnderCurve.test.ts).
 * Source: the integrals of the two lines; definitions as in checks against R 4.2.2, docs/methods/noncompartmental.md.
 * @example areasUpTo([{ time: 0, value: 2 }, { time: 1, value: 1 }], "linear-up-log-down")[1].auc // 1.4426950408889634 = 1/ln 2
 */
export function areasUpTo(points: readonly LevelPoint[], method: AreaMethod): Area[] {
  let auc = 0;
  let aumc = 0;
  return points.map((point, i) => {
    const before = points[i - 1];
    if (before) {
      const stretch = method === "linear" ? linearStretch(before, point) : fallingStretch(before, point);
      auc += stretch.auc;
      aumc += stretch.aumc;
    }
    return { auc, aumc };
  });
}

/** From the first point to the last. */
export function areaOver(points: readonly LevelPoint[], method: AreaMethod): Area {
  return areasUpTo(points, method).at(-1) ?? { auc: 0, aumc: 0 };
}

/** The level at an hour between two points, on the line the method draws there. */
export function levelBetween(from: LevelPoint, to: LevelPoint, time: number, method: AreaMethod): number {
  const share = (time - from.time) / (to.time - from.time);
  if (method === "linear" || !isFalling(from, to)) return from.value + share * (to.value - from.value);
  return from.value * Math.exp(-share * logRatio(from.value, to.value));
}

const isFalling = (from: LevelPoint, to: LevelPoint) => to.value > 0 && to.value < from.value;

/** ln(a/b) for a > b > 0, without loss when they are nearly equal and without overflow when they are far apart. */
function logRatio(a: number, b: number): number {
  return a < 2 * b ? Math.log1p((a - b) / b) : Math.log(a) - Math.log(b);
}

function linearStretch(from: LevelPoint, to: LevelPoint): Area {
  const hours = to.time - from.time;
  return {
    auc: (hours * (from.value + to.value)) / 2,
    aumc: (hours * (from.time * from.value + to.time * to.value)) / 2,
  };
}

function fallingStretch(from: LevelPoint, to: LevelPoint): Area {
  if (!isFalling(from, to)) return linearStretch(from, to);
  const hours = to.time - from.time;
  const x = logRatio(from.value, to.value);
  const fall = from.value - to.value;
  // (fall − x·c2)/x²; below 1 the subtraction would lose digits.
  const moment = x < 1 ? (to.value * expm1Excess(x)) / x : (fall / x - to.value) / x;
  const auc = (hours * fall) / x;
  return { auc, aumc: from.time * auc + hours * hours * moment };
}
