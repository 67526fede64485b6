import { describe, expect, it } from "vitest";
import { ckdEpi2021, clearanceDeindexed } from "../../src/core/patient/index.ts";
import { relativeError, workedExample } from "./workedExample.ts";

/*
 * Inker et al., N Engl J Med 2021;385:1737-1749; formula as on the National Kidney Foundation's page. Example R02: values computed outside
 * this project from that formula; the first two are also printed, to one decimal, in the documentation of a general R utility function.
 */
const example = workedExample("R02") as ReturnType<typeof workedExample> & {
  readonly printedInSource: { readonly first: number; readonly second: number };
};
const { cases } = example.inputs as { cases: readonly (readonly [sex: "M" | "F", age: number, creatinine: number])[] };
const wanted = example.computed.eGFR as readonly number[];
const rate = (i: number) => {
  const [sex, ageYears, creatinineMgPerDl] = cases[i]!;
  return ckdEpi2021({ ageYears, creatinineMgPerDl, sex: sex === "F" ? "female" : "male" });
};

describe("CKD-EPI 2021, R02", () => {
  // Relative, as powers are rounded by the engine (measured 1.79e-16).
  it.each(cases.map((each, i) => [i, each] as const))("case %i", (i) => {
    expect(relativeError(rate(i), wanted[i]!)).toBeLessThanOrEqual(1.8e-16);
  });

  it("has all nine cases; the first two agree with the printed figures to their one decimal", () => {
    expect(cases).toHaveLength(9);
    expect(rate(0).toFixed(1)).toBe(String(example.printedInSource.first));
    expect(rate(1).toFixed(1)).toBe(String(example.printedInSource.second));
  });

  it("de-indexed for a body surface of 2.0 m2 (relative 2.3e-16)", () => {
    const found = clearanceDeindexed({ perSurface: rate(0), bodySurfaceM2: 2 });
    expect(relativeError(found, example.computed.deindexed_first_for_BSA_2p0 as number)).toBeLessThanOrEqual(2.3e-16);
  });
});
