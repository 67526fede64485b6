import type { Case } from "../../../src/core/case/index.ts";
import { caseFixture } from "../../core/analysis/caseFixture.ts";

const FIRST = Date.parse("2026-03-01T08:00:00Z");

export const at = (hours: number) => new Date(FIRST + hours * 3_600_000).toISOString().replace(".000Z", "+00:00");

/** Levels in mg/L at hours after 1 March 2026, 08:00. */
export function levelsOf(pairs: readonly (readonly [hours: number, value: number])[]): Case["levels"] {
  return pairs.map(([hours, value], i) => ({
    id: `l${i}`,
    at: at(hours),
    quantity: { value, unit: "mg/L" },
    kind: "measured",
  }));
}

/** Theophylline of subject 12 of R's Theoph, times to the minute. */
export const ORAL_LEVELS = levelsOf([
  [0.25, 1.25],
  [0.5, 3.96],
  [1, 7.82],
  [2, 9.72],
  [3.5, 9.75],
  [5, 8.57],
  [7, 6.59],
  [9, 6.11],
  [12, 4.57],
  [24, 1.17],
]);

const line = (count: number) => ({
  id: "g",
  product: "tablet-12h",
  amount: { value: 200, unit: "mg" as const },
  start: at(0),
  ...(count > 1 ? { repeat: { every: { value: 12, unit: "h" as const }, count } } : {}),
});

/** The fixture's patient with `count` doses of 200 mg, 12 h apart, and these levels. */
export function richCase(count: number, levels: Case["levels"], change: Partial<Case> = {}): Case {
  const now = at(Math.max(73, 12 * count + 1));
  return caseFixture({ now, given: [line(count)], options: [], levels, ...change });
}
