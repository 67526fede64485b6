import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  type Covariates,
  type Formula,
  formulaEvaluate,
  formulaFaults,
  formulaTrace,
} from "../../../src/core/medicine/index.ts";
import { issueMessage } from "../../../src/core/messages/index.ts";
import { woman } from "./woman.ts";

type Unit = Formula["unit"];

function value(formula: string, unit: Unit, covariates: Covariates = woman): number {
  const result = formulaEvaluate({ formula, unit }, covariates);
  if (!result.ok) throw new Error(JSON.stringify(result.issues));
  return result.value.value;
}

/** Of a plain number, which has to be given a unit to be a result. */
const plain = (formula: string, covariates: Covariates = woman) => value(`(${formula}) * 1 L`, "L", covariates);

describe("formulaEvaluate", () => {
  it.each<[string, Unit, number]>([
    ["2.28 L/h", "L/h", 2.28],
    ["0.053 L/h/kg * min(weight, idealWeight)", "L/h", 0.053 * 54.2],
    ["0.053 L/h/kg * max(weight, idealWeight)", "L/h", 0.053 * 58],
    ["0.6 L/h + 0.03 L/h * creatinineClearance / (1 mL/min)", "L/h", 0.6 + 0.03 * 52],
    ["1.36 L/h * (weight / (70 kg)) ^ 0.75", "L/h", 1.36 * (58 / 70) ** 0.75],
    ["3 L - 0.5 L * isFemale", "L", 2.5],
    ["5 mg/L * albumin / (36 g/L)", "mg/L", 5],
    ["2.24 L/h/m2 * bodySurface", "L/h", 2.24 * 1.6],
    ["0.5 L/kg * leanWeight", "L", 0.5 * 41.3],
    // Of the age of 64 years the condition does not hold.
    ["(0.0134 L/h/kg * weight + 3.58 L/h) * (age >= 70 a ? 0.749 : 1)", "L/h", 0.0134 * 58 + 3.58],
    ["isFemale == 1 ? 2 L : 3 L", "L", 2],
    ["age < 65 a ? 1 L : age < 75 a ? 2 L : 3 L", "L", 1],
  ])("%s (%s)", (formula, unit, expected) => {
    // Relative tolerance 0: the same operations in the same order give the same bits.
    expect(value(formula, unit)).toBe(expected);
  });

  it.each([
    ["exp(-3.78 + ln(weight / (1 kg)))", Math.exp(-3.78 + Math.log(58))],
    ["sqrt((height / (1 cm)) * (weight / (1 kg)) / 3600)", Math.sqrt((162 * 58) / 3600)],
    // The usual reading: powers first and from the right, minus after them, the rest from the left.
    ["2 ^ 3 ^ 2", 512],
    ["20 - 2 ^ 2", 16],
    ["-2 ^ 2 + 5", 1],
    ["8 / 4 / 2", 1],
    ["8 - 4 - 2", 2],
    ["+1e-3 * 2e3", 2],
    ["min(3, 2, 1) + max(1, 2, 3)", 4],
    ["2 ^ -1", 0.5],
    ["2 ^ (age / (64 a))", 2],
  ])("%s", (formula, expected) => {
    expect(plain(formula)).toBe(expected);
  });

  it("at 70 years and 70 kg, carbamazepine's clearance is 4.518 · 0.749 L/h", () => {
    const formula = "(0.0134 L/h/kg * weight + 3.58 L/h) * (age >= 70 a ? 0.749 : 1)";
    const at = (age: number) => value(formula, "L/h", { weight: 70, age });
    // Relative tolerance 1e-15: a rounding or two.
    expect(Math.abs(at(69.9) / 4.518 - 1)).toBeLessThan(1e-15);
    expect(Math.abs(at(70) / 3.383982 - 1)).toBeLessThan(1e-15);
  });

  it("tells which numbers went in, each once and with its unit", () => {
    const formula = "weight * isFemale * 1 L/kg + min(weight, idealWeight) * 1 L/kg";
    const result = formulaEvaluate({ formula, unit: "L" }, woman);
    expect(result.ok && result.value.inputs).toEqual([
      { name: "weight", value: 58, unit: "kg" },
      { name: "isFemale", value: 1, unit: "1" },
      { name: "idealWeight", value: 54.2, unit: "kg" },
    ]);
  });

  it("names every covariate that is missing, also one of a branch that would not hold", () => {
    const formula = "age > 70 a ? 1 L/kg * leanWeight : 1 L/kg * weight * albumin / (1 g/L)";
    const result = formulaEvaluate({ formula, unit: "L" }, { age: 30, weight: undefined });
    expect(result.ok ? [] : result.issues.map(({ code, data }) => [code, data.name])).toEqual([
      ["formula-needs", "leanWeight"],
      ["formula-needs", "weight"],
      ["formula-needs", "albumin"],
    ]);
    expect(result.ok ? "" : issueMessage(result.issues[1]!)).toBe(
      "The prediction needs a weight, which is not known for this patient.",
    );
  });

  it("works out only the branch that holds", () => {
    expect(plain("age > 70 a ? ln(-1) : 2")).toBe(2);
    expect(formulaEvaluate({ formula: "age < 70 a ? ln(-1) * 1 L : 2 L", unit: "L" }, woman).ok).toBe(false);
  });

  it.each(["weight - 58 kg", "1 kg - weight", "1 kg / (weight / (58 kg) - 1)", "1 kg * ln(0 * weight / (1 kg))"])(
    "%s gives no usable value",
    (formula) => {
      const result = formulaEvaluate({ formula: `(${formula}) * 1 L/kg`, unit: "L" }, woman);
      expect(result.ok ? [] : result.issues.map((each) => each.code)).toEqual(["formula-result"]);
    },
  );

  it("refuses covariates out of their range", () => {
    const codes = (covariates: Record<string, number>) => {
      const formula = "1 L + age * 1 L/a + weight * 1 L/kg + isFemale * 1 L";
      const result = formulaEvaluate({ formula, unit: "L" }, { weight: 1, age: 1, isFemale: 0, ...covariates });
      return result.ok ? [] : result.issues.map((each) => [each.code, each.data.name]);
    };
    expect(codes({ age: 0 })).toEqual([]);
    expect(codes({ age: -1 })).toEqual([["formula-covariate", "age"]]);
    expect(codes({ weight: 0 })).toEqual([["formula-covariate", "weight"]]);
    expect(codes({ isFemale: 0.5 })).toEqual([["formula-covariate", "isFemale"]]);
    expect(() => codes({ weight: Number.NaN })).toThrow(RangeError);
  });
});

