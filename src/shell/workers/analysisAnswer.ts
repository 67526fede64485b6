import type { Analysis, DeriveOptions } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import type { AnalysisQuestion, AnalysisReply } from "./analysisMessages.ts";

/** `deriveSteps` of core/analysis: yields the part done between steps, returns the analysis. */
export type DeriveSteps = (value: Case, options: DeriveOptions) => Generator<number, Analysis>;

/** Longest stretch of work without listening for what the page says, ms. */
const SLICE_MS = 12;
/** How often progress is told, ms. */
const PROGRESS_MS = 100;

export interface AnswerSetting {
  readonly deriveSteps: DeriveSteps;
  readonly say: (reply: AnalysisReply, transfer: ArrayBuffer[]) => void;
  readonly isAbandoned: (sequence: number) => boolean;
  /** Lets waiting messages in. */
  readonly pause: () => Promise<void>;
  readonly clock: () => number;
}

/** Works a question out in slices, telling progress, until it is done or abandoned. A failure is an answer, never thrown. */
export async function analysisAnswer(
  { sequence, case: value, options }: AnalysisQuestion,
  { deriveSteps, say, isAbandoned, pause, clock }: AnswerSetting,
): Promise<void> {
  try {
    const steps = deriveSteps(value, options);
    let since = clock();
    let told = since;
    for (;;) {
      const step = steps.next();
      if (step.done) {
        say({ sequence, analysis: step.value }, arrayBuffers(step.value));
        return;
      }
      const now = clock();
      if (now - since < SLICE_MS) continue;
      if (now - told >= PROGRESS_MS) {
        told = now;
        say({ sequence, progress: step.value }, []);
      }
      await pause();
      if (isAbandoned(sequence)) {
        say({ sequence, abandoned: true }, []);
        return;
      }
      since = clock();
    }
  } catch (error) {
    say({ sequence, failure: failureText(error) }, []);
  }
}

export function failureText(error: unknown): string {
  return error instanceof Error ? `${error.name}: ${error.message}` : String(error);
}

/** Every buffer under a Float64Array in it, each once: naming one twice in a transfer throws. */
export function arrayBuffers(value: unknown): ArrayBuffer[] {
  const found = new Set<ArrayBuffer>();
  const visit = (part: unknown): void => {
    if (part instanceof Float64Array) {
      if (part.buffer instanceof ArrayBuffer) found.add(part.buffer);
    } else if (typeof part === "object" && part !== null) {
      for (const each of Object.values(part)) visit(each);
    }
  };
  visit(value);
  return [...found];
}
