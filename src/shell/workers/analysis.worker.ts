import "./zodJitless.ts";

import { derive } from "../../core/analysis/index.ts";
import { analysisAnswer } from "./analysisAnswer.ts";
import type { AnalysisReply } from "./analysisMessages.ts";

interface WorkerScope {
  onmessage: ((event: MessageEvent) => void) | null;
  postMessage(message: AnalysisReply, transfer?: Transferable[]): void;
}
const scope = globalThis as unknown as WorkerScope;

// Set in the first turn: a question sent while a worker still awaits something is lost.
scope.onmessage = ({ data }) => {
  const { reply, transfer } = analysisAnswer(data, derive);
  scope.postMessage(reply, transfer);
};
scope.postMessage({ started: true });
