import { describe, expect, it } from "vitest";
import { quantityConvert } from "../../../src/core/units/index.ts";
import { expectEndsWithin, expectInside, expectRoundsTo, expectWithin } from "./expectFigure.ts";
import { recordTypical } from "./recordTypical.ts";

/*
 * Jermain DM and others, Population pharmacokinetics of lithium, Clin Pharm 1991;10:376–381, abstract: without covariates CL 1.36 L/h, V 32.8 L;
 * final model 24 % between patients, residual 16 %. Lithium carbonate Li2CO3: 2·6.94 / 73.89 of its mass is lithium.
 */
const lithium = recordTypical("lithium", { creatinineClearance: 100 });

describe("lithium, clearance", () => {
  it.each([
    [100, 1.36],
    [140, 1.36],
    [60, 0.25 * 60 * 0.06],
    [30, 0.45],
  ])(
    "at a creatinine clearance of %d mL/min it is %d L/h: a quarter of it, at most the published 1.36",
    (creatinineClearance, wanted) => {
      expectWithin(lithium.value("clearance", { creatinineClearance }), wanted, 1e-12);
    },
  );

  /* Jin Z and others, Front Pharmacol 2022;13:913935, abstract: CL/F 0.909 L/h at 62 kg, 116 mL/min, 600 mg a day. The record's note says so. */
  it("another study's 0.909 L/h at 116 mL/min would give half as high levels again", () => {
    expectWithin(lithium.value("clearance", { creatinineClearance: 116 }) / 0.909, 1.5, 0.005);
  });
});

it("lithium: variability and error are the printed ones of the final model", () => {
  const { clearance, residualProportional } = lithium.record.variability;
  expect([clearance?.value, residualProportional?.value]).toEqual([24, 16]);
});

describe("lithium, the typical patient", () => {
  it.each([
    ["capsule", 300, 8],
    ["tablet", 300, 8],
    ["tablet-er", 450, 12],
  ])("900 mg of carbonate a day as %s of %d mg every %d h averages 0.746 mmol/L within 2 %%", (product, mg, everyH) => {
    expectWithin(lithium.average({ product, dose: { value: mg, unit: "mg" }, everyH }, "mmol/L"), 0.746, 0.02);
  });

  /* Label highlights, lithium solution (DailyMed 16ebe1f9): 8 mEq in 5 mL, for 300 mg of carbonate; 1 mEq of lithium is 1 mmol. */
  it("5 mL of the solution every 8 h are 24 mmol a day: 24 / (1.36 · 24) mmol/L, relative 1e-4", () => {
    expectWithin(
      lithium.average({ product: "solution", dose: { value: 5, unit: "mL" }, everyH: 8 }, "mmol/L"),
      1 / 1.36,
      1e-4,
    );
  });

  it("a single dose of the modified-release tablet peaks at 5 h, as its note says, within 0.05 h", () => {
    expectRoundsTo(lithium.peakTime("tablet-er"), 5, 0.1);
  });

  /* MDI laboratory, lithium test page: half-life 14–33 h. (Royal Liverpool laboratory, 2012: 18–36 h; the record's note says that it lies below.) */
  it("half-life lies inside the printed 14 to 33 h, and longer with a creatinine clearance of 60 mL/min", () => {
    const hours = lithium.halfLife();
    expectWithin(hours, (Math.LN2 * 32.8) / 1.36, 1e-12);
    expectInside(hours, 14, 33);
    expect(lithium.halfLife({ creatinineClearance: 60 })).toBeGreaterThan(hours);
  });

  it("with one dose a day the lowest is about 40 % below the level at 12 h, as the windows' notes say", () => {
    expectRoundsTo(1 - 0.5 ** (12 / lithium.halfLife()), 0.4, 0.05);
    for (const { note } of lithium.record.windows) expect(note).toContain("about 40 % below the level at 12 hours");
  });

  it("volume is the printed 32.8 L", () => {
    expect(lithium.value("volume")).toBe(32.8);
  });
});

describe("lithium, mass and mole", () => {
  it.each(["capsule", "tablet", "tablet-er"])(
    "%s: the salt factor is 2·6.94 / 73.89 within 0.01 %%; 300 mg hold 8.12 mmol",
    (id) => {
      const factor = lithium.record.products.find((each) => each.id === id)?.saltFactor?.value ?? Number.NaN;
      expectWithin(factor, (2 * 6.94) / 73.89, 1e-4);
      const mmol = quantityConvert({ value: 300 * factor, unit: "mg" }, "mmol", lithium.record.molarMass.value);
      expectWithin(mmol, 8.12, 0.0005);
    },
  );

  it("1 mmol/L is 6.94 mg/L", () => {
    expectWithin(lithium.factor("mmol/L", "mg/L"), 6.94, 1e-12);
  });

  /* DailyMed 16ebe1f9 (0.8–1.2, 0.8–1), Severn Pathology (0.6–0.8, 0.8–1 at 12–14 h), Medscape table 1 (0.4–0.8): mmol/L as printed. */
  it.each([
    ["0.8-1.2", 0.8, 1.2, 11.5, 12.5],
    ["0.8-1-label", 0.8, 1, 11.5, 12.5],
    ["0.6-0.8", 0.6, 0.8, 12, 14],
    ["0.8-1", 0.8, 1, 12, 14],
    ["0.4-0.8", 0.4, 0.8, 11.5, 12.5],
  ])("window %s is kept in mmol/L, survives mg/L within 1e-12, and says when to draw", (id, low, high, from, to) => {
    expect(lithium.window(id, "mmol/L")).toEqual([low, high]);
    expectEndsWithin(lithium.window(id, "mg/L"), [low * 6.94, high * 6.94], 1e-12);
    const window = lithium.record.windows.find((each) => each.id === id);
    expect([window?.drawFrom?.value, window?.drawTo?.value]).toEqual([from, to]);
  });

  it("is shown in mmol/L", () => {
    expect(lithium.record.displayUnit).toBe("mmol/L");
  });
});
