import type { Analysis, DeriveOptions } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import type { AnalysisQuestion, AnalysisReply } from "./analysisMessages.ts";

export type Derive = (value: Case, options: DeriveOptions) => Analysis;

/** The reply to a question, and what of it is handed over instead of copied. A failure is an answer, never thrown. */
export function analysisAnswer(
  { sequence, case: value, isCrossChecked }: AnalysisQuestion,
  derive: Derive,
): { readonly reply: AnalysisReply; readonly transfer: ArrayBuffer[] } {
  try {
    const analysis = derive(value, { isCrossChecked });
    return { reply: { sequence, analysis }, transfer: arrayBuffers(analysis) };
  } catch (error) {
    return { reply: { sequence, failure: failureText(error) }, transfer: [] };
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
