import type { Analysis } from "../../../src/core/analysis/index.ts";
import type { Case } from "../../../src/core/case/index.ts";
import { analysisAnswer } from "../../../src/shell/workers/analysisAnswer.ts";
import type { AnalysisQuestion, AnalysisReply } from "../../../src/shell/workers/analysisMessages.ts";
import type { WorkerPort } from "../../../src/shell/workers/createAnalysisClient.ts";

/** The page's end of a worker in this process: messages are copied and buffers handed over as a real port does; what it answers, and when, is the test's. */
export class FakeWorker implements WorkerPort {
  onmessage: ((event: MessageEvent) => void) | null = null;
  onerror: ((event: ErrorEvent) => void) | null = null;
  onmessageerror: ((event: MessageEvent) => void) | null = null;
  readonly asked: AnalysisQuestion[] = [];
  isTerminated = false;

  postMessage(message: unknown): void {
    this.asked.push(structuredClone(message) as AnalysisQuestion);
  }

  terminate(): void {
    this.isTerminated = true;
  }

  say(reply: AnalysisReply, transfer: ArrayBuffer[] = []): void {
    const data: unknown = structuredClone(reply, { transfer });
    this.onmessage?.({ data } as MessageEvent);
  }

  start(): void {
    this.say({ started: true });
  }

  /** Answers the last question as analysis.worker.ts does. */
  answer(derive: (value: Case) => Analysis): void {
    const { reply, transfer } = analysisAnswer(this.asked.at(-1)!, derive);
    this.say(reply, transfer);
  }

  break(message = "boom"): void {
    this.onerror?.({ message, preventDefault() {} } as ErrorEvent);
  }
}
