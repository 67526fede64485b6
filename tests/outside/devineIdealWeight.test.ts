import { expect, it } from "vitest";
import { idealWeightDevine } from "../../src/core/patient/index.ts";
import { workedExample } from "./workedExample.ts";

/*
 * Devine, Drug Intell Clin Pharm 1974;8:650-655 (from memory); formula as in D. W. A. Bourne, PHAR 7632/7633 course notes,
 * University of Oklahoma, ch. 27, after Murphy 2001. Example R03: values computed outside this project from the published formula.
 */
const example = workedExample("R03");
const { cases } = example.inputs as { cases: readonly (readonly ["M" | "F", number])[] };
const wanted = example.computed.IBW_kg as readonly number[];

it.each(cases.map(([sex, heightCm], i) => [sex, heightCm, wanted[i]!] as const))(
  "R03 %s %d cm: %d kg",
  (sex, heightCm, kg) => {
    const found = idealWeightDevine({ heightCm, sex: sex === "F" ? "female" : "male" });
    // Exactly: the same operations in the same order.
    expect(found.weightKg).toBe(kg);
    // 150 cm is the one case below 60 inches: the number is not clamped, and it is flagged.
    expect(found.belowFormulaRange).toBe(heightCm === 150);
  },
);

it("has all five cases", () => {
  expect(cases).toHaveLength(5);
});
