import { describe, expect, it } from "vitest";
import { amountsOverTime, derive } from "../../../src/core/analysis/index.ts";
import type { Case } from "../../../src/core/case/index.ts";
import { BUILT_IN_RECORDS } from "../../../src/core/medicine/index.ts";
import { caseFixture } from "./caseFixture.ts";

const HOURS = [0, 8, 8.25, 12, 20, 20.001, 60, 84, 92.5, 120, 160];
const base = caseFixture();
const inhibited: Case = {
  ...base,
  patient: {
    ...base.patient,
    factors: [
      {
        kind: "interacting-medicine",
        from: "2026-03-03T08:00:00+00:00",
        detail: "invented inhibitor",
        effect: { clearance: 0.5, onset: { value: 2, unit: "d" } },
      },
    ],
  },
};

describe("where the dose is", () => {
  const cases: [string, Case][] = [
    ["as usual", base],
    ["with a clearance that changes", inhibited],
  ];
  it.each(cases)("gut, body and eliminated add up to F × dose taken, %s", (_, value) => {
    const analysis = derive(value);
    const { gut, body, peripheral, eliminated, taken } = amountsOverTime(analysis, "A", HOURS)!;
    const f = analysis.typical!.products.find((one) => one.product === "tablet-12h")!.bioavailability.value;
    // By hand: 200 mg at 8, 20, 32, 44, 56, 68, 80 h, then 300 mg at 92, 104, 116, 128, 140, 152 h.
    expect(taken.map((mg) => mg / f)).toEqual([0, 0, 200, 200, 200, 400, 1000, 1400, 1700, 2300, 3200]);
    HOURS.forEach((_hour, i) => {
      const sum = gut[i]! + body[i]! + peripheral[i]! + eliminated[i]!;
      // Relative to all that is ever taken.
      expect(Math.abs(sum - taken[i]!) / taken.at(-1)!).toBeLessThan(1e-13);
    });
  });

  it("holds for every kind of built-in record", () => {
    for (const record of BUILT_IN_RECORDS) {
      const given = [
        { ...base.given[0]!, product: record.products[0]!.id, amount: { value: 100, unit: "mg" as const } },
      ];
      const { window: _, ...rest } = base;
      const analysis = derive({ ...rest, medicine: record, given, options: [] });
      const amounts = amountsOverTime(analysis, null, HOURS);
      if (analysis.typical === null) {
        expect(amounts).toBeNull();
        continue;
      }
      const { gut, body, peripheral, eliminated, taken } = amounts!;
      expect(taken.at(-1)).toBeGreaterThan(0);
      HOURS.forEach((_hour, i) => {
        const sum = gut[i]! + body[i]! + peripheral[i]! + eliminated[i]!;
        expect(Math.abs(sum - taken[i]!) / taken.at(-1)!).toBeLessThan(1e-11);
      });
    }
  });

  it("the body holds clearance's volume times the level", () => {
    const analysis = derive(base);
    const at = analysis.givenCurve!.timesH.length - 1;
    const { body } = amountsOverTime(analysis, null, [analysis.givenCurve!.timesH[at]!])!;
    const level = analysis.givenCurve!.values[at]!;
    expect(Math.abs(body[0]! / (level * analysis.typical!.volume.value) - 1)).toBeLessThan(1e-12);
  });

  it("without an option only the doses given count", () => {
    const { taken } = amountsOverTime(derive(base), null, [160])!;
    expect(taken[0]).toBe(amountsOverTime(derive(base), "A", [84])!.taken[0]);
  });

  it("without a prediction there is nothing to show", () => {
    const { age: _, ...patient } = base.patient;
    const analysis = derive({ ...base, patient: { ...patient, observations: [] } });
    expect(analysis.typical).toBeNull();
    expect(amountsOverTime(analysis, null, [10])).toBeNull();
  });
});
