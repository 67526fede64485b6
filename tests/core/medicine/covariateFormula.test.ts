import { describe, expect, it } from "vitest";
import { COVARIATES, formulaEvaluate, formulaFaults } from "../../../src/core/medicine/index.ts";
import { issueMessage } from "../../../src/core/messages/index.ts";

const woman = { weight: 58, idealWeight: 54.2, height: 162, age: 64, creatinineClearance: 52, isFemale: 1 } as const;

/** The value, by a formula that must be readable. */
function value(formula: string): number {
  const result = formulaEvaluate(formula, woman);
  if (!result.ok) throw new Error(JSON.stringify(result.issues));
  return result.value.value;
}

describe("formulaEvaluate", () => {
  it.each([
    ["2.28", 2.28],
    ["0.053 * min(weight, idealWeight)", 0.053 * 54.2],
    ["0.053 * max(weight, idealWeight)", 0.053 * 58],
    ["0.6 + 0.03 * creatinineClearance", 0.6 + 0.03 * 52],
    ["2 * (weight / 70) ^ 0.75", 2 * (58 / 70) ** 0.75],
    ["exp(-3.78 + log(weight))", Math.exp(-3.78 + Math.log(58))],
    ["sqrt(height * weight / 3600)", Math.sqrt((162 * 58) / 3600)],
    ["3 - 0.5 * isFemale", 2.5],
    ["5 - age / 20", 5 - 64 / 20],
    // The usual reading: powers first and from the right, minus after them, the rest from the left.
    ["2 ^ 3 ^ 2", 512],
    ["20 - 2 ^ 2", 16],
    ["-2 ^ 2 + 5", 1],
    ["8 / 4 / 2", 1],
    ["8 - 4 - 2", 2],
    ["+1e-3 * 2e3", 2],
    ["min(3, 2, 1) + max(1, 2, 3)", 4],
  ])("%s", (formula, expected) => {
    // Relative tolerance 0: the same operations in the same order give the same bits.
    expect(value(formula)).toBe(expected);
  });

  it("tells which numbers went in, each once and with its unit", () => {
    const result = formulaEvaluate("weight * isFemale + min(weight, idealWeight)", woman);
    expect(result.ok && result.value.inputs).toEqual([
      { name: "weight", value: 58, unit: "kg" },
      { name: "isFemale", value: 1, unit: "1" },
      { name: "idealWeight", value: 54.2, unit: "kg" },
    ]);
  });

  it("names every covariate that is missing", () => {
    const result = formulaEvaluate("weight * adjustedWeight + age", { age: 30, weight: undefined });
    expect(result.ok ? [] : result.issues.map(({ code, data }) => [code, data.name])).toEqual([
      ["formula-needs", "weight"],
      ["formula-needs", "adjustedWeight"],
    ]);
    expect(result.ok ? "" : issueMessage(result.issues[0]!)).toBe(
      "The prediction needs a weight, which is not known for this patient.",
    );
  });

  it.each([
    "weight - 58",
    "1 - weight",
    "1 / (weight - 58)",
    "log(0 * weight)",
    "sqrt(-weight)",
    "exp(weight * weight)",
  ])("%s gives no usable value", (formula) => {
    const result = formulaEvaluate(formula, woman);
    expect(result.ok ? [] : result.issues.map((each) => each.code)).toEqual(["formula-result"]);
  });

  it("refuses covariates out of their range", () => {
    const codes = (covariates: Record<string, number>) => {
      const result = formulaEvaluate("1 + age + weight + isFemale", { weight: 1, age: 1, isFemale: 0, ...covariates });
      return result.ok ? [] : result.issues.map((each) => [each.code, each.data.name]);
    };
    expect(codes({ age: 0 })).toEqual([]);
    expect(codes({ age: -1 })).toEqual([["formula-covariate", "age"]]);
    expect(codes({ weight: 0 })).toEqual([["formula-covariate", "weight"]]);
    expect(codes({ isFemale: 0.5 })).toEqual([["formula-covariate", "isFemale"]]);
    expect(() => codes({ weight: Number.NaN })).toThrow(RangeError);
  });
});

describe("formulaFaults", () => {
  const codes = (formula: string) => formulaFaults(formula).map((each) => each.code);

  it("passes every covariate by name", () => {
    expect(codes(Object.keys(COVARIATES).join(" + "))).toEqual([]);
  });

  it.each([
    // Nothing but arithmetic can be said: no assignment, access, text, list, comparison, condition, definition, comment, sequence, unit.
    "x = 3",
    "weight.constructor",
    'weight["constructor"]',
    "[1, 2]",
    "{a: 1}",
    '"text"',
    "1 < 2",
    "weight == 2",
    "1 ? 2 : 3",
    "f(x) = x",
    "1; 2",
    "1\n2",
    "1 # comment",
    "weight!",
    "weight'",
    "50%",
    "5 kg",
    "2 weight",
    "(weight)(2)",
    "weight weight",
    "1 to 2",
    "0x1F",
    "0b1",
    "1,5",
    "1e999",
    "1 +",
    "* 2",
    "()",
    "",
    " ",
    "@",
    "weight µ",
    "１ + 1",
    "1:3",
    "1 & 2",
    "~1",
    "weight \\ 2",
  ])("refuses %j", (formula) => {
    expect(codes(formula)).not.toEqual([]);
    expect(formulaEvaluate(formula, woman).ok).toBe(false);
  });

  it.each([
    "cos(1)",
    "eval(1)",
    "import(1)",
    "constructor",
    "toString()",
    "hasOwnProperty(1)",
    "__proto__",
    "pi",
    "e",
    "i",
    "weight(2)",
    "exp",
    "valueOf()",
    "parse(1)",
    "weights",
    "Weight",
  ])("refuses the name in %j", (formula) => {
    expect(codes(formula)).toContain("formula-name");
    expect(formulaEvaluate(formula, woman).ok).toBe(false);
  });

  it.each(["true", "null", "undefined", "Infinity", "NaN"])("refuses the word %s", (formula) => {
    expect(codes(formula)).not.toEqual([]);
  });

  it("counts arguments", () => {
    expect(codes("exp(1, 2)")).toEqual(["formula-arguments"]);
    expect(codes("exp()")).toEqual(["formula-arguments"]);
    expect(codes("min(1)")).toEqual(["formula-arguments"]);
    expect(codes("log(8, 2)")).toEqual(["formula-arguments"]);
    expect(codes("min(1,2,3,4,5,6,7,8,9)")).toEqual(["formula-arguments"]);
  });

  it("refuses what is too long or too deep without breaking", () => {
    expect(codes(`${"1+".repeat(200)}1`)).toEqual(["formula-too-long"]);
    expect(codes(`${"(".repeat(20)}1${")".repeat(20)}`)).toEqual([]);
    expect(codes(`${"(".repeat(21)}1${")".repeat(21)}`)).toEqual(["formula-unreadable"]);
    expect(codes("(".repeat(400))).toEqual(["formula-unreadable"]);
    expect(() => codes(`${"-".repeat(399)}1`)).not.toThrow();
  });
});
