import { readFileSync } from "node:fs";
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
    // Molar mass, clearance, volume, 4 variabilities; three products with content, ka, lag, F; two windows; toxic limit: 22.
    // From memory: ka, lag and F of the 12-hour tablet; strengths, ka and lag of the tablet; ka and lag of the solution.
    expect(unverifiedFigures(recordById("theophylline")!)).toEqual({
      memory: 8,
      commonPractice: 0,
      invented: 0,
      total: 22,
    });
  });

  it("counts by hand: lamotrigine", () => {
    // From memory: lag of the tablet; ka, lag and F of the dispersible tablet.
    expect(unverifiedFigures(recordById("lamotrigine")!)).toEqual({
      memory: 4,
      commonPractice: 0,
      invented: 0,
      total: 16,
    });
  });

  it("counts by hand: phenytoin", () => {
    // Molar mass, Vmax, Km, V, 4 variabilities, two windows, toxic limit: 11.
    // Products: content, ka, lag, F; a salt factor for the capsule: 13.
    // From memory: molar mass, variability of Vmax; lag and F of all three; strength of the chewable tablet.
    expect(unverifiedFigures(recordById("phenytoin")!)).toEqual({
      memory: 9,
      commonPractice: 0,
      invented: 0,
      total: 24,
    });
  });

  it("counts by hand: digoxin", () => {
    // Molar mass, CL, V1, Q, V2, 2 variabilities, four windows, toxic limit, earliest sample: 13. Two tablets with content, ka, lag, F: 8.
    // From memory: molar mass, both variabilities; lag and F of both; the low strength.
    expect(unverifiedFigures(recordById("digoxin")!)).toEqual({ memory: 8, commonPractice: 0, invented: 0, total: 21 });
  });

  it("docs/medicines.md states the counts of every record", () => {
    const page = readFileSync(new URL("../../../docs/medicines.md", import.meta.url), "utf8");
    for (const record of BUILT_IN_RECORDS) {
      const { memory, invented, total } = unverifiedFigures(record);
      const row = page.split("\n").find((line) => line.startsWith(`| \`${record.id}\` |`));
      const cells = row?.split("|").map((cell) => cell.trim());
      expect(cells?.slice(3, 5)).toEqual([String(total), record.invented ? `${invented} invented` : String(memory)]);
    }
  });

  it("lets the least known strength speak for all", () => {
    const record = structuredClone(recordById("theophylline")!);
    record.products[0]!.strengths[2]!.basis = "common practice";
    expect(unverifiedFigures(record).commonPractice).toBe(1);
  });
});
