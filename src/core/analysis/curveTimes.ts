import type { Course } from "../kinetics/index.ts";

/** Evenly spaced points of a drawn curve; more would not show on any screen. */
const POINTS = 1_200;

/**
 * Times at which a curve is drawn over [fromH, toH]: an even grid plus the instant each dose begins to be absorbed,
 * so that every corner of the curve is on it. Ascending, without repeats. Drawing only: no reading is taken from it.
 */
export function curveTimes(courses: readonly Course[], fromH: number, toH: number): Float64Array {
  const times = new Set<number>([fromH, toH]);
  const step = (toH - fromH) / POINTS;
  for (let i = 1; i < POINTS; i++) times.add(fromH + i * step);
  for (const course of courses) {
    for (const dose of course.doses) {
      const begins = dose.time + course.lag;
      if (begins > fromH && begins < toH) times.add(begins);
    }
  }
  return Float64Array.from(times).sort();
}
