import type { Case } from "../case/index.ts";
import type { AnalysisClock } from "./analysisClock.ts";
import type { DoseMark, LevelResult, Model, OptionResult } from "./analysisTypes.ts";
import type { Band, FitState } from "./fitTypes.ts";

export interface IndividualInput {
  readonly typical: Model | null;
  readonly given: readonly DoseMark[];
  readonly levels: readonly LevelResult[];
  readonly options: readonly OptionResult[];
  /** End of the curve of what was given. */
  readonly givenUntilH: number;
  readonly clock: AnalysisClock;
  readonly isFitted: boolean;
}

export interface IndividualOutput {
  readonly fit: FitState;
  readonly givenBand: Band | null;
  readonly levels: readonly LevelResult[];
  readonly options: readonly OptionResult[];
}

/** What the levels make of this patient; yields the part done, 0 to 1. */
// biome-ignore lint/correctness/useYield: the steps follow with the engine
export function* individualSteps(_value: Case, input: IndividualInput): Generator<number, IndividualOutput> {
  const { levels, options } = input;
  return { fit: { kind: "none", reason: "no-levels" }, givenBand: null, levels, options };
}
