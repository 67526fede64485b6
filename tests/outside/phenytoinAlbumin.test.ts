import { expect, it } from "vitest";
import { phenytoinForAlbumin } from "../../src/core/patient/index.ts";
import { quantityConvert } from "../../src/core/units/index.ts";
import { relativeError, workedExample } from "./workedExample.ts";

/*
 * Sheiner & Tozer 1978 (citation from memory); formula as in a medical-algorithm reference text; the form for kidney failure from memory.
 * Example R08: values computed outside this project from those formulas. The variant with 0.25 for elderly nursing-home patients
 * that the example also has is not built.
 */
const example = workedExample("R08");
const { cases } = example.inputs as {
  cases: readonly { C: number; alb?: number; alb_gL?: number; ESRD?: boolean }[];
};
const wanted = example.computed.Cnorm as readonly number[];

it.each(cases.map((each, i) => [i, each, wanted[i]!] as const))("R08 case %i (relative 2.3e-16)", (_, each, mgPerL) => {
  const albuminGPerDl = each.alb ?? quantityConvert({ value: each.alb_gL!, unit: "g/L" }, "g/dL");
  const found = phenytoinForAlbumin({
    measuredMgPerL: each.C,
    albuminGPerDl,
    form: each.ESRD ? "kidney-failure" : "usual",
  });
  expect(relativeError(found, mgPerL)).toBeLessThanOrEqual(2.3e-16);
});

it("has all five cases, one in kidney failure and one in g/L", () => {
  expect(cases).toHaveLength(5);
  expect(cases.filter((each) => each.ESRD)).toHaveLength(1);
  expect(cases.filter((each) => each.alb_gL !== undefined)).toHaveLength(1);
});
