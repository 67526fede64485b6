import { expect, it } from "vitest";
import { cockcroftGault, creatinineMgPerDl } from "../../src/core/patient/index.ts";
import { workedExample } from "./workedExample.ts";

/*
 * Cockcroft & Gault, Nephron 1976;16:31-41; formula as in Taber's dictionary entry and in D. W. A. Bourne, PHAR 7632/7633 course notes,
 * University of Oklahoma, ch. 27. Example R01: values computed outside this project from the published formula.
 */
const example = workedExample("R01");
const { cases } = example.inputs as {
  cases: readonly { sex: "M" | "F"; age: number; W: number; SCr?: number; SCr_umol?: number; divisor?: number }[];
};
const wanted = example.computed.CrCl_mL_min as readonly number[];

it.each(cases.map((each, i) => [i, each, wanted[i]!] as const))(
  "R01 case %i",
  (_, { sex, age, W, SCr, SCr_umol }, mlPerMin) => {
    const creatinine = SCr ?? creatinineMgPerDl({ value: SCr_umol!, unit: "umol/L" });
    const found = cockcroftGault({
      ageYears: age,
      weightKg: W,
      creatinineMgPerDl: creatinine,
      sex: sex === "F" ? "female" : "male",
    });
    // Exactly: the same operations in the same order.
    expect(found).toBe(mlPerMin);
  },
);

it("has all four cases, one of them in umol/L", () => {
  expect(cases).toHaveLength(4);
  expect(cases.filter((each) => each.SCr_umol !== undefined && each.divisor === 88.4)).toHaveLength(1);
});
