import type { CovariateName } from "./covariates.ts";
import type { ComparisonName, FunctionName, OperatorName } from "./formulaOperations.ts";
import type { Ratio } from "./formulaUnits.ts";

/** A formula as it is worked out: units are checked and gone, what is left of them are the conversions. */
export type FormulaNode =
  | { readonly kind: "number"; readonly value: number }
  | { readonly kind: "covariate"; readonly name: CovariateName }
  /** value · ratio, exact but for one rounding */
  | { readonly kind: "convert"; readonly by: Ratio; readonly of: FormulaNode }
  | { readonly kind: "operator"; readonly name: OperatorName; readonly of: readonly FormulaNode[] }
  | { readonly kind: "function"; readonly name: FunctionName; readonly of: readonly FormulaNode[] }
  | {
      readonly kind: "comparison";
      readonly name: ComparisonName;
      readonly left: FormulaNode;
      readonly right: FormulaNode;
    }
  | {
      readonly kind: "condition";
      readonly test: FormulaNode;
      readonly whenTrue: FormulaNode;
      readonly whenFalse: FormulaNode;
    };
