import type { ModelHistory } from "../kinetics/index.ts";

/** Evenly spaced points of a drawn curve; more would not show on any screen. */
export const CURVE_POINTS = 1_200;

/**
 * Times at which a curve is drawn over [fromH, toH]: an even grid plus the instants at which a dose begins or ends to be absorbed
 * and the kinetics change, so that every corner of the curve is on it. Ascending, without repeats. Drawing only: no reading is taken from it.
 */
export function curveTimes(
  history: ModelHistory,
  fromH: number,
  toH: number,
  points: number = CURVE_POINTS,
): Float64Array {
  const times = new Set<number>([fromH, toH]);
  const add = (hours: number) => {
    if (hours > fromH && hours < toH) times.add(hours);
  };
  const step = (toH - fromH) / points;
  for (let i = 1; i < points; i++) add(fromH + i * step);
  for (const { absorption, lag, doses } of history.inputs) {
    for (const dose of doses) {
      const begins = dose.time + lag;
      add(begins);
      if (absorption.kind === "zero-order") add(begins + absorption.duration);
      if (absorption.kind === "mixed") {
        add(begins + absorption.slowLag);
        if (absorption.slow.kind === "zero-order") add(begins + absorption.slowLag + absorption.slow.duration);
      }
    }
  }
  for (const span of history.dispositions) add(span.from);
  return Float64Array.from(times).sort();
}
