import type { Analysis } from "../../../src/core/analysis/index.ts";
import type { Case } from "../../../src/core/case/index.ts";
import { arrayBuffers, failureText } from "../../../src/shell/workers/analysisAnswer.ts";
import type { AnalysisAbandon, AnalysisQuestion, AnalysisReply } from "../../../src/shell/workers/analysisMessages.ts";
import type { WorkerPort } from "../../../src/shell/workers/createAnalysisClient.ts";

/** The page's end of a worker in this process: messages are copied and buffers handed over as a real port does; what it answers, and when, is the test's. */
export class FakeWorker implements WorkerPort {
  onmessage: ((event: MessageEvent) => void) | null = null;
  onerror: ((event: ErrorEvent) => void) | null = null;
  onmessageerror: ((event: MessageEvent) => void) | null = null;
  readonly asked: AnalysisQuestion[] = [];
  readonly abandoned: number[] = [];
  isTerminated = false;

  postMessage(message: unknown): void {
    const copy = structuredClone(message) as AnalysisQuestion | AnalysisAbandon;
    if ("abandon" in copy) this.abandoned.push(copy.abandon);
    else this.asked.push(copy);
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

  /** Answers the last question, in one go. */
  answer(derive: (value: Case) => Analysis): void {
    const { sequence, case: value } = this.asked.at(-1)!;
    try {
      const analysis = derive(value);
      this.say({ sequence, analysis }, arrayBuffers(analysis));
    } catch (error) {
      this.say({ sequence, failure: failureText(error) });
    }
  }

  break(message = "boom"): void {
    this.onerror?.({ message, preventDefault() {} } as ErrorEvent);
  }
}
