import type {
  ConditionalNode,
  FactoryFunctionMap,
  FunctionNode,
  MathNode,
  OperatorNode,
  ParenthesisNode,
} from "mathjs/number";
import { create, parseDependencies } from "mathjs/number";
import { fail, type Issue, issue, type Result, succeed } from "../result/index.ts";
import type { CovariateName } from "./covariates.ts";
import type { Formula } from "./figureSchema.ts";
import { type Dimension, dimensionText } from "./formulaDimension.ts";
import type { FormulaNode } from "./formulaNode.ts";
import {
  COMPARISONS,
  type ComparisonName,
  FUNCTIONS,
  isFunctionName,
  OPERATORS,
  type OperatorName,
} from "./formulaOperations.ts";
import { type FormulaToken, formulaTokens } from "./formulaTokens.ts";
import { FormulaTyping, type Typed } from "./formulaTyping.ts";
import { unitOfCode } from "./formulaUnits.ts";

export interface ReadFormula {
  /** Gives the number of the unit wanted. */
  readonly root: FormulaNode;
  readonly dimension: Dimension;
  /** Each once, in order of appearance. */
  readonly covariates: readonly CovariateName[];
}

/** Far beyond any published model, far below what a stack holds. */
const DEEPEST_TREE = 250;

const math = create({ parseDependencies: parseDependencies as FactoryFunctionMap });

/**
 * A formula as a tree in which only numbers with units, covariates and the operations of formulaOperations can occur, its units checked:
 * cut into tokens, read by mathjs's parser from placeholders (nothing a user wrote reaches it), walked over an allow-list.
 * Every issue has `start` and `end`, the place in the text.
 */
export function formulaRead({ formula, unit }: Pick<Formula, "formula" | "unit">): Result<ReadFormula> {
  const typed = formulaTyped(formula);
  if (!typed.ok) return typed;
  const faults: Issue[] = [];
  const root = new FormulaTyping(formula, faults).result(typed.value.typed, unit, unitOfCode(unit));
  return root
    ? succeed({ root, dimension: typed.value.typed.unit.dimension, covariates: typed.value.covariates })
    : fail(...faults);
}

/** What is wrong with a formula as written, or nothing. Checked when a record is read, before any patient is known. */
export function formulaFaults(formula: Pick<Formula, "formula" | "unit">): Issue[] {
  const read = formulaRead(formula);
  return read.ok ? [] : [...read.issues];
}

/** The dimension of what a formula gives, in words or units: "L/h/kg"; null for one that can't be read. */
export function formulaDimension(formula: string): string | null {
  const typed = formulaTyped(formula);
  return typed.ok && !typed.value.typed.isComparison ? dimensionText(typed.value.typed.unit.dimension) : null;
}

/** The covariates a formula uses, each once, in order of appearance; none for a formula that can't be read. */
export function formulaCovariates(formula: string): readonly CovariateName[] {
  const typed = formulaTyped(formula);
  return typed.ok ? typed.value.covariates : [];
}

type TypedFormula = Result<{ readonly typed: Typed; readonly covariates: readonly CovariateName[] }>;

/** Formulas are few and read again at every step of a curve's clock. */
const REMEMBERED = 200;
const remembered = new Map<string, TypedFormula>();

function formulaTyped(formula: string): TypedFormula {
  const known = remembered.get(formula);
  if (known) return known;
  if (remembered.size >= REMEMBERED) remembered.clear();
  const found = formulaTypedFresh(formula);
  remembered.set(formula, found);
  return found;
}

function formulaTypedFresh(formula: string): TypedFormula {
  const cut = formulaTokens(formula);
  if (!cut.ok) return cut;
  const tokens = cut.value;
  const unreadable = () => issue("formula-unreadable", { formula, start: 0, end: formula.length });
  if (tokens.length === 0) return fail(unreadable());
  let node: MathNode;
  try {
    node = math.parse(tokens.map((token, i) => (token.kind === "sign" ? token.text : `q${i}`)).join(" "));
  } catch {
    return fail(unreadable());
  }
  const faults: Issue[] = [];
  const typed = new TreeWalk(formula, tokens, faults).typed(node, 0);
  if (!typed) return fail(...(faults.length > 0 ? faults : [unreadable()]));
  const names = tokens.flatMap((token) => (token.kind === "covariate" ? [token.name] : []));
  return succeed({ typed, covariates: [...new Set(names)] });
}

/** From mathjs's tree of placeholders to ours. null where a fault has been noted. */
class TreeWalk {
  readonly #formula: string;
  readonly #tokens: readonly FormulaToken[];
  readonly #faults: Issue[];
  readonly #typing: FormulaTyping;

