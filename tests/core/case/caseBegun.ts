import { type Case, caseNew } from "../../../src/core/case/index.ts";
import { recordOf } from "../medicine/recordOf.ts";

/** What the invented cases of the tests share: a woman of 64 years, 4 March 2026, a target for theophylline; nothing seen or given yet. */
export function caseBegun(id: string, label: string, medicine = "theophylline") {
  return {
    ...caseNew({
      id,
      label,
      timeZone: "Europe/Lisbon",
      now: "2026-03-04T12:00:00+00:00",
      medicine: recordOf(medicine),
    }),
    patient: {
      sex: "female",
      age: { value: 64, unit: "a" },
      height: { value: 162, unit: "cm" },
      observations: [],
      factors: [],
    },
    window: {
      quantity: "lowest-and-highest",
      low: { value: 8, unit: "mg/L" },
      high: { value: 15, unit: "mg/L" },
      basis: "invented",
    },
  } satisfies Case;
}
