import type { Analysis } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { issueMessage } from "../../core/messages/index.ts";
import { issue } from "../../core/result/index.ts";
import type { AnalysisAnswer, AnalysisRunner } from "./ports.ts";
import type { AnalysisState } from "./workbenchState.ts";

export const ANALYSIS_NONE: AnalysisState = {
  result: null,
  revision: 0,
  ofPreview: false,
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

/**
 * Asks for the analysis of each state and reports what may be shown. The last good result is kept until a later one is there; a result older
 * than the one shown, of a cancelled preview, or of a case no longer open is dropped. "fresh" is said only of the newest state asked about.
 */
export function createAnalysisFeed(
  runner: AnalysisRunner,
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

  function say(change: Partial<AnalysisState>): void {
    state = { ...state, ...change };
    report(state);
  }

  /** The second road to a settled result; put in its place if nothing has been asked since, without any other sign. */
  function crossCheckSoon(value: Case, revision: number, question: number): void {
    settling = setTimeout(async () => {
      const answer = await answerSafely(runner, value, { isCrossChecked: true });
      if (!answer?.ok || isStopped || question !== asked) return;
      own = { analysis: answer.analysis, revision };
      say({ result: answer.analysis });
    }, settleMs);
  }

  async function request(value: Case, revision: number, ofPreview: boolean): Promise<void> {
    const question = ++asked;
    clearTimeout(settling);
    say({ status: "running", failure: null });
    const answer = await answerSafely(runner, value);
    if (answer === null || isStopped) return;
    if (answer.ok && !ofPreview && revision >= (own?.revision ?? 0)) own = { analysis: answer.analysis, revision };
    const isLate = question < shown || (ofPreview && question <= cancelled);
    if (isLate) return;
    if (answer.ok) {
      shown = question;
      say({ result: answer.analysis, revision, ofPreview, status: question === asked ? "fresh" : "running" });
      if (question === asked && !ofPreview) crossCheckSoon(value, revision, question);
    } else if (question === asked) {
      say({ status: "failed", failure: issueMessage(issue(FAILURE_CODES[answer.reason], { detail: answer.detail })) });
    }
  }

  return {
    ask: (value, revision) => void request(value, revision, false),
    askPreview: (value, revision) => void request(value, revision, true),
    cancelPreview(value, revision) {
      cancelled = asked;
      if (own?.revision !== revision) {
        void request(value, revision, false);
        return;
      }
      shown = ++asked;
      say({ result: own.analysis, revision, ofPreview: false, status: "fresh", failure: null });
    },
    stop() {
      isStopped = true;
      clearTimeout(settling);
    },
  };
}

async function answerSafely(
  runner: AnalysisRunner,
  value: Case,
  options?: { readonly isCrossChecked: boolean },
): Promise<AnalysisAnswer | null> {
  try {
    return await (options ? runner.run(value, options) : runner.run(value));
  } catch (error) {
    return { ok: false, reason: "failed", detail: String(error) };
  }
}
