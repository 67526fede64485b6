import { type Issue, issue } from "../result/index.ts";
import { COVARIATES, type CovariateName } from "./covariates.ts";
import { dimensionIs, dimensionSize, dimensionText, dimensionTimes, PLAIN } from "./formulaDimension.ts";
import type { FormulaNode } from "./formulaNode.ts";
import type { ComparisonName, FunctionName, OperatorName } from "./formulaOperations.ts";
import {
  type FormulaUnit,
  type Ratio,
  ratioPower,
  ratioTimes,
  UNIT_ONE,
  unitOfCode,
  unitTimes,
} from "./formulaUnits.ts";

interface At {
  readonly start: number;
  readonly end: number;
}

/** A part of a formula with the unit its number is in, and where it stands in the text. */
export interface Typed extends At {
  readonly node: FormulaNode;
  readonly unit: FormulaUnit;
  readonly isComparison: boolean;
  /** Its number where it is one as written, sign and brackets aside; else null. */
  readonly literal: number | null;
}

/** A power beyond it is in no published model, and grows past what can be counted exactly. */
const LARGEST_POWER = 10;
const LARGEST_DIMENSION = 30;

/** The units of each part, checked as it is put together; a fault is noted with its place and both dimensions, and null is returned. */
export class FormulaTyping {
  readonly #formula: string;
  readonly #faults: Issue[];

  constructor(formula: string, faults: Issue[]) {
    this.#formula = formula;
    this.#faults = faults;
  }

  number(value: number, unit: FormulaUnit, at: At): Typed {
    const isPlain = unit === UNIT_ONE;
    return typed({ kind: "number", value }, unit, at, { literal: isPlain ? value : null });
  }

  covariate(name: CovariateName, at: At): Typed {
    return typed({ kind: "covariate", name }, unitOfCode(COVARIATES[name]), at);
  }

