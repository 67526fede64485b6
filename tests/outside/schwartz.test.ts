import { expect, it } from "vitest";
import { bedsideSchwartz, creatinineMgPerDl } from "../../src/core/patient/index.ts";
import { relativeError, workedExample } from "./workedExample.ts";

/*
 * Schwartz et al., J Am Soc Nephrol 2009;20:629-637; formula as on the National Kidney Foundation's page ("0.413 x (height/Scr)").
 * Example R07: values computed outside this project from that formula.
 */
const example = workedExample("R07");
const { cases } = example.inputs as { cases: readonly (readonly [heightCm: number, creatinine: number])[] };
const wanted = example.computed.eGFR as readonly number[];

it.each(cases.map(([heightCm, creatinine], i) => [heightCm, creatinine, wanted[i]!] as const))(
  "R07: %d cm, %d mg/dL (exactly: the same operations in the same order)",
  (heightCm, creatinine, rate) => {
    expect(bedsideSchwartz({ ageYears: 6, heightCm, creatinineMgPerDl: creatinine })).toBe(rate);
  },
);

it("has all three cases, and the coefficient for umol/L (relative 2.3e-16)", () => {
  expect(cases).toHaveLength(3);
  const perUmol = bedsideSchwartz({
    ageYears: 6,
    heightCm: 100,
    creatinineMgPerDl: creatinineMgPerDl({ value: 100, unit: "umol/L" }),
  });
  expect(relativeError(perUmol, example.computed.coefficient_for_umolL as number)).toBeLessThanOrEqual(2.3e-16);
});
