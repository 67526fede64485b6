import { describe, expect, it } from "vitest";
import { BUILT_IN_RECORDS, recordById, recordFigures, unverifiedFigures } from "../../../src/core/medicine/index.ts";

describe("recordFigures", () => {
  it("finds every figure with a source, statements aside, the strengths of a product as one", () => {
    for (const record of BUILT_IN_RECORDS) {
      const places = new Set<string>();
      const visit = (value: unknown, path: string[]): void => {
        if (typeof value !== "object" || value === null) return;
        if ("basis" in value && !("text" in value)) places.add(path.join(".").replace(/strengths\.\d+$/, "strengths"));
        for (const [key, each] of Object.entries(value)) visit(each, [...path, key]);
      };
      visit(record, []);
      expect(
        recordFigures(record)
          .map((each) => each.path.join("."))
          .sort(),
      ).toEqual([...places].sort());
    }
  });
});

describe("unverifiedFigures", () => {
  it("counts by hand: theophylline", () => {
    // Molar mass, clearance, volume, 4 variabilities, one range; three products with content, ka, lag, F; two windows, toxic limit,
    // highest daily dose, time to steady state: 25. Derived: the concentration. Common practice: adults from 18 years on.
    // From memory: ka, lag and F of the 12-hour tablet; strengths, ka and lag of the tablet; ka and lag of the solution; the dose.
    expect(unverifiedFigures(recordById("theophylline")!)).toEqual({
      seen: 14,
      derived: 1,
      memory: 9,
      commonPractice: 1,
      invented: 0,
      unverified: 10,
      total: 25,
    });
  });

  it("counts by hand: lamotrigine", () => {
    // From memory: lag of the tablet; ka, lag and F of the dispersible tablet; the highest daily dose. Derived: five interactions.
    expect(unverifiedFigures(recordById("lamotrigine")!)).toEqual({
      seen: 13,
      derived: 5,
      memory: 5,
      commonPractice: 1,
      invented: 0,
      unverified: 6,
      total: 24,
    });
  });

  it("counts by hand: phenytoin", () => {
    // Molar mass, Vmax, Km, V, 4 variabilities, number, one range, two windows, toxic limit, highest dose, time to steady state: 15.
    // Products: content, ka, lag, F; a salt factor for the capsule: 13.
    // From memory: molar mass, variability of Vmax; lag of two and F of all three; strength of the chewable tablet.
    // Derived: V, the range, salt factor and lag of the capsule, the concentration.
    expect(unverifiedFigures(recordById("phenytoin")!)).toEqual({
      seen: 15,
      derived: 5,
      memory: 8,
      commonPractice: 0,
      invented: 0,
      unverified: 8,
      total: 28,
    });
  });

  it("counts by hand: digoxin", () => {
    // Molar mass, CL, V1, Q, V2, 2 variabilities, number: 8. Two tablets with content, ka, lag, F: 8. Four windows and six hours of
    // drawing: 10. Toxic limit, highest dose, earliest sample, time to steady state, three interactions: 7.
    // From memory: molar mass, both variabilities; lag and F of both; the low strength; the highest dose. Derived: amiodarone's factor.
    expect(unverifiedFigures(recordById("digoxin")!)).toEqual({
      seen: 23,
      derived: 1,
      memory: 9,
      commonPractice: 0,
      invented: 0,
      unverified: 9,
      total: 33,
    });
  });

  it("the shares of all bases add up, for every record", () => {
    for (const record of BUILT_IN_RECORDS) {
      const { total, unverified, ...shares } = unverifiedFigures(record);
      expect(unverified).toBe(total - shares.seen - shares.derived);
      expect(Object.values(shares).reduce((sum, each) => sum + each, 0)).toBe(total);
    }
  });

  it("lets the least known strength speak for all", () => {
    const record = structuredClone(recordById("theophylline")!);
    record.products[0]!.strengths[2]!.basis = "common practice";
    expect(unverifiedFigures(record).commonPractice).toBe(2);
  });
});