describe("units", () => {
  it.each<[string, Unit, number]>([
    // Each by decimal arithmetic; tolerance 0.
    ["100 mL/min", "L/h", 6],
    ["3.58 L/h + 50 mL/min", "L/h", 6.58],
    ["415 mg/d", "mg/h", 415 / 24],
    ["1 g/L", "mg/L", 1000],
    ["1 mg/kg * weight / (58 L)", "mg/L", 1],
    ["1000 cm^3", "L", 1],
    ["1 m^3", "L", 1000],
    ["0.5 g·L/kg/L * weight / (1 d)", "mg/h", 29_000 / 24],
    ["age < 769 mo ? 1 L : 2 L", "L", 1],
    ["age < 768 mo ? 1 L : 2 L", "L", 2],
    ["age == 64 a ? 1 L : 2 L", "L", 1],
    ["age == 768 mo ? 1 L : 2 L", "L", 1],
    ["min(weight, 57999 g) * 1 L/kg", "L", 57.999],
    ["height == 1.62 m ? 1 L : 2 L", "L", 1],
    ["creatinineClearance > 3.1 L/h ? 1 L : 2 L", "L", 1],
    ["creatinineClearance == 3.12 L/h ? 1 L : 2 L", "L", 1],
    ["70 kg / (70000 g) * 1 L", "L", 1],
    ["(70000 g) ^ 0.75 / (70 kg) ^ 0.75 * 1 L", "L", 1],
    ["sqrt((3 m) ^ 2) * 1 m2", "L", 3000],
  ])("%s is %s: %d", (formula, unit, expected) => {
    expect(value(formula, unit)).toBe(expected);
  });

  it("a sum is done in the unit of its first part", () => {
    // Relative tolerance 5e-16: the second part is turned into mL/min, the sum into L/h.
    expect(Math.abs(value("50 mL/min + 3.58 L/h", "L/h") / 6.58 - 1)).toBeLessThan(5e-16);
  });

  it("a number and its unit bind closest, and a unit goes no further than its words", () => {
    expect(value("12 L / 3 L/h * 1 L/h", "L")).toBe(4);
    expect(value("70 kg / weight * 58 L", "L")).toBe(70);
    expect(value("5 mL/min / min(weight, 5 kg) * 60 kg", "L/h")).toBe(3.6);
    expect(value("3 L/h / (1 h) * 1 h", "L/h")).toBe(3);
  });

  it("a change of unit is one rounding away from exact, whatever the number", () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 999_999 }), fc.integer({ min: -6, max: 3 }), (digits, power) => {
        const written = `${digits}e${power}`;
        // In whole numbers: mL/min to L/h is times 60 over 1000.
        const exact = Number(`${digits * 60}e${power - 3}`);
        expect(value(`${written} mL/min`, "L/h")).toBe(exact);
      }),
      { seed: 20_260_304, numRuns: 300 },
    );
  });
});

