import type { KineticsParameter, ModelHistory } from "../kinetics/index.ts";

/** One parameter that differs between patients: value = typical · e^η, η normal about 0. */
export interface RandomParameter {
  readonly name: KineticsParameter;
  /** Standard deviation of η, above 0. */
  readonly omega: number;
}

export interface EstimationLevel {
  /** h, on the clock of the history. */
  readonly time: number;
  /** mg/L; of a level below the limit, the limit. */
  readonly value: number;
  readonly kind: "measured" | "below-limit";
}

export interface Residual {
  /** mg/L, 0 or more. */
  readonly additive: number;
  /** Share of the prediction, 0 or more; one of the two above 0. */
  readonly proportional: number;
}

export type ResidualModel = "normal" | "robust";

/** Levels and a typical patient, of any kind of kinetics: what the engine works on. */
export interface EstimationProblem {
  /** The typical patient's; what happened after the last level does not matter. */
  readonly history: ModelHistory;
  readonly random: readonly RandomParameter[];
  /** Correlations of the η, in the order of `random`, 1 on the diagonal; absent: none. */
  readonly correlation?: readonly (readonly number[])[];
  readonly residual: Residual;
  readonly levels: readonly EstimationLevel[];
  readonly residualModel: ResidualModel;
}

/** The most likely η; numbers only where it converged. */
export type MapEstimate =
  | {
      readonly status: "converged";
      readonly eta: readonly number[];
      readonly objective: number;
      readonly gradientNorm: number;
      /** Of the objective over η. */
      readonly hessian: readonly (readonly number[])[];
      /** mg/L at each level. */
      readonly predictions: readonly number[];
      /** (level − prediction)/residual sd; NaN never: null for a level below the limit. */
      readonly standardisedResiduals: readonly (number | null)[];
      readonly iterations: number;
      /** Other minima found from other starts, by η. */
      readonly otherMinima: readonly { readonly eta: readonly number[]; readonly objective: number }[];
    }
  | { readonly status: "not-converged"; readonly iterations: number; readonly gradientNorm: number };

/** Draws from what the levels leave possible. */
export type Posterior =
  | {
      readonly status: "drawn";
      readonly method: "importance" | "chain";
      /** η of each draw, one array a random parameter. */
      readonly eta: readonly Float64Array[];
      /** Add up to 1. */
      readonly weights: Float64Array;
      readonly paretoK: number | null;
      readonly effectiveSize: number;
      readonly rHat: number | null;
    }
  | { readonly status: "withheld"; readonly paretoK: number; readonly rHat: number; readonly effectiveSize: number };
