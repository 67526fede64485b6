import { fail, type Issue, issue, type Result, succeed } from "../result/index.ts";
import { decimalOf, decimalScaled, type UnitCode } from "../units/index.ts";
import { COVARIATES, type CovariateName, type Covariates } from "./covariates.ts";
import type { Formula } from "./figureSchema.ts";
import type { FormulaNode } from "./formulaNode.ts";
import { COMPARISONS, FUNCTIONS, OPERATORS, type Operation } from "./formulaOperations.ts";
import { formulaDimension, formulaRead } from "./formulaRead.ts";

export interface FormulaInput {
  readonly name: CovariateName;
  readonly value: number;
  readonly unit: UnitCode;
}

type WrittenFormula = Pick<Formula, "formula" | "unit">;

/**
 * The value of a record's formula for one patient, in the formula's unit, with the numbers that went in (each once, in order of appearance).
 * Only what docs/medicine-record.md lists is understood; nothing is ever executed. Of a condition only the branch that holds is worked out.
 * A covariate the formula names and the patient lacks gives "formula-needs"; a result that is not finite and above 0, "formula-result".
 * Accuracy: one rounding an operation; a change of unit is exact but for one rounding, and none is done where the units are the same.
 * Example: { formula: "0.053 L/h/kg * min(weight, idealWeight)", unit: "L/h" } at weight 58 kg, ideal weight 54.2 kg → 2.8726 L/h.
 */
export function formulaEvaluate(
  formula: WrittenFormula,
  covariates: Covariates,
): Result<{ readonly value: number; readonly inputs: readonly FormulaInput[] }> {
  const read = formulaRead(formula);
  if (!read.ok) return read;
  const inputs: FormulaInput[] = [];
  const faults: Issue[] = [];
  for (const name of read.value.covariates) {
    const value = covariates[name];
    if (value === undefined) faults.push(issue("formula-needs", { name }));
    else if (!isAllowed(name, value))
      faults.push(issue("formula-covariate", { name, found: value, unit: COVARIATES[name] }));
    else inputs.push({ name, value, unit: COVARIATES[name] });
  }
  if (faults.length > 0) return fail(...faults);
  const value = nodeValue(read.value.root, covariates);
  if (!Number.isFinite(value) || value <= 0) {
    return fail(issue("formula-result", { formula: formula.formula, found: String(value) }));
  }
  return succeed({ value, inputs });
}

/** What an editor shows beside a formula: its value for a patient, the numbers that went in, and the dimension it has. */
export interface FormulaTrace {
  /** As words or units: "L/h", "mass", "L/h/kg"; null where the formula can't be read. */
  readonly dimension: string | null;
  /** In the formula's unit; null with the issues saying why. */
  readonly value: number | null;
  readonly unit: Formula["unit"];
  readonly inputs: readonly FormulaInput[];
  readonly issues: readonly Issue[];
}

export function formulaTrace(formula: WrittenFormula, covariates: Covariates): FormulaTrace {
  const found = formulaEvaluate(formula, covariates);
  return {
    dimension: formulaDimension(formula.formula),
    value: found.ok ? found.value.value : null,
    unit: formula.unit,
    inputs: found.ok ? found.value.inputs : [],
    issues: found.ok ? [] : found.issues,
  };
}

function nodeValue(node: FormulaNode, covariates: Covariates): number {
  switch (node.kind) {
    case "number":
      return node.value;
    case "covariate":
      return covariates[node.name] as number;
    case "convert": {
      const value = nodeValue(node.of, covariates);
      return Number.isFinite(value) ? decimalScaled(decimalOf(value), node.by.top, node.by.bottom) : value;
    }
    case "operator":
      return (OPERATORS[node.name] as Operation)(...node.of.map((each) => nodeValue(each, covariates)));
    case "function":
      return (FUNCTIONS[node.name].call as Operation)(...node.of.map((each) => nodeValue(each, covariates)));
    case "condition":
      return nodeValue(holds(node.test, covariates) ? node.whenTrue : node.whenFalse, covariates);
    case "comparison":
      throw new RangeError("formula: a comparison stands where a number is wanted although it was checked");
  }
}

function holds(node: FormulaNode, covariates: Covariates): boolean {
  if (node.kind !== "comparison") throw new RangeError("formula: a condition without a comparison passed the check");
  return COMPARISONS[node.name](nodeValue(node.left, covariates), nodeValue(node.right, covariates));
}

/** A newborn is 0 years old; every other covariate but isFemale is above 0. A value that is no number is the caller's mistake. */
function isAllowed(name: CovariateName, value: number): boolean {
  if (!Number.isFinite(value)) throw new RangeError(`${name}: ${value} ${COVARIATES[name]}; allowed: a finite number`);
  if (name === "isFemale") return value === 0 || value === 1;
  return name === "age" ? value >= 0 : value > 0;
}
