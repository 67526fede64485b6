import { expect, it } from "vitest";
import { leanWeightJanmahasatian } from "../../src/core/patient/index.ts";
import { relativeError, workedExample } from "./workedExample.ts";

/*
 * Janmahasatian et al., Clin Pharmacokinet 2005;44(10):1051-1065; coefficients as in Arch Dis Child Educ Pract, Table 2 of size descriptors.
 * Example R05: values computed outside this project from that formula.
 */
const example = workedExample("R05");
const { cases } = example.inputs as { cases: readonly (readonly [sex: "M" | "F", weight: number, height: number])[] };
const wanted = example.computed.LBW_kg as readonly number[];

it.each(cases.map((each, i) => [...each, wanted[i]!] as const))(
  "R05: %s, %d kg, %d cm (relative 2.9e-16)",
  (sex, weightKg, heightCm, kg) => {
    const found = leanWeightJanmahasatian({ weightKg, heightCm, sex: sex === "F" ? "female" : "male" });
    // Measured 2.8e-16 for the fourth: the body mass index is rounded once before it goes in.
    expect(relativeError(found, kg)).toBeLessThanOrEqual(2.9e-16);
    // A page on the web prints the fraction upside down.
    expect(found).toBeLessThan(weightKg);
  },
);

it("has all five cases", () => {
  expect(cases).toHaveLength(5);
});
