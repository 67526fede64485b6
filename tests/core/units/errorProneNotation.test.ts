import { describe, expect, it } from "vitest";
import { forbiddenForms, numberPrint, quantityPrint, unitSpoken } from "../../../src/core/units/index.ts";

/** The published rules for error-prone notation, numbered as in docs/methods/error-prone-notation.md. */
const print = (value: number, unit: Parameters<typeof quantityPrint>[0]["unit"]) =>
  quantityPrint({ value, unit }, { style: "print" }).replaceAll("\u00a0", " ");

describe("the formatter writes", () => {
  it.each([
    ["rule 1: no trailing zero after a whole dose", () => print(1.0, "mg"), "1 mg"],
    ["rule 2: nor after a decimal", () => print(0.5, "L"), "0.5 L"],
    ["rule 3: a leading zero", () => print(0.5, "g"), "0.5 g"],
    ["rule 4: commas from 1,000", () => numberPrint(100000), "100,000"],
    ["rule 5: the exception for laboratory precision is not used", () => print(1.0, "mmol/L"), "1 mmol per L"],
    ["rule 6: no decimal where a unit change avoids it", () => print(0.125, "mg"), "125 microgram"],
    ["rule 7: never the Greek letter, in full", () => print(97, "umol/L"), "97 micromol per L"],
    ["rule 7: mcg where the setting says so", () => unitSpoken("ug/L", "print", "mcg"), "mcg per L"],
    ["rule 11: mL", () => print(5, "mL"), "5 mL"],
    ["rule 12: a space before the unit", () => print(10, "mg"), "10 mg"],
    ["rule 13: no full stop after it", () => print(10, "mg").endsWith("."), false],
    ["rule 16: per, never a slash", () => print(12, "mg/L"), "12 mg per L"],
    ["rule 18: Arabic numerals", () => print(5, "mg"), "5 mg"],
  ])("%s", (_rule, write, wanted) => {
    expect(write()).toBe(wanted);
  });

  it("rule 20: number and unit stay on one line (non-breaking space)", () => {
    expect(quantityPrint({ value: 10, unit: "mg" }, { style: "print" })).toBe("10\u00a0mg");
  });
});

/** [rule, what must be found in it, how it is to be written, which must be clean]. */
const CASES: readonly (readonly [rule: number, forbidden: string, allowed: string])[] = [
  [1, "1.0 mg", "1 mg"],
  [1, "take 10.00 mg daily", "take 10 mg daily"],
  [2, "1.50 mg", "1.5 mg"],
  [2, "0.50 L", "0.5 L"],
  [3, ".5 g", "0.5 g"],
  [3, "about .25 L", "about 0.25 L"],
  [4, "100000 steps", "100,000 steps"],
  [4, "1000 mg", "1,000 mg"],
  [6, "0.125 mg", "125 microgram"],
  [6, "0.5 mg daily", "500 microgram daily"],
  [7, "5 \u00b5g", "5 microgram"],
  [7, "97 \u03bcmol per L", "97 micromol per L"],
  [7, "5 ug", "5 mcg"],
  [8, "300 mg QD", "300 mg daily"],
  [8, "300 mg q.d.", "300 mg daily"],
  [8, "300 mg OD", "300 mg daily"],
  [8, "300 mg q1d", "300 mg daily"],
  [8, "300 mg QOD", "300 mg every other day"],
  [8, "300 mg qhs", "300 mg nightly"],
  [8, "300 mg qn", "300 mg nightly"],
  [8, "300 mg HS", "300 mg at bedtime"],
  [8, "300 mg q12h", "300 mg every 12 hours"],
  [8, "300 mg BD", "300 mg twice daily"],
  [8, "300 mg bid", "300 mg twice daily"],
  [8, "300 mg t.i.d.", "300 mg three times daily"],
  [8, "300 mg TDS", "300 mg three times daily"],
  [8, "300 mg qid", "300 mg four times daily"],
  [9, "300 mg q6PM", "300 mg at 18:00 daily"],
  [10, "10 U", "10 units"],
  [10, "10 IU", "10 international units"],
  [11, "5 cc", "5 mL"],
  [12, "carbamazepine300 mg", "carbamazepine 300 mg"],
  [12, "10mg", "10 mg"],
  [13, "10 mg. Swallow whole", "10 mg, swallowed whole"],
  [13, "5 mL.", "5 mL"],
  [14, "CBZ 200 mg", "carbamazepine 200 mg"],
  [14, "MSO4", "morphine sulfate"],
  [15, "level > 10", "level greater than 10"],
  [15, "level < 10", "level less than 10"],
  [15, "age \u2265 65 years", "age 65 years or more"],
  [16, "250 mg/5 mL", "250 mg in 5 mL"],
  [16, "12 mg/L", "12 mg per L"],
  [16, "3 L/h", "3 L per h"],
  [17, "1/2 tablet", "half a tablet"],
  [17, "1/2 a tablet", "half a tablet"],
  [18, "V mg", "5 mg"],
  [18, "take II tablets", "take 2 tablets"],
  [19, "D/C on Friday", "discontinue on Friday"],
  [20, "theophylline 12-hour modif\u2026", "theophylline 12-hour modified-release tablet"],
];

describe("the search for forbidden forms", () => {
  it.each(CASES)("rule %d: finds it in %j and nothing in %j", (rule, forbidden, allowed) => {
    expect(forbiddenForms(forbidden).map((form) => form.rule)).toContain(rule);
    expect(forbiddenForms(allowed)).toEqual([]);
  });

  it("has a case for every rule that a printed string can break (5 allows, the others forbid)", () => {
    const rules = new Set(CASES.map(([rule]) => rule));
    expect([...rules].sort((a, b) => a - b)).toEqual([
      1, 2, 3, 4, 6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 16, 17, 18, 19, 20,
    ]);
  });

  it("says what it found", () => {
    expect(forbiddenForms("first 1.0 mg then .5 g")).toEqual([
      { rule: 1, found: "1.0" },
      { rule: 3, found: ".5" },
    ]);
  });

  it.each([
    "Version 1.0.0, medicine record 3, fingerprint 4f2a 9c31 77b0 1e55",
    "Wednesday 4 March 2026 at 20:00, last Monday 9 March at 08:00: 10 doses",
    "300\u00a0mg of 12-hour modified-release tablet every 12 hours, first dose Wednesday 4 March 2026 at 20:00",
    "AUC over 24 h 310 mg h per L; swing 0.8; accumulation 1.9",
    "creatinine clearance 41.1 mL per min; weight 58 kg; height 162 cm; 64 years",
    "Difference \u22121.2 mg per L",
    "half a tablet of 200 mg",
    "Page 1 of 2",
    "Harbour ward 3, bed 12",
    "The level is expected between 8.2 and 14 mg per L",
    "DOSE 125 microgram once daily",
    "0.05 mg per kg",
  ])("finds nothing in %j", (clean) => {
    expect(forbiddenForms(clean)).toEqual([]);
  });
});
