import { type Analysis, derive } from "../../../src/core/analysis/index.ts";
import type { AnalysisRunner } from "../../../src/shell/store/ports.ts";

/** A runner whose answer is the real typical analysis, changed by hand. */
export function fittedRunner(change: (typical: Analysis) => Analysis): AnalysisRunner {
  return { where: "page", run: async (value) => ({ ok: true, analysis: change(derive(value)) }) };
}
