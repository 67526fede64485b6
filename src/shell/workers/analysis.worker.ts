import "./zodJitless.ts";

import { deriveSteps } from "../../core/analysis/index.ts";
import { analysisAnswer } from "./analysisAnswer.ts";
import type { AnalysisAbandon, AnalysisQuestion, AnalysisReply } from "./analysisMessages.ts";
import { pauseForMessages } from "./pauseForMessages.ts";

interface WorkerScope {
  onmessage: ((event: MessageEvent<AnalysisQuestion | AnalysisAbandon>) => void) | null;
  postMessage(message: AnalysisReply, transfer?: Transferable[]): void;
}
const scope = globalThis as unknown as WorkerScope;

let abandoned = 0;

// Set in the first turn: a question sent while a worker still awaits something is lost.
scope.onmessage = ({ data }) => {
  if ("abandon" in data) {
    abandoned = data.abandon;
    return;
  }
  void analysisAnswer(data, {
    deriveSteps,
    say: (reply, transfer) => scope.postMessage(reply, transfer),
    isAbandoned: (sequence) => abandoned === sequence,
    pause: pauseForMessages,
    clock: () => performance.now(),
  });
};
scope.postMessage({ started: true });
