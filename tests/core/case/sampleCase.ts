import type { Case } from "../../../src/core/case/index.ts";
import { caseBegun } from "./caseBegun.ts";
import { orderedLine } from "./orderedLine.ts";

/** An invented case with something in every part of it. */
export function sampleCase(): Case {
  const begun = caseBegun("sample-1", "Sample ward 1, bed 2");
  return {
    ...begun,
    patient: {
      ...begun.patient,
      observations: [
        { id: "o1", at: "2026-03-01T08:00:00+00:00", kind: "weight", quantity: { value: 58, unit: "kg" } },
        { id: "o2", at: "2026-03-02T07:00:00+00:00", kind: "serumCreatinine", quantity: { value: 1, unit: "mg/dL" } },
        {
          id: "o3",
          at: "2026-03-02T07:00:00+00:00",
          kind: "albumin",
          quantity: { value: 36, unit: "g/L" },
          confirmed: true,
        },
      ],
      factors: [
        { kind: "meal", from: "2026-03-02T12:00:00+00:00", to: "2026-03-02T12:30:00+00:00", detail: "invented" },
      ],
    },
    given: [
      {
        id: "g1",
        product: "tablet-12h",
        amount: { value: 200, unit: "mg" },
        start: "2026-03-01T08:00:00+00:00",
        repeat: { every: { value: 12, unit: "h" }, count: 7 },
        except: [
          { index: 2, status: "late", at: "2026-03-02T09:30:00+00:00" },
          { index: 3, status: "missed" },
        ],
      },
      { id: "g2", product: "solution", amount: { value: 15, unit: "mL" }, start: "2026-03-01T15:00:00+00:00" },
    ],
    levels: [
      { id: "l1", at: "2026-03-03T07:30:00+00:00", quantity: { value: 6.5, unit: "mg/L" }, kind: "measured" },
      {
        id: "l2",
        at: "2026-03-04T07:30:00+00:00",
        quantity: { value: 45, unit: "umol/L" },
        kind: "measured",
        excluded: "drawn from the line",
      },
    ],
    options: [
      {
        id: "A",
        label: "300 mg every 12 h",
        chosen: true,
        lines: [orderedLine({ id: "a1", repeat: { every: { value: 12, unit: "h" }, count: 10 } })],
      },
      {
        id: "B",
        label: "",
        chosen: false,
        lines: [
          orderedLine({
            id: "b1",
            amount: { value: 200, unit: "mg" },
            start: "2026-03-05T08:00:00+00:00",
            repeat: { clock: ["08:00"], days: 5 },
          }),
          orderedLine({ id: "b2", start: "2026-03-04T22:00:00+00:00", repeat: { clock: ["22:00"] } }),
        ],
      },
    ],
    notes: "invented",
  };
}
