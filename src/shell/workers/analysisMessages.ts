import type { Analysis } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";

/** What page and worker say to each other. */
export interface AnalysisQuestion {
  readonly sequence: number;
  readonly case: Case;
  /** The cross-check too, which takes many times as long. */
  readonly isCrossChecked: boolean;
}

export type AnalysisReply =
  /** Said once: the worker's code is loaded. Before it, an error means that the worker can't start. */
  | { readonly started: true }
  | { readonly sequence: number; readonly analysis: Analysis }
  | { readonly sequence: number; readonly failure: string };
