import { describe, expect, it } from "vitest";
import type { FormulaNode } from "../../../src/core/medicine/formulaNode.ts";
import { formulaRead } from "../../../src/core/medicine/formulaRead.ts";
import { COVARIATE_NAMES, formulaEvaluate, formulaFaults, UNIT_WORDS } from "../../../src/core/medicine/index.ts";
import { issueMessage, MESSAGE_CODES } from "../../../src/core/messages/index.ts";
import { woman } from "./woman.ts";

/** The codes of its faults; every one has a sentence, and a place that lies in the text. */
function codes(formula: string): string[] {
  return formulaFaults({ formula, unit: "L/h" }).map((each) => {
    const text = issueMessage(each);
    expect(text).toMatch(/^[A-Z].*\.$/su);
    // What stands in quotes is the user's own.
    expect(text.replaceAll(/"[^"]*"/gs, "")).not.toMatch(/undefined|\[object|NaN|null/);
    const { start, end } = each.data as { start?: number; end?: number };
    if (start !== undefined && end !== undefined)
      expect(0 <= start && start <= end && end <= formula.length).toBe(true);
    return each.code;
  });
}

describe("refused, each with a reason", () => {
  it.each<[string, string]>([
    // Names every object has, and ways to reach them.
    ["constructor", "formula-name"],
    ["__proto__", "formula-name"],
    ["toString()", "formula-name"],
    ["hasOwnProperty(1)", "formula-name"],
    ["valueOf()", "formula-name"],
    ["3 constructor", "formula-unit-unknown"],
    ["3 __proto__", "formula-unit-unknown"],
    ["weight.constructor", "formula-character"],
    ['weight["constructor"]', "formula-character"],
    // Functions and constants mathjs has.
    ["cos(1)", "formula-name"],
    ["eval(1)", "formula-name"],
    ["import(1)", "formula-name"],
    ["parse(1)", "formula-name"],
    ["createUnit(1)", "formula-name"],
    ["log(2)", "formula-name"],
    ["pi", "formula-name"],
    ["i", "formula-name"],
    ["true", "formula-name"],
    ["null", "formula-name"],
    ["undefined", "formula-name"],
    ["Infinity", "formula-name"],
    ["NaN", "formula-name"],
    ["q0", "formula-name"],
    ["weights", "formula-name"],
    ["Weight", "formula-name"],
    ["exp", "formula-name"],
    ["weight(2)", "formula-implicit"],
    ["2 (3)", "formula-implicit"],
    ["(weight)(2)", "formula-implicit"],
    ["2 weight", "formula-implicit"],
    ["weight weight", "formula-implicit"],
    ["weight 2", "formula-implicit"],
    ["1.2.3", "formula-implicit"],
    ["5 min(2, 3)", "formula-implicit"],
    // Nothing but arithmetic can be said.
    ["x = 3", "formula-name"],
    ["weight = 3", "formula-character"],
    ["f(x) = x", "formula-name"],
    ["[1, 2]", "formula-character"],
    ["{a: 1}", "formula-character"],
    ['"text"', "formula-character"],
    ["'text'", "formula-character"],
    ["`text`", "formula-character"],
    ["1; 2", "formula-character"],
    ["1\n2", "formula-character"],
    ["1\t2", "formula-character"],
    ["1 # comment", "formula-character"],
    ["weight!", "formula-character"],
    ["weight != 2", "formula-character"],
    ["weight'", "formula-character"],
    ["50%", "formula-character"],
    ["@", "formula-character"],
    ["1 & 2", "formula-character"],
    ["~1", "formula-character"],
    ["weight \\ 2", "formula-character"],
    ["weight -> 2", "formula-unreadable"],
    ["1:3", "formula-unreadable"],
    ["1:2:3", "formula-unreadable"],
    ["1,5", "formula-unreadable"],
    ["1 +", "formula-unreadable"],
    ["* 2", "formula-unreadable"],
    ["()", "formula-unreadable"],
    ["(1", "formula-unreadable"],
    ["1)", "formula-unreadable"],
    ["1 ? 2", "formula-unreadable"],
    ["1 ? 2 : 3", "formula-condition"],
    ["", "formula-unreadable"],
    [" ", "formula-unreadable"],
    ["1 to 2", "formula-unit-unknown"],
    ["0x1F", "formula-unit-unknown"],
    ["0b1", "formula-unit-unknown"],
    ["5 Kg", "formula-unit-unknown"],
    ["5 mcg", "formula-unit-unknown"],
    ["2e", "formula-unit-unknown"],
    ["kg", "formula-unit-alone"],
    ["weight / kg", "formula-unit-alone"],
    ["1 / h", "formula-unit-alone"],
    ["3 kg ^ 2", "formula-unit-power"],
    ["3 kg^0.75", "formula-unit-power"],
    ["3 kg^2^2", "formula-unit-power"],
    ["3 kg^9", "formula-unit-power"],
    ["1e999", "formula-number"],
    ["exp(1, 2)", "formula-arguments"],
    ["exp()", "formula-arguments"],
    ["min(1)", "formula-arguments"],
    ["min(1,2,3,4,5,6,7,8,9)", "formula-arguments"],
    // Look-alikes.
    ["weight \u2212 1 kg", "formula-character"],
    ["weight \u00d7 1 L/h/kg", "formula-character"],
    ["weight \u00b7 1 L/h/kg", "formula-character"],
    ["\uff11 L/h", "formula-character"],
    ["1\uff0e5 L/h", "formula-character"],
    ["w\u0435ight", "formula-name"],
    ["\u0430ge", "formula-character"],
    ["1 \u00b5g", "formula-character"],
    ["1\u00a0L/h", "formula-character"],
    ["weight\u200b", "formula-character"],
    ["\u202e1 L/h", "formula-character"],
    ["\ud835\udfcf L/h", "formula-character"],
    ["1 L/h\u037e", "formula-character"],
    ["\ud800", "formula-character"],
  ])("%j: %s", (formula, code) => {
    expect(codes(formula)).toContain(code);
    expect(formulaEvaluate({ formula, unit: "L/h" }, woman).ok).toBe(false);
  });

  it("tells a look-alike by its code point, and what to write", () => {
    const [found] = formulaFaults({ formula: "weight \u2212 1 kg", unit: "L/h" });
    expect(issueMessage(found!)).toContain("the character U+2212 (write -) (character 8)");
  });

  it("what is too long, too large or too deep", () => {
    expect(codes(`1 L/h${" + 1 L/h".repeat(300)}`)).toEqual(["formula-too-long"]);
    expect(codes(`1 L/h * 1${"+1".repeat(600)}`)).toEqual(["formula-too-large"]);
    expect(codes(`1 L/h * (1${"+1".repeat(240)})`)).toEqual([]);
    expect(codes(`1 L/h * (1${"+1".repeat(260)})`)).toEqual(["formula-too-deep"]);
    expect(codes(`${"(".repeat(24)}1 L/h${")".repeat(24)}`)).toEqual([]);
    expect(codes(`${"(".repeat(25)}1 L/h${")".repeat(25)}`)).toEqual(["formula-too-deep"]);
    expect(codes("(".repeat(2_000))).toEqual(["formula-too-deep"]);
    expect(codes(`${"-".repeat(900)}1 L/h`)).toEqual(["formula-too-deep"]);
    expect(codes(`2${"^2".repeat(400)}`)).toEqual(["formula-too-deep"]);
    expect(codes("age>1a?".repeat(150))).toEqual(["formula-unreadable"]);
    expect(codes(`${"age>1 a?1:".repeat(120)}1`)).toEqual(["formula-dimension"]);
    expect(codes(`${"age>1 a?1:".repeat(170)}1`)).toEqual(["formula-too-large"]);
    expect(codes(`${"min(1,".repeat(23)}1${")".repeat(23)} * 1 L/h`)).toEqual([]);
  });

  it("powers that would grow past counting", () => {
    expect(codes("(1 g / (1 kg)) ^ 9 ^ 9 ^ 9 * 1 L/h")).toEqual([]);
    expect(formulaEvaluate({ formula: "(1 kg / (1 g)) ^ 9 ^ 9 ^ 9 * 1 L/h", unit: "L/h" }, woman)).toMatchObject({
      ok: false,
      issues: [{ code: "formula-result" }],
    });
    expect(codes("((((1 mg) ^ 10) ^ 10) ^ 10) ^ 10")).toEqual(["formula-power"]);
    expect(codes("(1 mg) ^ 1e308")).toEqual(["formula-power"]);
    expect(codes(`1 mg${" * 1 mg".repeat(40)}`)).toEqual(["formula-power"]);
    // A scale of many factors with no dimension left: exact, and small.
    const around = " * 1 mg / (1 kg)".repeat(100);
    expect(codes(`1 L/h${around}`)).toEqual([]);
  });
});

/** Mulberry32: public domain, enough for picking pieces. */
function generator(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4_294_967_296;
  };
}