  constructor(formula: string, tokens: readonly FormulaToken[], faults: Issue[]) {
    this.#formula = formula;
    this.#tokens = tokens;
    this.#faults = faults;
    this.#typing = new FormulaTyping(formula, faults);
  }

  typed(node: MathNode, depth: number): Typed | null {
    if (depth > DEEPEST_TREE) return this.#tooDeep();
    switch (node.type) {
      case "SymbolNode":
        return this.#leaf(this.#tokenOf(node));
      case "ParenthesisNode": {
        const inside = this.typed((node as ParenthesisNode).content, depth + 1);
        return inside && { ...inside, ...this.#withBrackets(inside) };
      }
      case "OperatorNode":
        return this.#operator(node as OperatorNode, depth);
      case "FunctionNode":
        return this.#call(node as FunctionNode, depth);
      case "ConditionalNode": {
        const { condition, trueExpr, falseExpr } = node as ConditionalNode;
        const parts = this.#all([condition, trueExpr, falseExpr], depth);
        return parts && this.#typing.condition(parts[0] as Typed, parts[1] as Typed, parts[2] as Typed);
      }
      case "RelationalNode":
        return this.#fault("formula-comparison-chain", null, {});
      default:
        return this.#fault("formula-unreadable", null, {});
    }
  }

  /** Once, however many branches go that deep. */
  #tooDeep(): null {
    if (this.#faults.some((each) => each.code === "formula-too-deep")) return null;
    return this.#fault("formula-too-deep", null, { maximum: DEEPEST_TREE });
  }

  #leaf(token: FormulaToken | null): Typed | null {
    if (token?.kind === "number") return this.#typing.number(token.value, token.unit, token);
    if (token?.kind === "covariate") return this.#typing.covariate(token.name, token);
    return this.#fault("formula-unreadable", null, {});
  }

  #operator(node: OperatorNode, depth: number): Typed | null {
    const parts = this.#all(node.args as MathNode[], depth);
    if (!parts) return null;
    const [left, right] = parts as [Typed, Typed];
    const at = { start: left.start, end: parts.at(-1)?.end ?? left.end };
    if ("implicit" in node && node.implicit) return this.#fault("formula-implicit", at, {});
    const name: string = node.fn;
    if (Object.hasOwn(COMPARISONS, name)) return this.#typing.comparison(name as ComparisonName, left, right);
    if (!Object.hasOwn(OPERATORS, name)) return this.#fault("formula-unreadable", at, {});
    const operator = name as OperatorName;
    switch (operator) {
      case "add":
      case "subtract":
        return this.#typing.sum(operator, left, right);
      case "multiply":
      case "divide":
        return this.#typing.product(operator, left, right);
      case "pow":
        return this.#typing.power(left, right);
      case "unaryMinus":
      case "unaryPlus":
        return this.#typing.sign(operator, left);
    }
  }

  #call(node: FunctionNode, depth: number): Typed | null {
    const token = this.#tokenOf(node.fn as unknown as MathNode);
    if (token?.kind !== "function" || !isFunctionName(token.name)) {
      return this.#fault("formula-implicit", token, {});
    }
    const { least, most } = FUNCTIONS[token.name];
    const found = node.args.length;
    if (found < least || found > most) {
      return this.#fault("formula-arguments", token, { name: token.name, found, least, most });
    }
    const parts = this.#all(node.args as MathNode[], depth);
    if (!parts) return null;
    const last = parts.at(-1) as Typed;
    const close = this.#tokens.find((each) => each.start >= last.end && isSign(each, ")"));
    return this.#typing.call(token.name, parts, { start: token.start, end: close?.end ?? last.end });
  }

  #all(nodes: readonly MathNode[], depth: number): readonly Typed[] | null {
    const parts = nodes.map((each) => this.typed(each, depth + 1));
    return parts.every((each) => each !== null) ? parts : null;
  }

  #tokenOf(node: MathNode): FormulaToken | null {
    const name = "name" in node && typeof node.name === "string" ? node.name : "";
    return this.#tokens[Number(name.slice(1))] ?? null;
  }

  #withBrackets({ start, end }: Typed): { readonly start: number; readonly end: number } {
    const open = this.#tokens.findLast((each) => each.end <= start && isSign(each, "("));
    const close = this.#tokens.find((each) => each.start >= end && isSign(each, ")"));
    return { start: open?.start ?? start, end: close?.end ?? end };
  }

  #fault(code: string, at: { start: number; end: number } | null, data: Readonly<Record<string, unknown>>): null {
    const { start, end } = at ?? { start: 0, end: this.#formula.length };
    this.#faults.push(
      issue(code, { formula: this.#formula, part: this.#formula.slice(start, end), start, end, ...data }),
    );
    return null;
  }
}

function isSign(token: FormulaToken, text: string): boolean {
  return token.kind === "sign" && token.text === text;
}
