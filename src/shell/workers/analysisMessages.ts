import type { Analysis, DeriveOptions } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";

/** What page and worker say to each other. */
export interface AnalysisQuestion {
  readonly sequence: number;
  readonly case: Case;
  readonly options: DeriveOptions;
}

/** The answer to this question is no longer wanted. */
export interface AnalysisAbandon {
  readonly abandon: number;
}

export type AnalysisReply =
  /** Said once: the worker's code is loaded. Before it, an error means that the worker can't start. */
  | { readonly started: true }
  /** Still at work: the part done, 0 to 1. */
  | { readonly sequence: number; readonly progress: number }
  | { readonly sequence: number; readonly abandoned: true }
  | { readonly sequence: number; readonly analysis: Analysis }
  | { readonly sequence: number; readonly failure: string };