const PIECES: readonly string[] = [
  ...COVARIATE_NAMES,
  ...Object.keys(UNIT_WORDS),
  ..."+ - * / ^ ( ) , ? : >= <= > < == = != . ; [ ] { } \" ' ! % & | # @ \\ ~ $ _ µ × − · １ е".split(" "),
  ..."exp( ln( sqrt( min( max( log( eval( constructor __proto__ toString prototype this".split(" "),
  ..."0 1 70 0.75 1e3 1e308 1e-320 .5 5. 0x1F 1 L/h 70 kg 65 a 3 L 2 mL/min".split(" "),
  " ",
  " L/h",
  "1 L/h * ",
  "age > 65 a ? ",
  "\u0000",
  "\n",
  "\u202e",
  "\ud83d\ude00",
];
const SOUND: readonly string[] = [
  "(0.0134 L/h/kg * weight + 3.58 L/h) * (age >= 70 a ? 0.749 : 1)",
  "1.36 L/h * (weight / (70 kg)) ^ 0.75",
  "0.053 L/h/kg * min(weight, idealWeight)",
  "exp(-3.78 - 0.525 * isFemale) * 1 L/h/kg * weight",
  "50 mL/min + 0.5 * creatinineClearance",
];

function nodes(node: FormulaNode): number {
  const parts = Object.values(node).flat() as unknown[];
  return 1 + parts.reduce<number>((sum, each) => sum + (isNode(each) ? nodes(each) : 0), 0);
}

