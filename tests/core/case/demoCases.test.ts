import { readdirSync, readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { derive } from "../../../src/core/analysis/index.ts";
import { type Case, caseParse, casePrint } from "../../../src/core/case/index.ts";
import { recordById } from "../../../src/core/medicine/index.ts";

const folder = new URL("../../../demo-data/", import.meta.url);

function demo(name: string): Case {
  const parsed = caseParse(readFileSync(new URL(`${name}.ebbline.json`, folder), "utf8"));
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.issues));
  return parsed.value;
}

describe("demo cases", () => {
  const names = ["adjustment", "kidney", "modified-release", "saturable", "start"];

  it("are these five", () => {
    expect(readdirSync(folder).sort()).toEqual(names.map((name) => `${name}.ebbline.json`));
  });

  it.each(names)(
    "%s is marked as a demo, printed by casePrint, and holds the record as it is now",
    (name) => {
      const value = demo(name);
      expect(value.demo).toBe(true);
      expect(readFileSync(new URL(`${name}.ebbline.json`, folder), "utf8")).toBe(casePrint(value));
      // After a change of the record: node .ci/schema.mjs
      expect(value.medicine).toEqual(recordById(value.medicine.id));
      expect(value.options.filter((each) => each.chosen)).toHaveLength(1);
    },
  );

  it("the adjustment's levels lie near the typical prediction, above it", () => {
    const levels = derive(demo("adjustment")).levels;
    expect(levels).toHaveLength(2);
    for (const { measured, predicted } of levels) {
      const ratio = measured / (predicted as number);
      expect(ratio).toBeGreaterThan(1.1);
      expect(ratio).toBeLessThan(1.2);
    }
  });

  it("the adjustment's creatinine clearance is about 52 mL/min", () => {
    const clearance = derive(demo("adjustment")).patient.creatinineClearance;
    expect(Math.abs((clearance?.value ?? 0) - 52)).toBeLessThan(0.5);
  });

  it("the start has no level, no dose given and two options, the first chosen", () => {
    const value = demo("start");
    expect([value.levels, value.given]).toEqual([[], []]);
    expect(value.options.map((each) => each.chosen)).toEqual([true, false]);
  });
});