describe("faults of units name the place and both dimensions", () => {
  const fault = (formula: string, unit: Unit = "L/h") => {
    const faults = formulaFaults({ formula, unit });
    expect(faults).toHaveLength(1);
    const { code, data } = faults[0]!;
    expect(issueMessage(faults[0]!)).toMatch(/^[A-Z"].*\.$/);
    expect(issueMessage(faults[0]!)).not.toMatch(/undefined|\[object|NaN/);
    return [code, formula.slice(Number(data.start), Number(data.end)), data.found, data.wanted];
  };

  it.each<[string, string, string, string]>([
    ["0.0134 L/h/kg", "0.0134 L/h/kg", "L/h/kg", "L/h"],
    ["0.0134 L/h * weight", "0.0134 L/h * weight", "mg\u00b7L/h", "L/h"],
    ["weight", "weight", "mass", "L/h"],
    ["3", "3", "a plain number", "L/h"],
    ["1 L/h + (weight + height) * 1 L/h/kg", "weight + height", "length", "mass"],
    ["1 L/h * (weight + 3)", "weight + 3", "a plain number", "mass"],
    ["age > weight ? 1 L/h : 2 L/h", "age > weight", "mass", "time"],
    ["age > 70 ? 1 L/h : 2 L/h", "age > 70", "a plain number", "time"],
    ["age > 70 a ? 1 L/h : 2 L", "1 L/h : 2 L", "L", "L/h"],
    ["age > 70 a ? 1 L/h : 2", "1 L/h : 2", "a plain number", "L/h"],
    ["min(weight, age) * 1 L/h/kg", "weight, age", "time", "mass"],
    ["exp(weight) * 1 L/h", "weight", "mass", "a plain number"],
    ["ln(3 L/h) * 1 L/h", "3 L/h", "L/h", "a plain number"],
    ["1 L/h * 2 ^ age", "age", "time", "a plain number"],
    ["1 mmol/L * 1 L/h", "1 mmol/L * 1 L/h", "mmol/h", "L/h"],
  ])("%s", (formula, place, found, wanted) => {
    expect(fault(formula)).toEqual(["formula-dimension", place, found, wanted]);
  });

  it("says it in words", () => {
    const [found] = formulaFaults({ formula: "0.0134 L/kg/h * weight * weight / height", unit: "L/h" });
    expect(issueMessage(found!)).toContain("The units of the formula do not fit (characters 1 to 40): it gives ");
    const [sum] = formulaFaults({ formula: "1 L/h * (weight + height)", unit: "L/h" });
    expect(issueMessage(sum!)).toBe(
      'The units of the formula do not fit (characters 10 to 24): "weight + height" adds or subtracts mass and length.',
    );
  });

  it("an exponent that is not a plain number as written", () => {
    expect(fault("1 L/h/kg * weight ^ isFemale").slice(0, 2)).toEqual(["formula-exponent", "isFemale"]);
    expect(fault("1 L/h/kg * weight ^ (1 + 1)").slice(0, 2)).toEqual(["formula-exponent", "(1 + 1)"]);
    expect(fault("1 L/h/kg * weight ^ 40 / weight").slice(0, 2)).toEqual(["formula-power", "weight ^ 40"]);
    expect(formulaFaults({ formula: "1 L/h * (weight / (70 kg)) ^ (0.5 + 0.25)", unit: "L/h" })).toEqual([]);
    expect(formulaFaults({ formula: "1 L/h * (weight) ^ (-1) * 1 kg", unit: "L/h" })).toEqual([]);
  });

  it("a comparison is no number, and a number no condition", () => {
    expect(fault("(age > 70 a) * 1 L/h").slice(0, 2)).toEqual(["formula-comparison", "(age > 70 a)"]);
    expect(fault("age > 70 a").slice(0, 2)).toEqual(["formula-comparison", "age > 70 a"]);
    expect(fault("isFemale ? 1 L/h : 2 L/h").slice(0, 2)).toEqual(["formula-condition", "isFemale"]);
    expect(fault("1 a < age < 2 a ? 1 L/h : 2 L/h")[0]).toBe("formula-comparison-chain");
  });

  it("units are checked in the branch that does not hold, too", () => {
    expect(fault("age > 200 a ? 1 L/h * (weight + age) / (1 kg) : 1 L/h").slice(0, 2)).toEqual([
      "formula-dimension",
      "weight + age",
    ]);
  });
});

describe("formulaTrace", () => {
  it("gives the value, what went in, and the dimension", () => {
    const trace = formulaTrace({ formula: "0.484 L/kg * weight", unit: "L" }, woman);
    expect(trace).toEqual({
      dimension: "L",
      value: 0.484 * 58,
      unit: "L",
      inputs: [{ name: "weight", value: 58, unit: "kg" }],
      issues: [],
    });
  });

  it("gives the dimension where the unit is another one, and none where it can't be read", () => {
    const other = formulaTrace({ formula: "0.484 L/kg", unit: "L" }, woman);
    expect([other.dimension, other.value, other.issues.map((each) => each.code)]).toEqual([
      "L/kg",
      null,
      ["formula-dimension"],
    ]);
    expect(formulaTrace({ formula: "0.484 L/", unit: "L" }, woman).dimension).toBeNull();
    expect(formulaTrace({ formula: "age > 2 a", unit: "L" }, woman).dimension).toBeNull();
  });
});
