import type { Analysis, DeriveOptions } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { analysisAnswer, type DeriveSteps, failureText } from "./analysisAnswer.ts";
import type { AnalysisAbandon, AnalysisQuestion, AnalysisReply } from "./analysisMessages.ts";
import { pauseForMessages } from "./pauseForMessages.ts";

/** As long as an analysis may take without a sign of progress before the worker is stopped and started again, ms. */
export const ANALYSIS_DEADLINE = 10_000;

/** So long an overtaken analysis may go on: most are done by then, and something follows a drag. ms */
export const ABANDON_AFTER = 600;

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
  readonly onProgress: (part: number) => void;
  /** When its work began, ms. */
  since: number;
  /** It has been said that its answer is no longer wanted. */
  isAbandoned: boolean;
}

export interface RunOptions extends DeriveOptions {
  /** Part done, 0 to 1, of work that takes its time. */
  readonly onProgress?: (part: number) => void;
}

export interface AnalysisClient {
  run(value: Case, options?: RunOptions): Promise<Answer | null>;
  readonly where: "worker" | "page";
  stop(): void;
}

/**
 * Runs analyses in a worker: one at a time, the latest waiting, those overtaken answered `null`: at once while they waited, and
 * while they run once they have run for ABANDON_AFTER. One that passes the deadline is stopped with its worker. A worker that cannot start at all is given up, and the page does the same work with the same code.
 */
export function createAnalysisClient(setting: {
  readonly startWorker: () => WorkerPort;
  readonly loadDeriveSteps: () => Promise<DeriveSteps>;
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
    running.since = performance.now();
    if (isOnPage) void runOnPage(running);
    else runInWorker(running);
  }

  function finish(answer: Answer | null): void {
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
    startTimer(job);
  }

  function startTimer(job: Job): void {
    clearTimeout(timer);
    timer = setTimeout(() => {
      dropWorker();
      if (hasStarted) finish({ ok: false, reason: "deadline", detail: `${deadline} ms` });
      else goToPage(job);
    }, deadline);
  }

  function hear(reply: AnalysisReply): void {
    if ("started" in reply || !running || reply.sequence !== running.question.sequence) return;
    if ("progress" in reply) {
      if (!isOnPage) startTimer(running);
      running.onProgress(reply.progress);
      abandonIfOvertaken(running);
    } else if ("abandoned" in reply) finish(null);
    else if ("analysis" in reply) finish({ ok: true, analysis: reply.analysis });
    else finish({ ok: false, reason: "failed", detail: reply.failure });
  }

  /** Overtaken and long at work: it stops at the end of its slice. */
  function abandonIfOvertaken(job: Job): void {
    if (!waiting || job.isAbandoned || performance.now() - job.since < ABANDON_AFTER) return;
    job.isAbandoned = true;
    const message: AnalysisAbandon = { abandon: job.question.sequence };
    if (!isOnPage) worker?.postMessage(message);
  }

  function listen(port: WorkerPort): WorkerPort {
    port.onmessage = ({ data }: MessageEvent<AnalysisReply>) => {
      if (port !== worker) return;
      hasStarted = true;
      hear(data);
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
      const deriveSteps = await setting.loadDeriveSteps();
      await analysisAnswer(job.question, {
        deriveSteps,
        say: (reply) => {
          if (job === running) hear(reply);
        },
        isAbandoned: () => job.isAbandoned,
        pause: pauseForMessages,
        clock: () => performance.now(),
      });
    } catch (error) {
      finish({ ok: false, reason: "failed", detail: failureText(error) });
    }
  }

  return {
    run(value, { onProgress = () => {}, ...options } = {}) {
      return new Promise((resolve) => {
        waiting?.answer(null);
        sequence += 1;
        waiting = {
          question: { sequence, case: value, options },
          answer: resolve,
          onProgress,
          since: 0,
          isAbandoned: false,
        };
        if (running) abandonIfOvertaken(running);
        else next();
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
