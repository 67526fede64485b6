import { expect, it } from "vitest";
import { concentrationUnits, recordById } from "../../../src/core/medicine/index.ts";

it.each([
  ["theophylline", ["mg/L", "ug/mL", "umol/L"]],
  ["digoxin", ["ug/L", "ng/mL", "nmol/L"]],
  ["tacrolimus", ["ug/L", "ng/mL", "nmol/L"]],
])("%s may be typed in %j", (id, units) => {
  expect(concentrationUnits(recordById(id)!)).toEqual(units);
});

it("lithium is read in mmol/L first", () => {
  expect(concentrationUnits(recordById("lithium")!)[0]).toBe("mmol/L");
});

it("without a concentration window every unit is offered", () => {
  expect(concentrationUnits({ ...recordById("theophylline")!, windows: [] })).toHaveLength(7);
});
