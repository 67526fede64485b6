import { describe, expect, it } from "vitest";
import { type ConcentrationUnit, concentrationSense, recordById } from "../../../src/core/medicine/index.ts";

const sense = (id: string, value: number, unit: ConcentrationUnit) => {
  const found = concentrationSense({ value, unit }, recordById(id)!);
  return found && [found.verdict, ...found.units];
};

describe("concentrationSense", () => {
  it.each([
    ["lithium", 0.8, "mmol/L"],
    ["lithium", 2.3, "mmol/L"],
    ["digoxin", 0.9, "ug/L"],
    ["digoxin", 1.1, "ug/L"],
    // Everyday both as nmol/L and as ug/L: taken as typed.
    ["digoxin", 1.1, "nmol/L"],
    ["theophylline", 12, "mg/L"],
    ["theophylline", 12, "ug/mL"],
    ["theophylline", 67, "umol/L"],
    // Low or toxic, but no other unit makes better sense.
    ["theophylline", 1.5, "mg/L"],
    ["phenytoin", 2, "mg/L"],
    ["phenytoin", 35, "mg/L"],
    ["valproate", 8, "mg/L"],
  ] as const)("%s %d %s is taken as typed", (id, value, unit) => {
    expect(sense(id, value, unit)).toEqual(["usual"]);
  });

  it.each([
    ["lithium", 0.8, "mg/L", ["mmol/L"]],
    // A level of poisoning too: one answer, and it is kept.
    ["lithium", 3, "mmol/L", ["mg/L"]],
    ["digoxin", 1.1, "mg/L", ["ug/L", "nmol/L"]],
    ["theophylline", 55, "mg/L", ["umol/L"]],
    ["theophylline", 10, "umol/L", ["mg/L"]],
    ["theophylline", 12, "ug/L", ["mg/L"]],
    ["phenytoin", 60, "mg/L", ["umol/L"]],
    ["phenytoin", 12, "umol/L", ["mg/L"]],
    ["carbamazepine", 35, "mg/L", ["umol/L"]],
    ["tacrolimus", 8, "mg/L", ["ug/L", "nmol/L"]],
    ["imatinib", 1.2, "ug/L", ["mg/L"]],
  ] as const)("%s %d %s is everyday only in %j", (id, value, unit, units) => {
    expect(sense(id, value, unit)).toEqual(["other-unit", ...units]);
  });

  it.each([
    ["theophylline", 900, "mg/L"],
    ["lithium", 40, "mmol/L"],
  ] as const)("%s %d %s is far, and no unit helps", (id, value, unit) => {
    expect(sense(id, value, unit)).toEqual(["far"]);
  });

  it("every window of every record is everyday in the unit it is stated in, at both its ends", () => {
    for (const id of ["lithium", "digoxin", "theophylline", "phenytoin", "tacrolimus", "valproate", "clozapine"]) {
      const record = recordById(id)!;
      for (const { low, high } of record.windows) {
        for (const end of [low, high]) {
          if (end.unit === "mg.h/L" || end.value === 0) continue;
          expect(concentrationSense({ value: end.value, unit: end.unit }, record)?.verdict).toBe("usual");
        }
      }
    }
  });

  it("without a window or a limit there is nothing to judge by", () => {
    const { toxicFrom: _, ...record } = recordById("theophylline")!;
    expect(concentrationSense({ value: 1, unit: "mmol/L" }, { ...record, windows: [] })).toBeNull();
  });

  it("a limit alone knows no low end", () => {
    const record = { ...recordById("theophylline")!, windows: [] };
    record.toxicFrom = { value: 20, unit: "mg/L", source: "s", basis: "invented" };
    expect(concentrationSense({ value: 0.001, unit: "mg/L" }, record)?.verdict).toBe("usual");
    expect(concentrationSense({ value: 50, unit: "mg/L" }, record)?.verdict).toBe("other-unit");
  });
});
