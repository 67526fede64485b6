import { fail, type Issue, issue, type Result, succeed } from "../result/index.ts";
import { COVARIATE_NAMES, type CovariateName, isCovariateName } from "./covariates.ts";
import { FORMULA_FUNCTIONS, isFunctionName } from "./formulaOperations.ts";
import { type FormulaUnit, UNIT_ONE, UNIT_WORDS, unitTimes } from "./formulaUnits.ts";

interface At {
  readonly start: number;
  readonly end: number;
}

export type FormulaToken = At &
  (
    | { readonly kind: "number"; readonly value: number; readonly unit: FormulaUnit }
    | { readonly kind: "covariate"; readonly name: CovariateName }
    | { readonly kind: "function"; readonly name: string }
    | { readonly kind: "sign"; readonly text: string }
  );

/** Long enough for any published covariate model, and for the longest of the first version after its migration. */
const LONGEST = 2_000;
const MOST_TOKENS = 1_000;
/** Far beyond any published model, far below what a stack holds. */
const DEEPEST = 24;

const NUMBER = /(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?/y;
const WORD = /[A-Za-z_][A-Za-z0-9_]*/y;
const SIGN = />=|<=|==|[-+*/^()<>?:,]/y;
const SPACE = / */y;
const UNIT_POWER = /\^(-?[1-3])(?![\d.])/y;

/**
 * The formula cut into numbers (each with the unit written after it), covariates, functions and signs.
 * A unit belongs to the number before it and binds closest: `1 / 2 L/h` is 1 / (2 L/h).
 */
export function formulaTokens(formula: string): Result<readonly FormulaToken[]> {
  if (formula.length > LONGEST) {
    return fail(issue("formula-too-long", { found: formula.length, maximum: LONGEST }));
  }
  const tokens: FormulaToken[] = [];
  const faults: Issue[] = [];
  const reader = new Reader(formula);
  let depth = 0;
  for (reader.take(SPACE); !reader.isAtEnd; reader.take(SPACE)) {
    const token = tokenNext(reader, formula);
    if (!token.ok) {
      faults.push(...token.issues);
      // What follows a stray character would only be misread.
      if (token.issues.some((each) => each.code === "formula-character")) break;
      continue;
    }
    tokens.push(token.value);
    if (token.value.kind === "sign" && token.value.text === "(") depth += 1;
    if (token.value.kind === "sign" && token.value.text === ")") depth -= 1;
    if (depth > DEEPEST) return fail(issue("formula-too-deep", { formula, maximum: DEEPEST }));
    if (tokens.length > MOST_TOKENS) return fail(issue("formula-too-large", { formula, maximum: MOST_TOKENS }));
  }
  return faults.length > 0 ? fail(...faults) : succeed(tokens);
}

function tokenNext(reader: Reader, formula: string): Result<FormulaToken> {
  const start = reader.position;
  const number = reader.take(NUMBER);
  if (number !== null) return numberToken(reader, formula, Number(number), start);
  const word = reader.take(WORD);
  if (word !== null) return wordToken(reader, formula, word, start);
  const text = reader.take(SIGN);
  if (text !== null) return succeed({ kind: "sign", text, start, end: reader.position });
  const character = reader.takeCharacter();
  const codePoint = `U+${(character.codePointAt(0) ?? 0).toString(16).toUpperCase().padStart(4, "0")}`;
  return fail(issue("formula-character", { formula, character, codePoint, start, end: reader.position }));
}

function wordToken(reader: Reader, formula: string, name: string, start: number): Result<FormulaToken> {
  const at = { start, end: reader.position };
  if (isFunctionName(name) && reader.isBefore("(")) return succeed({ kind: "function", name, ...at });
  if (isCovariateName(name)) return succeed({ kind: "covariate", name, ...at });
  if (Object.hasOwn(UNIT_WORDS, name)) return fail(issue("formula-unit-alone", { formula, name, ...at }));
  const allowed = reader.isBefore("(") ? FORMULA_FUNCTIONS : COVARIATE_NAMES;
  return fail(issue("formula-name", { formula, name, allowed, ...at }));
}

function numberToken(reader: Reader, formula: string, value: number, start: number): Result<FormulaToken> {
  const unit = unitRead(reader, formula);
  const at = { start, end: reader.position };
  if (!Number.isFinite(value)) return fail(issue("formula-number", { formula, ...at }));
  return unit.ok ? succeed({ kind: "number", value, unit: unit.value, ...at }) : unit;
}

/** The unit after a number, `L/h/kg` or `mg·h/L`; none gives the unit one. */
function unitRead(reader: Reader, formula: string): Result<FormulaUnit> {
  let unit = UNIT_ONE;
  let before = reader.position;
  let power = 1;
  reader.take(SPACE);
  for (;;) {
    const start = reader.position;
    const word = reader.take(WORD);
    const isUnit = word !== null && Object.hasOwn(UNIT_WORDS, word) && !(isFunctionName(word) && reader.isBefore("("));
    if (!isUnit) {
      const isUnknown = word !== null && !isCovariateName(word) && !isFunctionName(word);
      if (isUnknown && unit === UNIT_ONE) {
        const data = { formula, name: word, allowed: Object.keys(UNIT_WORDS), start, end: reader.position };
        return fail(issue("formula-unit-unknown", data));
      }
      reader.position = before;
      return succeed(unit);
    }
    const raised = reader.take(UNIT_POWER);
    const exponent = raised === null ? 1 : Number(raised.slice(1));
    if (reader.isBefore("^")) {
      return fail(issue("formula-unit-power", { formula, start, end: reader.position }));
    }
    unit = unitTimes(unit, UNIT_WORDS[word] as FormulaUnit, power * exponent);
    before = reader.position;
    reader.take(SPACE);
    if (reader.takeText("/")) power = -1;
    else if (reader.takeText("\u00b7")) power = 1;
    else {
      reader.position = before;
      return succeed(unit);
    }
    reader.take(SPACE);
  }
}

/** A place in the formula that moves on by what is taken. */
class Reader {
  position = 0;
  readonly #text: string;

  constructor(text: string) {
    this.#text = text;
  }

  get isAtEnd(): boolean {
    return this.position >= this.#text.length;
  }

  take(pattern: RegExp): string | null {
    pattern.lastIndex = this.position;
    const found = pattern.exec(this.#text)?.[0] ?? null;
    this.position += found?.length ?? 0;
    return found;
  }

  takeText(text: string): boolean {
    const isThere = this.#text.startsWith(text, this.position);
    if (isThere) this.position += text.length;
    return isThere;
  }

  takeCharacter(): string {
    const character = String.fromCodePoint(this.#text.codePointAt(this.position) ?? 0);
    this.position += character.length;
    return character;
  }

  /** Whether `text` comes next, spaces aside. */
  isBefore(text: string): boolean {
    let at = this.position;
    while (this.#text[at] === " ") at += 1;
    return this.#text.startsWith(text, at);
  }
}
