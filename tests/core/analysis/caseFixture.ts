import type { Case } from "../../../src/core/case/index.ts";
import { caseBegun } from "../case/caseBegun.ts";
import { orderedLine } from "../case/orderedLine.ts";

/** A complete invented case to start tests from: woman, 64 years, 58 kg, theophylline 200 mg every 12 h for three days. */
export function caseFixture(change: Partial<Case> = {}): Case {
  const begun = caseBegun("fixture", "Fixture");
  const at = "2026-03-01T08:00:00+00:00";
  return {
    ...begun,
    patient: {
      ...begun.patient,
      observations: [
        { id: "w", at, kind: "weight", quantity: { value: 58, unit: "kg" } },
        { id: "c", at, kind: "serumCreatinine", quantity: { value: 0.94, unit: "mg/dL" } },
      ],
    },
    given: [
      {
        id: "g",
        product: "tablet-12h",
        amount: { value: 200, unit: "mg" },
        start: at,
        repeat: { every: { value: 12, unit: "h" }, count: 7 },
      },
    ],
    options: [{ id: "A", label: "", chosen: true, lines: [orderedLine()] }],
    ...change,
  };
}
