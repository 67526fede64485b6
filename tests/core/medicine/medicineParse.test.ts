import { describe, expect, it } from "vitest";
import { BUILT_IN_RECORDS, type MedicineRecord, medicineParse, recordById } from "../../../src/core/medicine/index.ts";
import { issueMessage } from "../../../src/core/messages/index.ts";
import { changed, issuesOf, put, take } from "./recordChange.ts";

describe("a figure without its source", () => {
  it("is refused with the figure named", () => {
    const json = changed("theophylline", take("products.0.absorptionRate.source"));
    const issues = issuesOf(json);
    expect(issues.map((each) => [each.code, each.path])).toEqual([
      ["record-figure-without-source", ["products", 0, "absorptionRate", "source"]],
    ]);
    expect(issueMessage(issues[0]!)).toBe(
      "The absorption rate of the 12-hour modified-release tablet in the record of theophylline has no source (products[0].absorptionRate): every figure needs one.",
    );
  });

  it.each([
    ["molarMass", "molar mass"],
    ["kinetics.clearance", "clearance"],
    ["kinetics.volume", "volume"],
    ["variability.clearance", "variability of the clearance"],
    ["variability.residualProportional", "residual variability (proportional)"],
    ["products.2.concentration", "concentration of the oral solution 80 mg in 15 mL"],
    ["products.1.strengths.1", "strength of the immediate-release tablet"],
    ["products.1.lag", "lag of the immediate-release tablet"],
    ["products.1.bioavailability", "bioavailability of the immediate-release tablet"],
    ["windows.1", "window"],
    ["toxicFrom", "toxic limit"],
    ["population", "population"],
    ["doseLimits.0", "dose limit"],
    ["sampling.2", "sampling statement"],
    ["cautions.3", "caution"],
  ])("%s: source, empty source and basis", (place, name) => {
    for (const [missing, change] of [
      ["source", take(`${place}.source`)],
      ["source", put(`${place}.source`, "")],
      ["basis", take(`${place}.basis`)],
    ] as const) {
      const issues = issuesOf(changed("theophylline", change));
      expect(issues.map((each) => each.code)).toEqual(["record-figure-without-source"]);
      expect(issueMessage(issues[0]!)).toContain(`The ${name} in the record of theophylline has no ${missing} (`);
    }
  });

  it("every figure and statement of every record is guarded", () => {
    let removed = 0;
    const visit = (value: unknown, path: (string | number)[], found: (string | number)[][]): void => {
      if (typeof value !== "object" || value === null) return;
      if ("source" in value && "basis" in value) found.push(path);
      for (const [key, each] of Object.entries(value))
        visit(each, [...path, Array.isArray(value) ? Number(key) : key], found);
    };
    for (const { id } of BUILT_IN_RECORDS) {
      const places: (string | number)[][] = [];
      visit(recordById(id), [], places);
      for (const place of places) {
        const json = changed(id, take(`${place.join(".")}.source`));
        expect(issuesOf(json).map((each) => each.code)).toEqual(["record-figure-without-source"]);
        removed += 1;
      }
    }
    expect(removed).toBeGreaterThan(100);
  }, 30_000);
});

describe("reading a record", () => {
  it.each([
    ["phenytoin", "kinetics.maximumRate", "highest rate of elimination"],
    ["phenytoin", "kinetics.halfMaximum", "concentration at half the highest rate"],
    ["phenytoin", "variability.maximumRate", "variability of the highest rate of elimination"],
    [
      "phenytoin",
      "products.0.saltFactor",
      "active part of the labelled amount of the extended-release capsule (sodium salt)",
    ],
    ["digoxin", "kinetics.exchange", "exchange between the compartments"],
    ["digoxin", "kinetics.peripheralVolume", "volume of the second compartment"],
    ["demoxiline", "products.3.input.fastFraction", "fraction absorbed fast of the two-phase capsule"],
    ["demoxiline", "products.3.input.slowDuration", "duration of the slow part of the two-phase capsule"],
  ])("%s %s without a source is named", (id, place, name) => {
    const issues = issuesOf(changed(id, take(`${place}.source`)));
    expect(issues.map((each) => each.code)).toEqual(["record-figure-without-source"]);
    expect(issueMessage(issues[0]!)).toContain(`The ${name} in the record of`);
  });

  it.each([null, undefined, 1, "text", [], [{}], {}])("%j is no record", (json) => {
    expect(medicineParse(json).ok).toBe(false);
  });

  it("returns the record as it was given", () => {
    const record: MedicineRecord | undefined = recordById("theophylline");
    expect(medicineParse(record)).toEqual({ ok: true, value: record });
  });
});