  sum(name: OperatorName, left: Typed, right: Typed): Typed | null {
    if (!this.#areNumbers([left, right]) || !this.#areSame("sum", left, right)) return null;
    return typed(
      { kind: "operator", name, of: [left.node, inScale(right, left.unit.scale)] },
      left.unit,
      span(left, right),
    );
  }

  product(name: OperatorName, left: Typed, right: Typed): Typed | null {
    if (!this.#areNumbers([left, right])) return null;
    const unit = unitTimes(left.unit, right.unit, name === "divide" ? -1 : 1);
    if (dimensionSize(unit.dimension) > LARGEST_DIMENSION) return this.#fault("formula-power", span(left, right));
    return typed({ kind: "operator", name, of: [left.node, right.node] }, unit, span(left, right));
  }

  sign(name: OperatorName, of: Typed): Typed | null {
    if (!this.#areNumbers([of])) return null;
    const literal = of.literal === null ? null : name === "unaryMinus" ? -of.literal : of.literal;
    return typed({ kind: "operator", name, of: [of.node] }, of.unit, of, { literal });
  }

  /** A plain base takes any plain exponent; one with a unit only a number as written, so that the unit of the result is known. */
  power(base: Typed, exponent: Typed): Typed | null {
    if (!this.#areNumbers([base, exponent])) return null;
    const at = span(base, exponent);
    if (!dimensionIs(exponent.unit.dimension, PLAIN)) return this.#dimension("exponent", exponent, PLAIN_TEXT);
    const raised = (unit: FormulaUnit, node: FormulaNode) =>
      typed({ kind: "operator", name: "pow", of: [node, inScale(exponent, UNIT_ONE.scale)] }, unit, at);
    if (dimensionIs(base.unit.dimension, PLAIN)) return raised(UNIT_ONE, inScale(base, UNIT_ONE.scale));
    const power = exponent.literal;
    if (power === null) {
      return this.#fault("formula-exponent", exponent, { found: dimensionText(base.unit.dimension) });
    }
    const dimension = dimensionTimes(PLAIN, base.unit.dimension, power);
    if (Math.abs(power) > LARGEST_POWER || dimensionSize(dimension) > LARGEST_DIMENSION) {
      return this.#fault("formula-power", at);
    }
    return Number.isInteger(power)
      ? raised({ dimension, scale: ratioPower(base.unit.scale, power) }, base.node)
      : raised({ dimension, scale: UNIT_ONE.scale }, inScale(base, UNIT_ONE.scale));
  }

  call(name: FunctionName, of: readonly Typed[], at: At): Typed | null {
    if (!this.#areNumbers(of)) return null;
    const [first, ...rest] = of as [Typed, ...Typed[]];
    switch (name) {
      case "exp":
      case "ln":
        return dimensionIs(first.unit.dimension, PLAIN)
          ? typed({ kind: "function", name, of: [inScale(first, UNIT_ONE.scale)] }, UNIT_ONE, at)
          : this.#dimension("function", first, PLAIN_TEXT, { name });
      case "sqrt": {
        const unit = { dimension: dimensionTimes(PLAIN, first.unit.dimension, 0.5), scale: UNIT_ONE.scale };
        return typed({ kind: "function", name, of: [inScale(first, UNIT_ONE.scale)] }, unit, at);
      }
      case "min":
      case "max":
        if (!rest.every((each) => this.#areSame("arguments", first, each))) return null;
        return typed({ kind: "function", name, of: of.map((each) => inScale(each, first.unit.scale)) }, first.unit, at);
    }
  }

  comparison(name: ComparisonName, left: Typed, right: Typed): Typed | null {
    if (!this.#areNumbers([left, right]) || !this.#areSame("comparison", left, right)) return null;
    const node = { kind: "comparison", name, left: left.node, right: inScale(right, left.unit.scale) } as const;
    return typed(node, UNIT_ONE, span(left, right), { isComparison: true });
  }

  condition(test: Typed, whenTrue: Typed, whenFalse: Typed): Typed | null {
    if (!test.isComparison) return this.#fault("formula-condition", test);
    if (!this.#areNumbers([whenTrue, whenFalse]) || !this.#areSame("branches", whenTrue, whenFalse)) return null;
    const node = { kind: "condition", test: test.node, whenTrue: whenTrue.node } as const;
    return typed({ ...node, whenFalse: inScale(whenFalse, whenTrue.unit.scale) }, whenTrue.unit, span(test, whenFalse));
  }

  /** The whole formula in the unit it is wanted in. */
  result(whole: Typed, wantedText: string, wanted: FormulaUnit): FormulaNode | null {
    if (!this.#areNumbers([whole])) return null;
    if (dimensionIs(whole.unit.dimension, wanted.dimension)) return inScale(whole, wanted.scale);
    return this.#dimension("result", { ...whole, start: 0, end: this.#formula.length }, wantedText);
  }

  #areNumbers(parts: readonly Typed[]): boolean {
    const wrong = parts.find((each) => each.isComparison);
    if (wrong) this.#fault("formula-comparison", wrong);
    return wrong === undefined;
  }

  #areSame(place: string, first: Typed, second: Typed): boolean {
    const isSame = dimensionIs(first.unit.dimension, second.unit.dimension);
    if (!isSame) this.#dimension(place, { ...second, ...span(first, second) }, dimensionText(first.unit.dimension));
    return isSame;
  }

  #dimension(place: string, found: Typed, wanted: string, data: Readonly<Record<string, unknown>> = {}): null {
    return this.#fault("formula-dimension", found, {
      place,
      found: dimensionText(found.unit.dimension),
      wanted,
      ...data,
    });
  }

  #fault(code: string, { start, end }: At, data: Readonly<Record<string, unknown>> = {}): null {
    const part = this.#formula.slice(start, end);
    this.#faults.push(issue(code, { formula: this.#formula, part, start, end, ...data }));
    return null;
  }
}

const PLAIN_TEXT = dimensionText(PLAIN);

function typed(
  node: FormulaNode,
  unit: FormulaUnit,
  { start, end }: At,
  more: { readonly literal?: number | null; readonly isComparison?: boolean } = {},
): Typed {
  return { node, unit, start, end, literal: more.literal ?? null, isComparison: more.isComparison ?? false };
}

function span(first: At, last: At): At {
  return { start: Math.min(first.start, last.start), end: Math.max(first.end, last.end) };
}

/** The part's number in another unit of the same dimension; nothing is done where it is the same. */
function inScale({ node, unit }: Typed, wanted: Ratio): FormulaNode {
  const by = ratioTimes(unit.scale, { top: wanted.bottom, bottom: wanted.top });
  return by.top === by.bottom ? node : { kind: "convert", by, of: node };
}
