import { type Analysis, crossCheckAdded } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { issueMessage } from "../../core/messages/index.ts";
import { issue } from "../../core/result/index.ts";
import { fitCarried } from "./fitCarried.ts";
import type { AnalysisAnswer, AnalysisDepth, AnalysisRunner } from "./ports.ts";
import type { AnalysisState } from "./workbenchState.ts";

export const ANALYSIS_NONE: AnalysisState = {
  result: null,
  revision: 0,
  ofPreview: false,
  isFitStale: false,
  fitProgress: null,
  status: "running",
  failure: null,
};

/** So long without a newer question is a settled edit; the cross-check is then made. ms */
export const SETTLE_MS = 400;

const FAILURE_CODES = { deadline: "analysis-deadline", failed: "analysis-failed" } as const;

export interface AnalysisFeed {
  ask(value: Case, revision: number): void;
  /** Of a drag in progress: shown, then thrown away. */
  askPreview(value: Case, revision: number): void;
  /** Back to the case itself. */
  cancelPreview(value: Case, revision: number): void;
  stop(): void;
}

/** A state of the case that was asked about. The number is how new it is. */
interface Question {
  readonly number: number;
  readonly value: Case;
  readonly revision: number;
  readonly ofPreview: boolean;
}

/**
 * Asks for the analysis of each state and reports what may be shown. First the typical patient, at once; then what the levels make of this
 * patient, which takes longer and has a runner of its own; then the cross-check. The last good result is kept until a later one is there; a
 * result older than the one shown, of a cancelled preview, or of a case no longer open is dropped. "fresh" is said only of the newest state
 * asked about. Until its fit is there an earlier one stands in its place, marked stale.
 */
export function createAnalysisFeed(
  { runner, fitter }: { readonly runner: AnalysisRunner; readonly fitter: AnalysisRunner },
  report: (state: AnalysisState) => void,
  settleMs: number = SETTLE_MS,
): AnalysisFeed {
  let state = ANALYSIS_NONE;
  /** Counts what was asked; an answer is as new as its question. */
  let asked = 0;
  let shown = 0;
  let cancelled = 0;
  let isStopped = false;
  let settling: ReturnType<typeof setTimeout> | undefined;
  /** The newest result of the case itself. */
  let own: { readonly analysis: Analysis; readonly revision: number } | null = null;
  /** The newest result with a fit, whichever state it is of, and how new. */
  let fitted: { readonly analysis: Analysis; readonly number: number } | null = null;

  function say(change: Partial<AnalysisState>): void {
    state = { ...state, ...change };
    report(state);
  }

  const isNewest = ({ number }: Question): boolean => number === asked && !isStopped;
  const isDropped = ({ number, ofPreview }: Question): boolean => isStopped || (ofPreview && number <= cancelled);

  function keep({ revision, ofPreview }: Question, analysis: Analysis): void {
    if (!ofPreview && revision >= (own?.revision ?? 0)) own = { analysis, revision };
  }

  async function request(question: Question): Promise<void> {
    clearTimeout(settling);
    say({ status: "running", failure: null, fitProgress: null });
    const answer = await answerSafely(runner, question.value);
    if (answer === null || isStopped) return;
    if (answer.ok) keep(question, answer.analysis);
    if (question.number < shown || isDropped(question)) return;
    if (!answer.ok) {
      if (isNewest(question)) fail(answer);
      return;
    }
    shown = question.number;
    const { revision, ofPreview } = question;
    const result = fitCarried(answer.analysis, fitted?.analysis ?? null);
    const status = isNewest(question) ? "fresh" : "running";
    say({ result, revision, ofPreview, status, isFitStale: result !== answer.analysis });
    if (isNewest(question)) follow(question, answer.analysis);
  }

  /** What comes after the typical patient is on the screen. */
  function follow(question: Question, analysis: Analysis): void {
    if (analysis.fit?.kind === "pending") void requestFit(question);
    else if (!question.ofPreview) crossCheckSoon(question, analysis);
  }

  async function requestFit(question: Question): Promise<void> {
    const onProgress = (part: number): void => {
      if (isNewest(question)) say({ fitProgress: part });
    };
    const answer = await answerSafely(fitter, question.value, { isFitted: true, onProgress });
    if (answer === null || isDropped(question)) return;
    if (!answer.ok) {
      if (isNewest(question)) fail(answer);
      return;
    }
    keep(question, answer.analysis);
    if (question.number < (fitted?.number ?? 0)) return;
    fitted = { analysis: answer.analysis, number: question.number };
    if (isNewest(question)) {
      say({ result: answer.analysis, isFitStale: false, fitProgress: null });
      if (!question.ofPreview) crossCheckSoon(question, answer.analysis);
    } else if (state.result !== null && (state.isFitStale || state.result.fit?.kind === "pending")) {
      say({ result: fitRenewed(state.result, answer.analysis), isFitStale: true });
    }
  }

  /** The second road to a settled result; put in its place if nothing has been asked since, without any other sign. */
  function crossCheckSoon(question: Question, settled: Analysis): void {
    settling = setTimeout(async () => {
      const answer = await answerSafely(fitter, question.value, { isCrossChecked: true });
      if (!answer?.ok || !isNewest(question)) return;
      const result = crossCheckAdded(settled, answer.analysis);
      keep(question, result);
      say({ result });
    }, settleMs);
  }

  function fail(answer: Extract<AnalysisAnswer, { ok: false }>): void {
    const failure = issueMessage(issue(FAILURE_CODES[answer.reason], { detail: answer.detail }));
    say({ status: "failed", failure, fitProgress: null });
  }

  const ask = (value: Case, revision: number, ofPreview: boolean): void => {
    asked += 1;
    void request({ number: asked, value, revision, ofPreview });
  };

  return {
    ask: (value, revision) => ask(value, revision, false),
    askPreview: (value, revision) => ask(value, revision, true),
    cancelPreview(value, revision) {
      cancelled = asked;
      if (own?.revision !== revision) {
        ask(value, revision, false);
        return;
      }
      asked += 1;
      shown = asked;
      const result = fitCarried(own.analysis, fitted?.analysis ?? null);
      const isFitStale = result !== own.analysis;
      say({ result, revision, ofPreview: false, status: "fresh", failure: null, isFitStale, fitProgress: null });
      follow({ number: asked, value, revision, ofPreview: false }, own.analysis);
    },
    stop() {
      isStopped = true;
      clearTimeout(settling);
    },
  };
}

/** The stand-in fit of a result, put newer. */
function fitRenewed(shown: Analysis, from: Analysis): Analysis {
  return fitCarried({ ...shown, fit: { kind: "pending" } }, from);
}

async function answerSafely(
  runner: AnalysisRunner,
  value: Case,
  options?: AnalysisDepth,
): Promise<AnalysisAnswer | null> {
  try {
    return await runner.run(value, options);
  } catch (error) {
    return { ok: false, reason: "failed", detail: error instanceof Error ? error.message : String(error) };
  }
}
