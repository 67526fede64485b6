import type { Analysis } from "../../../src/core/analysis/index.ts";
import type { Case } from "../../../src/core/case/index.ts";
import type { AnalysisAnswer, AnalysisDepth, AnalysisRunner } from "../../../src/shell/store/ports.ts";
import { type Deferred, deferred } from "./deferred.ts";

/** A runner whose every answer is given by hand, in any order. */
export class HandRunner implements AnalysisRunner {
  readonly where = "worker";
  readonly asked: {
    readonly value: Case;
    readonly options: AnalysisDepth;
    readonly answer: Deferred<AnalysisAnswer | null>;
  }[] = [];

  run(value: Case, options: AnalysisDepth = {}): Promise<AnalysisAnswer | null> {
    const answer = deferred<AnalysisAnswer | null>();
    this.asked.push({ value, options, answer });
    return answer.promise;
  }

  /** The answer to the nth question is an analysis that can be told from others by `fingerprint`. */
  answer(nth: number, fingerprint = `${this.asked[nth]!.value.label}`, parts: Partial<Analysis> = {}): void {
    this.asked[nth]!.answer.resolve({ ok: true, analysis: { fingerprint, ...parts } as Analysis });
  }
}
