import { expect, it } from "vitest";
import { bodySurfaceDuBois, bodySurfaceMosteller } from "../../src/core/patient/index.ts";
import { relativeError, workedExample } from "./workedExample.ts";

/*
 * Mosteller, N Engl J Med 1987;317:1098 (as in Arch Dis Child Educ Pract, Table 2); Du Bois & Du Bois, Arch Intern Med 1916;17:863-871
 * (coefficients from memory, unverified). Example R06: values computed outside this project from those formulas.
 */
const example = workedExample("R06");
const { cases_kg_cm: cases } = example.inputs as { cases_kg_cm: readonly (readonly [kg: number, cm: number])[] };
const mosteller = example.computed.Mosteller as readonly number[];
const duBois = example.computed.DuBois as readonly number[];

it.each(cases.map((each, i) => [...each, i] as const))(
  "R06: %d kg, %d cm (relative 2.3e-16)",
  (weightKg, heightCm, i) => {
    expect(relativeError(bodySurfaceMosteller({ weightKg, heightCm }), mosteller[i]!)).toBeLessThanOrEqual(2.3e-16);
    expect(relativeError(bodySurfaceDuBois({ weightKg, heightCm }), duBois[i]!)).toBeLessThanOrEqual(2.3e-16);
  },
);

it("has all four cases", () => {
  expect(cases).toHaveLength(4);
});
