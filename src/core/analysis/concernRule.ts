import type { Case } from "../case/index.ts";
import type { Issue } from "../result/index.ts";
import type { AnalysisClock } from "./analysisClock.ts";
import type {
  Concern,
  CrossCheck,
  DoseMark,
  Gravity,
  LevelResult,
  Model,
  OptionResult,
  PatientFigures,
} from "./analysisTypes.ts";
import type { FitState } from "./fitTypes.ts";

/** All a rule may look at. */
export interface ConcernContext {
  readonly case: Case;
  readonly clock: AnalysisClock;
  readonly patient: PatientFigures;
  readonly model: Model | null;
  readonly modelIssues: readonly Issue[];
  readonly given: readonly DoseMark[];
  readonly lineIssues: readonly { readonly lane: string; readonly lineId: string; readonly issue: Issue }[];
  readonly levels: readonly LevelResult[];
  readonly fit: FitState;
  readonly options: readonly OptionResult[];
  readonly crossCheck: CrossCheck | null;
}

/** One rule a file in concerns/; a new one adds its file, one line in caseConcerns.ts and its sentence in core/messages. */
export type ConcernRule = (context: ConcernContext) => readonly Concern[];

export function concern(code: string, gravity: Gravity, about: Concern["about"], data: Concern["data"] = {}): Concern {
  return { id: about.id === undefined ? code : `${code}:${about.id}`, code, gravity, about, data };
}

/** An elapsed hour as epoch milliseconds, for sentences that name a clock time. */
export function clockMs(context: ConcernContext, hours: number): number {
  return context.clock.originMs + hours * 3_600_000;
}
