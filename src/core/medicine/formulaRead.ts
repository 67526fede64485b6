import type { FactoryFunctionMap, FunctionNode, MathNode, OperatorNode } from "mathjs/number";
import { create, parseDependencies } from "mathjs/number";
import { fail, type Issue, issue, type Result, succeed } from "../result/index.ts";
import { COVARIATES } from "./covariates.ts";

export type Operation = (...numbers: number[]) => number;

export const OPERATORS: Readonly<Record<string, Operation>> = {
  add: (a, b) => (a as number) + (b as number),
  subtract: (a, b) => (a as number) - (b as number),
  multiply: (a, b) => (a as number) * (b as number),
  divide: (a, b) => (a as number) / (b as number),
  pow: (a, b) => (a as number) ** (b as number),
  unaryMinus: (a) => -(a as number),
  unaryPlus: (a) => a as number,
};

/** Functions a formula may call, with how many arguments they take. `log` is the natural logarithm. */
export const FUNCTIONS: Readonly<
  Record<string, { readonly call: Operation; readonly least: number; readonly most: number }>
> = {
  exp: { call: Math.exp as Operation, least: 1, most: 1 },
  log: { call: Math.log as Operation, least: 1, most: 1 },
  sqrt: { call: Math.sqrt as Operation, least: 1, most: 1 },
  min: { call: Math.min, least: 2, most: 8 },
  max: { call: Math.max, least: 2, most: 8 },
};

export const FORMULA_FUNCTIONS: readonly string[] = Object.keys(FUNCTIONS);
/** Ours: long enough for any published covariate model, short enough to be read on a page. */
const FORMULA_LENGTH = 400;
/** Letters, digits, the five operators, brackets, comma: leaves no way to write text, access, assignment or comparison. */
const FORMULA_CHARACTERS = /^[A-Za-z0-9_.+\-*/^(), ]*$/;
/** Ours: far beyond any published model, far below what a stack holds. */
const FORMULA_NESTING = 20;
const HEXADECIMAL = /(^|[^A-Za-z0-9_.])0[A-Za-z]/;

const math = create({ parseDependencies: parseDependencies as FactoryFunctionMap });

/** What is wrong with a formula as written, or nothing. Checked when a record is read, before any patient is known. */
export function formulaFaults(formula: string): Issue[] {
  const read = formulaRead(formula);
  return read.ok ? [] : [...read.issues];
}

/** The formula as a tree in which only what the lists above name can occur. */
export function formulaRead(formula: string): Result<MathNode> {
  if (formula.length > FORMULA_LENGTH) {
    return fail(issue("formula-too-long", { found: formula.length, maximum: FORMULA_LENGTH }));
  }
  if (!FORMULA_CHARACTERS.test(formula) || HEXADECIMAL.test(formula) || nestingOf(formula) > FORMULA_NESTING) {
    return fail(issue("formula-unreadable", { formula }));
  }
  let node: MathNode;
  try {
    node = math.parse(formula);
  } catch {
    return fail(issue("formula-unreadable", { formula }));
  }
  const faults: Issue[] = [];
  node.traverse((each, _path, parent) => {
    if (!isFunctionName(each, parent)) faults.push(...nodeFaults(each, formula));
  });
  return faults.length > 0 ? fail(...faults) : succeed(node);
}

/** The name before the brackets is a node of its own; the call around it is what is judged. */
export function isFunctionName(node: MathNode, parent: MathNode | null): boolean {
  return parent?.type === "FunctionNode" && (parent as FunctionNode).fn === node;
}

function nodeFaults(node: MathNode, formula: string): Issue[] {
  switch (node.type) {
    case "ConstantNode":
      return isFiniteNumber(node) ? [] : [issue("formula-unreadable", { formula })];
    case "SymbolNode": {
      const name = nameOf(node);
      return Object.hasOwn(COVARIATES, name)
        ? []
        : [issue("formula-name", { formula, name, allowed: Object.keys(COVARIATES) })];
    }
    case "OperatorNode": {
      const { fn, implicit } = node as OperatorNode;
      return Object.hasOwn(OPERATORS, fn) && !implicit ? [] : [issue("formula-unreadable", { formula })];
    }
    case "FunctionNode": {
      const { fn, args } = node as FunctionNode;
      const name = nameOf(fn as MathNode);
      const known = Object.hasOwn(FUNCTIONS, name) ? FUNCTIONS[name] : undefined;
      if (!known) return [issue("formula-name", { formula, name, allowed: FORMULA_FUNCTIONS })];
      if (args.length >= known.least && args.length <= known.most) return [];
      return [issue("formula-arguments", { formula, name, found: args.length, least: known.least, most: known.most })];
    }
    case "ParenthesisNode":
      return [];
    default:
      return [issue("formula-unreadable", { formula })];
  }
}

export function nameOf(node: MathNode): string {
  return "name" in node && typeof node.name === "string" ? node.name : "";
}

function isFiniteNumber(node: MathNode): boolean {
  return "value" in node && typeof node.value === "number" && Number.isFinite(node.value);
}

function nestingOf(formula: string): number {
  let depth = 0;
  let deepest = 0;
  for (const character of formula) {
    if (character === "(") depth += 1;
    if (character === ")") depth -= 1;
    deepest = Math.max(deepest, depth);
  }
  return deepest;
}
