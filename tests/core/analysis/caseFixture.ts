import { type Case, caseNew } from "../../../src/core/case/index.ts";
import { recordById } from "../../../src/core/medicine/index.ts";

/** A complete invented case to start tests from: woman, 64 years, 58 kg, theophylline 200 mg every 12 h for three days. */
export function caseFixture(change: Partial<Case> = {}): Case {
  const base = caseNew({
    id: "fixture",
    label: "Fixture",
    timeZone: "Europe/Lisbon",
    now: "2026-03-04T12:00:00+00:00",
    medicine: recordById("theophylline")!,
  });
  const at = "2026-03-01T08:00:00+00:00";
  return {
    ...base,
    patient: {
      sex: "female",
      age: { value: 64, unit: "a" },
      height: { value: 162, unit: "cm" },
      observations: [
        { id: "w", at, kind: "weight", quantity: { value: 58, unit: "kg" } },
        { id: "c", at, kind: "serumCreatinine", quantity: { value: 0.94, unit: "mg/dL" } },
      ],
      factors: [],
    },
    window: {
      quantity: "lowest-and-highest",
      low: { value: 8, unit: "mg/L" },
      high: { value: 15, unit: "mg/L" },
      basis: "invented",
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
    options: [
      {
        id: "A",
        label: "",
        chosen: true,
        lines: [
          {
            id: "a",
            product: "tablet-12h",
            amount: { value: 300, unit: "mg" },
            start: "2026-03-04T20:00:00+00:00",
            repeat: { every: { value: 12, unit: "h" } },
          },
        ],
      },
    ],
    ...change,
  };
}
