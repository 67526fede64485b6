import type { LevelPoint } from "../../../src/core/noncompartmental/index.ts";

/** Levels at 0, 1, 2, … h, or at the hours given. */
export function levelsAt(values: readonly number[], hours: readonly number[] = values.map((_, i) => i)): LevelPoint[] {
  return values.map((value, i) => ({ time: hours[i]!, value }));
}

/** Theophylline of subject 2 of R's Theoph, rounded: a plain oral curve. */
export const ORAL = levelsAt(
  [0, 1.72, 7.91, 8.31, 8.33, 6.85, 6.08, 5.4, 4.55, 3.01, 0.9],
  [0, 0.27, 0.52, 1, 1.92, 3.5, 5.02, 7.03, 9, 12, 24.3],
);
