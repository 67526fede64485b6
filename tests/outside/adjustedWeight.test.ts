import { expect, it } from "vitest";
import { adjustedWeight, idealWeightDevine } from "../../src/core/patient/index.ts";
import { workedExample } from "./workedExample.ts";

/*
 * Arch Dis Child Educ Pract, Table 2, "Some size descriptors used for determining doses in obese patients": ideal + factor · (total − ideal);
 * factor 0.4 common practice. Example R04: values computed outside this project from that formula on Devine's ideal weight.
 */
const example = workedExample("R04");
const { cases } = example.inputs as {
  cases: readonly { sex: "M" | "F"; height_cm: number; weight_kg: number }[];
};
const wanted = example.computed.AdjBW_kg as readonly number[];

it.each(cases.map((each, i) => [i, each, wanted[i]!] as const))(
  "R04 case %i",
  (_, { sex, height_cm, weight_kg }, kg) => {
    const idealKg = idealWeightDevine({ heightCm: height_cm, sex: sex === "F" ? "female" : "male" }).weightKg;
    // Exactly: the same operations in the same order.
    expect(adjustedWeight({ actualKg: weight_kg, idealKg })).toBe(kg);
  },
);

it("has both cases", () => {
  expect(cases).toHaveLength(2);
});
