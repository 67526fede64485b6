import type { FunctionNode, MathNode, OperatorNode, ParenthesisNode } from "mathjs/number";
import { fail, type Issue, issue, type Result, succeed } from "../result/index.ts";
import type { UnitCode } from "../units/index.ts";
import { COVARIATES, type CovariateName, type Covariates } from "./covariates.ts";
import { FUNCTIONS, formulaRead, isFunctionName, nameOf, OPERATORS, type Operation } from "./formulaRead.ts";

export interface FormulaInput {
  readonly name: CovariateName;
  readonly value: number;
  readonly unit: UnitCode;
}

/**
 * The value of a record's formula for one patient, with the numbers that went in (each once, in order of appearance).
 * Only numbers, the names of COVARIATES, + - * / ^ and exp, log, sqrt, min, max are understood; nothing is ever executed.
 * A covariate the formula needs and the patient lacks gives "formula-needs"; a result that is not finite and above 0, "formula-result".
 * Example: formulaEvaluate("0.053 * min(weight, idealWeight)", { weight: 58, idealWeight: 54.2 }) → 2.8726.
 */
export function formulaEvaluate(
  formula: string,
  covariates: Covariates,
): Result<{ readonly value: number; readonly inputs: readonly FormulaInput[] }> {
  const read = formulaRead(formula);
  if (!read.ok) return read;
  const inputs: FormulaInput[] = [];
  const faults: Issue[] = [];
  for (const name of namesIn(read.value)) {
    const value = covariates[name];
    if (value === undefined) faults.push(issue("formula-needs", { name }));
    else if (!isAllowed(name, value))
      faults.push(issue("formula-covariate", { name, found: value, unit: COVARIATES[name] }));
    else inputs.push({ name, value, unit: COVARIATES[name] });
  }
  if (faults.length > 0) return fail(...faults);
  const value = nodeValue(read.value, covariates);
  if (!Number.isFinite(value) || value <= 0) return fail(issue("formula-result", { formula, found: String(value) }));
  return succeed({ value, inputs });
}

/** The covariates a formula uses, each once, in order of appearance; none for a formula that can't be read. */
export function formulaCovariates(formula: string): readonly CovariateName[] {
  const read = formulaRead(formula);
  return read.ok ? namesIn(read.value) : [];
}

function namesIn(node: MathNode): CovariateName[] {
  const names = new Set<CovariateName>();
  node.traverse((each, _path, parent) => {
    if (each.type === "SymbolNode" && !isFunctionName(each, parent)) names.add(nameOf(each) as CovariateName);
  });
  return [...names];
}

/** Walks a tree that formulaRead has let pass: no other node can occur. */
function nodeValue(node: MathNode, covariates: Covariates): number {
  switch (node.type) {
    case "ConstantNode":
      return (node as unknown as { value: number }).value;
    case "SymbolNode":
      return covariates[nameOf(node) as CovariateName] as number;
    case "ParenthesisNode":
      return nodeValue((node as ParenthesisNode).content, covariates);
    case "OperatorNode": {
      const { fn, args } = node as OperatorNode;
      return (OPERATORS[fn] as Operation)(...args.map((each) => nodeValue(each, covariates)));
    }
    case "FunctionNode": {
      const { fn, args } = node as FunctionNode;
      const known = FUNCTIONS[nameOf(fn as MathNode)] as { call: Operation };
      return known.call(...args.map((each) => nodeValue(each, covariates)));
    }
    default:
      throw new RangeError(`formula: a part of kind "${node.type}" passed the check`);
  }
}

/** A newborn is 0 years old; every other covariate but isFemale is above 0. A value that is no number is the caller's mistake. */
function isAllowed(name: CovariateName, value: number): boolean {
  if (!Number.isFinite(value)) throw new RangeError(`${name}: ${value} ${COVARIATES[name]}; allowed: a finite number`);
  if (name === "isFemale") return value === 0 || value === 1;
  return name === "age" ? value >= 0 : value > 0;
}