function isNode(value: unknown): value is FormulaNode {
  return typeof value === "object" && value !== null && "kind" in value;
}

describe("10,000 strings at random", () => {
  it("each is read or refused with a reason, in steps that its length bounds", () => {
    const random = generator(20_260_304);
    const pick = <T>(list: readonly T[]): T => list[Math.floor(random() * list.length)] as T;
    /** Well formed, with units that fit only now and then. */
    const grown = (depth: number): string => {
      const kind = depth > 4 ? 0 : random();
      if (kind < 0.3) return pick([...COVARIATE_NAMES, "1 L/h", "70 kg", "0.75", "65 a", "2 mL/min", "3", "1 L/h/kg"]);
      if (kind < 0.7) return `${grown(depth + 1)} ${pick(["+", "-", "*", "/"])} ${grown(depth + 1)}`;
      if (kind < 0.8) return `(${grown(depth + 1)})`;
      if (kind < 0.87) return `${pick(["min", "max"])}(${grown(depth + 1)}, ${grown(depth + 1)})`;
      if (kind < 0.92) return `${pick(["exp", "ln", "sqrt"])}(${grown(depth + 1)})`;
      if (kind < 0.96) return `(${grown(depth + 1)}) ^ ${pick(["2", "0.75", "-1", "age", "(1 / 3)"])}`;
      return `(${grown(depth + 1)} ${pick([">=", "<", "=="])} ${grown(depth + 1)} ? ${grown(depth + 1)} : ${grown(depth + 1)})`;
    };
    const made = (): string => {
      const kind = random();
      if (kind < 0.2) return grown(0);
      if (kind < 0.25) return `1 L/h * exp(${grown(3)})`;
      if (kind < 0.35) return Array.from({ length: 1 + Math.floor(random() * 14) }, () => pick(PIECES)).join("");
      if (kind < 0.5) return Array.from({ length: 1 + Math.floor(random() * 14) }, () => pick(PIECES)).join(" ");
      if (kind < 0.6) {
        const characters = Array.from({ length: Math.floor(random() * 60) }, () => Math.floor(random() * 0x2200));
        return String.fromCharCode(...characters);
      }
      // A sound formula with pieces taken out, put in or changed.
      let text = pick(SOUND);
      const times = Math.floor(random() * 3);
      for (let i = 0; i < times; i += 1) {
        const at = Math.floor(random() * (text.length + 1));
        text = `${text.slice(0, at)}${random() < 0.6 ? pick(PIECES) : ""}${text.slice(at + Math.floor(random() * 4))}`;
      }
      return text;
    };
    const refused = new Map<string, number>();
    const given = { read: 0, "without a value": 0 };
    for (let i = 0; i < 10_000; i += 1) {
      const formula = made();
      const found = codes(formula);
      expect(found.every((code) => MESSAGE_CODES.includes(code))).toBe(true);
      const result = formulaEvaluate({ formula, unit: "L/h" }, woman);
      if (found.length === 0) {
        given.read += 1;
        const read = formulaRead({ formula, unit: "L/h" });
        if (!read.ok) throw new Error("read once and then not");
        // Every part of a tree has a character of its own, but for the conversions, of which there is one a part at most.
        expect(nodes(read.value.root)).toBeLessThanOrEqual(2 * formula.length);
        if (result.ok) expect(result.value.value > 0 && Number.isFinite(result.value.value)).toBe(true);
        else given["without a value"] += 1;
      } else {
        expect(result.ok).toBe(false);
        refused.set(found[0]!, (refused.get(found[0]!) ?? 0) + 1);
      }
    }
    const counts = Object.fromEntries([...refused].sort(([, a], [, b]) => b - a));
    console.info(JSON.stringify({ ...given, refused: counts }));
    expect(given.read + Object.values(counts).reduce((sum, each) => sum + each, 0)).toBe(10_000);
    expect(given.read).toBeGreaterThan(300);
    // No reason stands for nearly all of them: the strings reach many parts of the reader.
    expect(Object.keys(counts).length).toBeGreaterThan(12);
  }, 20_000);
});
