import { expect, it } from "vitest";
import { recordById } from "../../../src/core/medicine/index.ts";
import { exposureSpoken, shownUnits, unitFactor } from "../../../src/view/bench/shownUnit.ts";
import { caseFixture } from "../../core/analysis/caseFixture.ts";

const caseOf = (id: string) => caseFixture({ medicine: recordById(id)! });

it.each([
  ["theophylline", "mg/L", "umol/L"],
  ["digoxin", "ug/L", "nmol/L"],
  ["lithium", "mmol/L", "mg/L"],
] as const)("%s is shown in %s first, and in %s when asked", (id, first, other) => {
  expect(shownUnits(caseOf(id))).toEqual({ first, other });
});

it("the factor is the record's molar mass: 6.94 mg/L of lithium is 1 mmol/L (relative 2.3e-16)", () => {
  expect(Math.abs(unitFactor(caseOf("lithium"), "mmol/L") * 6.94 - 1)).toBeLessThanOrEqual(2.3e-16);
  expect(unitFactor(caseOf("digoxin"), "ug/L")).toBe(1000);
});

it("an exposure is spoken in the unit shown", () => {
  expect(exposureSpoken("mmol/L")).toBe("mmol·h/L");
});
