import { expect, it } from "vitest";
import { CREATININE_UMOL_PER_L_PER_MG_PER_DL } from "../../src/core/patient/index.ts";
import { quantityConvert } from "../../src/core/units/index.ts";
import { relativeError, workedExample } from "./workedExample.ts";

/*
 * Example R09. Theophylline 180.17 g/mol: product label. The other molar masses are from memory, unverified here
 * (phenytoin 252.27, digoxin 780.94, carbamazepine 236.27, valproic acid 144.21); the factors were computed outside this project.
 */
const { computed } = workedExample("R09");
/** One unit in the last place: the reference divided by the double nearest to 236.27, the conversion by 236.27 itself (measured 2.1e-16, and 2.2e-16 on the way back; 0 for the others). */
const TOLERANCE = Number.EPSILON;

it.each([
  ["phenytoin_umolL_per_mgL", 252.27, "mg/L", "umol/L"],
  ["theophylline_umolL_per_mgL", 180.17, "mg/L", "umol/L"],
  ["digoxin_nmolL_per_ugL", 780.94, "ug/L", "nmol/L"],
  ["carbamazepine_umolL_per_mgL", 236.27, "mg/L", "umol/L"],
  ["valproicAcid_umolL_per_mgL", 144.21, "mg/L", "umol/L"],
] as const)("%s with a molar mass of %d g/mol", (name, molarMass, from, to) => {
  const factor = computed[name] as number;
  expect(relativeError(quantityConvert({ value: 1, unit: from }, to, molarMass), factor)).toBeLessThanOrEqual(
    TOLERANCE,
  );
  expect(relativeError(quantityConvert({ value: factor, unit: to }, from, molarMass), 1)).toBeLessThanOrEqual(
    TOLERANCE,
  );
});

it("phenytoin 10 to 20 mg/L is 40 to 80 umol/L to the printed digit (RCPA manual)", () => {
  const molar = (value: number) => quantityConvert({ value, unit: "mg/L" }, "umol/L", 252.27);
  expect([Math.round(molar(10)), Math.round(molar(20) / 10) * 10]).toEqual([40, 80]);
});

it("creatinine: 88.4 umol/L in one mg/dL, which is what its molar mass of 113.12 g/mol (from memory) rounds to", () => {
  expect(computed.creatinine_umolL_per_mgdL).toBe(CREATININE_UMOL_PER_L_PER_MG_PER_DL);
  expect(quantityConvert({ value: 1, unit: "mg/dL" }, "umol/L", 113.12).toFixed(1)).toBe("88.4");
});
