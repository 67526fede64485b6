import { expect, test } from "vitest";
import { doseStepped, type Product, productOf } from "../../../src/core/medicine/index.ts";
import { VOLUME_STEP_ML, volumeSteps } from "../../../src/core/regimen/index.ts";
import { recordOf } from "./recordOf.ts";

const record = recordOf("theophylline");
const tablet: Product = productOf(record, "tablet-12h");
const solution: Product = productOf(record, "solution");
const mg = (value: number) => ({ value, unit: "mg" as const });
const mL = (value: number) => ({ value, unit: "mL" as const });

// Exact in all: amounts are counted in tablets or half millilitres. Tablets of 100, 200, 300 and 450 mg.
test.each([
  [mg(300), 0, mg(300)],
  [mg(300), 1, mg(400)],
  [mg(300), 2, mg(450)],
  [mg(300), -1, mg(200)],
  [mg(300), -9, mg(100)],
  [{ value: 0.3, unit: "g" as const }, 1, { value: 0.4, unit: "g" }],
] as const)("tablets: %j by %i steps is %j", (from, steps, to) => {
  expect(doseStepped(from, tablet, steps)).toEqual(to);
});

test.each([
  [mL(15), 1, mL(15.5)],
  [mL(15), -3, mL(13.5)],
  [mL(2.2), 1, mL(2.5)],
  [mL(2.2), -1, mL(2)],
  [mL(0.5), -1, mL(0.5)],
  [mL(0.3), -1, mL(0.3)],
  // 80 mg in 15 mL.
  [mg(80), 1, mL(15.5)],
] as const)("liquid: %j by %i steps is %j", (from, steps, to) => {
  expect(doseStepped(from, solution, steps)).toEqual(to);
});

test("refuses part of a step, and a volume that is none", () => {
  expect(() => doseStepped(mg(300), tablet, 0.5)).toThrow("steps: 0.5");
  expect(() => volumeSteps(-1)).toThrow("volumeMl: -1 mL");
  expect(VOLUME_STEP_ML).toBe(0.5);
});
