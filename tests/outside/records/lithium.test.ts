import { describe, expect, it } from "vitest";
import { quantityConvert } from "../../../src/core/units/index.ts";
import {
  expectRoundsTo,
  expectWithin,
  recordAverage,
  recordFactor,
  recordHalfLife,
  recordNamed,
  recordPeakTime,
  recordValue,
  recordWindow,
} from "./recordFigure.ts";

/*
 * Jermain DM and others, Population pharmacokinetics of lithium, Clin Pharm 1991;10:376–381, abstract: without covariates CL 1.36 L/h, V 32.8 L;
 * final model 24 % between patients, residual 16 %. Lithium carbonate Li2CO3: 2·6.94 / 73.89 of its mass is lithium.
 */
const record = recordNamed("lithium");
const healthy = { creatinineClearance: 100 };

describe("lithium, clearance", () => {
  it.each([
    [100, 1.36],
    [140, 1.36],
    [60, 0.25 * 60 * 0.06],
    [30, 0.45],
  ])(
    "at a creatinine clearance of %d mL/min it is %d L/h: a quarter of it, at most the published 1.36",
    (creatinineClearance, wanted) => {
      expectWithin(recordValue(record, "clearance", { creatinineClearance }), wanted, 1e-12);
    },
  );

  /* Jin Z and others, Front Pharmacol 2022;13:913935, abstract: CL/F 0.909 L/h at 62 kg, 116 mL/min, 600 mg a day. The record's note says so. */
  it("another study's 0.909 L/h at 116 mL/min would give half as high levels again", () => {
    expectWithin(recordValue(record, "clearance", { creatinineClearance: 116 }) / 0.909, 1.5, 0.005);
  });
});

it("lithium: variability and error are the printed ones of the final model", () => {
  const { clearance, residualProportional } = record.variability;
  expect([clearance?.value, residualProportional?.value]).toEqual([24, 16]);
});

describe("lithium, the typical patient", () => {
  it.each([
    ["capsule", 300, 8],
    ["tablet", 300, 8],
    ["tablet-er", 450, 12],
  ])("900 mg of carbonate a day as %s of %d mg every %d h averages 0.746 mmol/L within 2 %%", (product, mg, everyH) => {
    const course = { product, dose: { value: mg, unit: "mg" }, everyH } as const;
    expectWithin(recordAverage(record, healthy, course, "mmol/L"), 0.746, 0.02);
  });

  /* Label highlights, lithium solution (DailyMed 16ebe1f9): 8 mEq in 5 mL, for 300 mg of carbonate; 1 mEq of lithium is 1 mmol. */
  it("5 mL of the solution every 8 h are 24 mmol a day: 24 / (1.36 · 24) mmol/L, relative 1e-4", () => {
    const course = { product: "solution", dose: { value: 5, unit: "mL" }, everyH: 8 } as const;
    expectWithin(recordAverage(record, healthy, course, "mmol/L"), 1 / 1.36, 1e-4);
  });

  it("a single dose of the modified-release tablet peaks at 5 h, as its note says, within 0.05 h", () => {
    expectRoundsTo(recordPeakTime(record, healthy, "tablet-er"), 5, 0.1);
  });

  /* MDI laboratory, lithium test page: half-life 14–33 h. (Royal Liverpool laboratory, 2012: 18–36 h; the record's note says that it lies below.) */
  it("half-life lies inside the printed 14 to 33 h, and longer with a creatinine clearance of 60 mL/min", () => {
    const hours = recordHalfLife(record, healthy);
    expectWithin(hours, (Math.LN2 * 32.8) / 1.36, 1e-12);
    expect(hours).toBeGreaterThan(14);
    expect(hours).toBeLessThan(33);
    expect(recordHalfLife(record, { creatinineClearance: 60 })).toBeGreaterThan(hours);
  });

  it("with one dose a day the lowest is about 40 % below the level at 12 h, as the windows' notes say", () => {
    expectRoundsTo(1 - 0.5 ** (12 / recordHalfLife(record, healthy)), 0.4, 0.05);
    for (const { note } of record.windows) expect(note).toContain("about 40 % below the level at 12 hours");
  });

  it("volume is the printed 32.8 L", () => {
    expect(recordValue(record, "volume", healthy)).toBe(32.8);
  });
});

describe("lithium, mass and mole", () => {
  it.each(["capsule", "tablet", "tablet-er"])(
    "%s: the salt factor is 2·6.94 / 73.89 within 0.01 %%; 300 mg hold 8.12 mmol",
    (id) => {
      const factor = record.products.find((each) => each.id === id)?.saltFactor?.value ?? Number.NaN;
      expectWithin(factor, (2 * 6.94) / 73.89, 1e-4);
      const mmol = quantityConvert({ value: 300 * factor, unit: "mg" }, "mmol", record.molarMass.value);
      expectWithin(mmol, 8.12, 0.0005);
    },
  );

  it("1 mmol/L is 6.94 mg/L", () => {
    expectWithin(recordFactor(record, "mmol/L", "mg/L"), 6.94, 1e-12);
  });

  /* DailyMed 16ebe1f9 (0.8–1.2, 0.8–1), Severn Pathology (0.6–0.8, 0.8–1 at 12–14 h), Medscape table 1 (0.4–0.8): mmol/L as printed. */
  it.each([
    ["0.8-1.2", 0.8, 1.2, 11.5, 12.5],
    ["0.8-1-label", 0.8, 1, 11.5, 12.5],
    ["0.6-0.8", 0.6, 0.8, 12, 14],
    ["0.8-1", 0.8, 1, 12, 14],
    ["0.4-0.8", 0.4, 0.8, 11.5, 12.5],
  ])("window %s is kept in mmol/L, survives mg/L within 1e-12, and says when to draw", (id, low, high, from, to) => {
    expect(recordWindow(record, id, "mmol/L")).toEqual([low, high]);
    recordWindow(record, id, "mg/L").forEach((mgPerL, i) => {
      expectWithin(mgPerL, [low, high][i]! * 6.94, 1e-12);
    });
    const window = record.windows.find((each) => each.id === id);
    expect([window?.drawFrom?.value, window?.drawTo?.value]).toEqual([from, to]);
  });

  it("is shown in mmol/L", () => {
    expect(record.displayUnit).toBe("mmol/L");
  });
});
