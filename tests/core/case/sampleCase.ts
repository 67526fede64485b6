import { type Case, caseNew } from "../../../src/core/case/index.ts";
import { type MedicineRecord, recordById } from "../../../src/core/medicine/index.ts";

export function recordOf(id: string): MedicineRecord {
  const record = recordById(id);
  if (!record) throw new Error(`no record ${id}`);
  return record;
}

/** An invented case with something in every part of it. */
export function sampleCase(): Case {
  return {
    ...caseNew({
      id: "sample-1",
      label: "Sample ward 1, bed 2",
      timeZone: "Europe/Lisbon",
      now: "2026-03-04T12:00:00+00:00",
      medicine: recordOf("theophylline"),
    }),
    patient: {
      sex: "female",
      age: { value: 64, unit: "a" },
      height: { value: 162, unit: "cm" },
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
    window: {
      quantity: "lowest-and-highest",
      low: { value: 8, unit: "mg/L" },
      high: { value: 15, unit: "mg/L" },
      basis: "invented ward policy",
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
        lines: [
          {
            id: "a1",
            product: "tablet-12h",
            amount: { value: 300, unit: "mg" },
            start: "2026-03-04T20:00:00+00:00",
            repeat: { every: { value: 12, unit: "h" }, count: 10 },
          },
        ],
      },
      {
        id: "B",
        label: "",
        chosen: false,
        lines: [
          {
            id: "b1",
            product: "tablet-12h",
            amount: { value: 200, unit: "mg" },
            start: "2026-03-05T08:00:00+00:00",
            repeat: { clock: ["08:00"], days: 5 },
          },
          {
            id: "b2",
            product: "tablet-12h",
            amount: { value: 300, unit: "mg" },
            start: "2026-03-04T22:00:00+00:00",
            repeat: { clock: ["22:00"] },
          },
        ],
      },
    ],
    notes: "invented",
  };
}
