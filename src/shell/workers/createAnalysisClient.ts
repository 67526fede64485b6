import type { Analysis } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { analysisAnswer, type Derive, failureText } from "./analysisAnswer.ts";
import type { AnalysisQuestion, AnalysisReply } from "./analysisMessages.ts";

/** As long as one analysis may take before the worker is stopped and started again, ms. A full case takes well below a second. */
export const ANALYSIS_DEADLINE = 10_000;

/** What is used of a Worker. */
export interface WorkerPort {
  onmessage: ((event: MessageEvent) => void) | null;
  onerror: ((event: ErrorEvent) => void) | null;
  onmessageerror: ((event: MessageEvent) => void) | null;
  postMessage(message: unknown): void;
  terminate(): void;
}

type Answer =
  | { readonly ok: true; readonly analysis: Analysis }
  | { readonly ok: false; readonly reason: "deadline" | "failed"; readonly detail: string };

interface Job {
  readonly question: AnalysisQuestion;
  readonly answer: (answer: Answer | null) => void;
}

export interface AnalysisClient {
  run(value: Case, options?: { readonly isCrossChecked?: boolean }): Promise<Answer | null>;
  readonly where: "worker" | "page";
  stop(): void;
}

/**
 * Runs analyses in a worker: one at a time, the latest waiting, those overtaken while they waited answered `null`. One that passes the deadline
 * is stopped with its worker. A worker that cannot start at all is given up, and the page does the same work with the same code.
 */
export function createAnalysisClient(setting: {
  readonly startWorker: () => WorkerPort;
  readonly loadDerive: () => Promise<Derive>;
  readonly deadline?: number;
}): AnalysisClient {
  const deadline = setting.deadline ?? ANALYSIS_DEADLINE;
  let worker: WorkerPort | null = null;
  /** The worker's code has been seen to load, in this or an earlier worker. */
  let hasStarted = false;
  let isOnPage = false;
  let sequence = 0;
  let running: Job | null = null;
  let waiting: Job | null = null;
  let timer: ReturnType<typeof setTimeout> | undefined;

  function next(): void {
    running = waiting;
    waiting = null;
    if (!running) return;
    if (isOnPage) void runOnPage(running);
    else runInWorker(running);
  }

  function finish(answer: Answer): void {
    clearTimeout(timer);
    const job = running;
    running = null;
    job?.answer(answer);
    next();
  }

  function runInWorker(job: Job): void {
    try {
      worker ??= listen(setting.startWorker());
      worker.postMessage(job.question);
    } catch (error) {
      dropWorker();
      // A case that can't be copied would fail in every worker; a worker that can't be made is another matter.
      if (hasStarted) finish({ ok: false, reason: "failed", detail: failureText(error) });
      else goToPage(job);
      return;
    }
    timer = setTimeout(() => {
      dropWorker();
      if (hasStarted) finish({ ok: false, reason: "deadline", detail: `${deadline} ms` });
      else goToPage(job);
    }, deadline);
  }

  function listen(port: WorkerPort): WorkerPort {
    port.onmessage = ({ data }: MessageEvent<AnalysisReply>) => {
      if (port !== worker) return;
      hasStarted = true;
      if ("started" in data || data.sequence !== running?.question.sequence) return;
      finish(
        "analysis" in data
          ? { ok: true, analysis: data.analysis }
          : { ok: false, reason: "failed", detail: data.failure },
      );
    };
    const broken = (detail: string): void => {
      if (port !== worker) return;
      dropWorker();
      if (!running) return;
      if (hasStarted) finish({ ok: false, reason: "failed", detail });
      else goToPage(running);
    };
    port.onerror = (event) => {
      event.preventDefault?.();
      broken(event.message || "the worker stopped");
    };
    port.onmessageerror = () => broken("the worker's answer could not be read");
    return port;
  }

  function dropWorker(): void {
    clearTimeout(timer);
    worker?.terminate();
    worker = null;
  }

  function goToPage(job: Job): void {
    isOnPage = true;
    void runOnPage(job);
  }

  async function runOnPage(job: Job): Promise<void> {
    try {
      const derive = await setting.loadDerive();
      const { reply } = analysisAnswer(job.question, derive);
      finish(
        "analysis" in reply
          ? { ok: true, analysis: reply.analysis }
          : { ok: false, reason: "failed", detail: "failure" in reply ? reply.failure : "" },
      );
    } catch (error) {
      finish({ ok: false, reason: "failed", detail: failureText(error) });
    }
  }

  return {
    run(value, { isCrossChecked = false } = {}) {
      return new Promise((resolve) => {
        waiting?.answer(null);
        sequence += 1;
        waiting = { question: { sequence, case: value, isCrossChecked }, answer: resolve };
        if (!running) next();
      });
    },
    get where() {
      return isOnPage ? "page" : "worker";
    },
    stop() {
      dropWorker();
      waiting?.answer(null);
      running?.answer(null);
      waiting = null;
      running = null;
    },
  };
}
