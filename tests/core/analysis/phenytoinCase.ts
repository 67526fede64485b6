import type { Case, Observation } from "../../../src/core/case/index.ts";
import { recordById } from "../../../src/core/medicine/index.ts";
import { caseFixture } from "./caseFixture.ts";

/** An invented case: phenytoin 300 mg a day at 08:00 since 1 March, window 10 to 20 mg/L, a level (mg/L) just before the dose of 4 March, an albumin (g/dL). */
export function phenytoinCase(
  measured: number,
  albumin: number | null,
  { at = "2026-03-04T07:30:00+00:00" }: { readonly at?: string } = {},
): Case {
  const base = caseFixture();
  const medicine = recordById("phenytoin")!;
  const product = medicine.products.find((each) => each.release === "modified")!;
  const observed: readonly Observation[] =
    albumin === null
      ? []
      : [
          {
            id: "a",
            at: "2026-03-01T08:00:00+00:00",
            kind: "albumin",
            quantity: { value: albumin, unit: "g/dL" },
          },
        ];
  return {
    ...base,
    medicine,
    patient: { ...base.patient, observations: [...base.patient.observations, ...observed] },
    window: {
      quantity: "trough",
      low: { value: 10, unit: "mg/L" },
      high: { value: 20, unit: "mg/L" },
      basis: "invented",
    },
    given: [
      {
        id: "g",
        product: product.id,
        amount: { value: 300, unit: "mg" },
        start: "2026-03-01T08:00:00+00:00",
        repeat: { every: { value: 24, unit: "h" }, count: 4 },
      },
    ],
    options: [],
    levels: [{ id: "l", at, quantity: { value: measured, unit: "mg/L" }, kind: "measured" }],
  };
}
