export type Operation = (...numbers: number[]) => number;

/** How a sign of a formula is worked out, by the name mathjs's parser gives it. */
export const OPERATORS = {
  add: (a, b) => (a as number) + (b as number),
  subtract: (a, b) => (a as number) - (b as number),
  multiply: (a, b) => (a as number) * (b as number),
  divide: (a, b) => (a as number) / (b as number),
  pow: (a, b) => (a as number) ** (b as number),
  unaryMinus: (a) => -(a as number),
  unaryPlus: (a) => a as number,
} as const satisfies Record<string, Operation>;

export type OperatorName = keyof typeof OPERATORS;

export const COMPARISONS = {
  larger: (a, b) => a > b,
  largerEq: (a, b) => a >= b,
  smaller: (a, b) => a < b,
  smallerEq: (a, b) => a <= b,
  equal: (a, b) => a === b,
} as const satisfies Record<string, (a: number, b: number) => boolean>;

export type ComparisonName = keyof typeof COMPARISONS;

/** Functions a formula may call, with how many arguments they take. `ln` is the natural logarithm. */
export const FUNCTIONS = {
  exp: { call: Math.exp as Operation, least: 1, most: 1 },
  ln: { call: Math.log as Operation, least: 1, most: 1 },
  sqrt: { call: Math.sqrt as Operation, least: 1, most: 1 },
  min: { call: Math.min as Operation, least: 2, most: 8 },
  max: { call: Math.max as Operation, least: 2, most: 8 },
} as const;

export type FunctionName = keyof typeof FUNCTIONS;
export const FORMULA_FUNCTIONS: readonly string[] = Object.keys(FUNCTIONS);

export function isFunctionName(name: string): name is FunctionName {
  return Object.hasOwn(FUNCTIONS, name);
}
