import { readdirSync, readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { derive } from "../../../src/core/analysis/index.ts";
import { casePrint } from "../../../src/core/case/index.ts";
import { recordById } from "../../../src/core/medicine/index.ts";
import { demoCase } from "../../fixtures/demoCase.ts";

const folder = new URL("../../../demo-data/", import.meta.url);

describe("demo cases", () => {
  const names = ["adjustment", "kidney", "lithium", "modified-release", "saturable", "start"];

  it("are these six", () => {
    expect(readdirSync(folder).sort()).toEqual(names.map((name) => `${name}.ebbline.json`));
  });

  it.each(names)("%s is marked as a demo, printed by casePrint, and holds the record as it is now", (name) => {
    const value = demoCase(name);
    expect(value.demo).toBe(true);
    expect(readFileSync(new URL(`${name}.ebbline.json`, folder), "utf8")).toBe(casePrint(value));
    // After a change of the record: node .ci/schema.mjs
    expect(value.medicine).toEqual(recordById(value.medicine.id));
    expect(value.options.filter((each) => each.chosen)).toHaveLength(1);
  });

  it("the adjustment's levels lie near the typical prediction, above it", () => {
    const levels = derive(demoCase("adjustment")).levels;
    expect(levels).toHaveLength(2);
    for (const { measured, predicted } of levels) {
      const ratio = measured / (predicted as number);
      expect(ratio).toBeGreaterThan(1.1);
      expect(ratio).toBeLessThan(1.2);
    }
  });

  it("the adjustment's creatinine clearance is about 52 mL/min", () => {
    const clearance = derive(demoCase("adjustment")).patient.creatinineClearance;
    expect(Math.abs((clearance?.value ?? 0) - 52)).toBeLessThan(0.5);
  });

  it("the start has no level, no dose given and two options, the first chosen", () => {
    const value = demoCase("start");
    expect([value.levels, value.given]).toEqual([[], []]);
    expect(value.options.map((each) => each.chosen)).toEqual([true, false]);
  });
});

describe("the cases for the other kinds of kinetics", () => {
  const steady = (name: string) =>
    Object.fromEntries(derive(demoCase(name)).options.map(({ id, typical }) => [id, typical?.steadyState ?? null]));

  it.each(["modified-release", "saturable", "kidney"])("%s: its levels lie near the typical prediction", (name) => {
    const levels = derive(demoCase(name)).levels.filter((each) => each.excluded === null);
    expect(levels.length).toBeGreaterThan(0);
    for (const { measured, predicted } of levels) {
      expect(measured / (predicted as number)).toBeGreaterThan(0.8);
      expect(measured / (predicted as number)).toBeLessThan(1.25);
    }
  });

  it.each(["modified-release", "saturable", "kidney"])(
    "%s: the chosen option stays above the window's low end and below its high",
    (name) => {
      const value = demoCase(name);
      const chosen = value.options.find((each) => each.chosen)!;
      const lowest = steady(name)[chosen.id]!.lowest;
      expect(lowest).toBeGreaterThan(value.window!.low.value);
      expect(lowest).toBeLessThan(value.window!.high.value);
    },
  );

  it("modified release: the same amount a day gives the same average, and swings more once a day", () => {
    const { A, B } = steady("modified-release");
    expect(Math.abs(A!.average / B!.average - 1)).toBeLessThan(1e-12);
    expect(A!.fluctuation).toBeGreaterThan(2 * B!.fluctuation);
  });

  it("saturable: 13 % more a day gives far more than 13 % more level, and the last option has no steady state", () => {
    const { A, B, C } = steady("saturable");
    // mg of acid a day: 300 · 0.92 + 50 = 326; 400 · 0.92 = 368; 500 · 0.92 = 460, above a Vmax of 443.
    expect(368 / 326).toBeLessThan(1.13);
    expect(B!.average / A!.average).toBeGreaterThan(1.7);
    expect(C).toBeNull();
  });

  it("kidney: clearance falls with the second creatinine and then with the factor, step by step", () => {
    const clearances = derive(demoCase("kidney")).typical!.dispositions.map(({ disposition }) =>
      disposition.kind === "two-compartment" ? disposition.clearance : Number.NaN,
    );
    expect(clearances).toHaveLength(1 + 1 + 4);
    for (const [i, each] of clearances.slice(1).entries()) expect(each).toBeLessThan(clearances[i]!);
    // The whole effect of the factor: relative tolerance 1e-14, four powers of a quarter.
    expect(Math.abs(clearances[5]! / clearances[1]! / 0.784 - 1)).toBeLessThan(1e-14);
  });
});

describe("lithium once a day", () => {
  const value = demoCase("lithium");
  const [option] = derive(value, { isFitted: true }).options;

  it("is in mmol/L, with levels 12 hours after the dose", () => {
    expect(value.levels.map(({ quantity }) => quantity.unit)).toEqual(["mmol/L", "mmol/L"]);
    for (const { afterDoseH } of derive(value).levels) expect(Math.abs(afterDoseH! - 12)).toBeLessThanOrEqual(0.5);
  });

  it("the chosen option is held against the window 12 hours after the dose, not by its lowest, which lies below it", () => {
    // mmol/L by the molar mass of lithium, 6.94 g/mol.
    const { timed, lowest } = option!.individual!.steadyState!;
    expect(timed!.afterDoseH).toBe(12);
    expect(timed!.lowest.q50 / 6.94).toBeGreaterThan(value.window!.low.value);
    expect(timed!.lowest.q50 / 6.94).toBeLessThan(value.window!.high.value);
    expect(lowest.q50 / 6.94).toBeLessThan(value.window!.low.value);
    expect(option!.individual!.steadyChance!.within).toBeGreaterThan(0.5);
  });
});
