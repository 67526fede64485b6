import type { DoseLine } from "../../../src/core/regimen/index.ts";

/** What a fixture's option orders: 300 mg every 12 h from the evening of 4 March 2026 on. */
export function orderedLine(change: Partial<DoseLine> = {}): DoseLine {
  return {
    id: "a",
    product: "tablet-12h",
    amount: { value: 300, unit: "mg" },
    start: "2026-03-04T20:00:00+00:00",
    repeat: { every: { value: 12, unit: "h" } },
    ...change,
  };
}
