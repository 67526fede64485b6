import type { Analysis } from "../../../src/core/analysis/index.ts";
import type { Case } from "../../../src/core/case/index.ts";
import type { AnalysisAnswer, AnalysisRunner } from "../../../src/shell/store/ports.ts";
import { type Deferred, deferred } from "./deferred.ts";

/** A runner whose every answer is given by hand, in any order. */
export class HandRunner implements AnalysisRunner {
  readonly where = "worker";
  readonly asked: { readonly value: Case; readonly answer: Deferred<AnalysisAnswer | null> }[] = [];

  run(value: Case): Promise<AnalysisAnswer | null> {
    const answer = deferred<AnalysisAnswer | null>();
    this.asked.push({ value, answer });
    return answer.promise;
  }

  /** The answer to the nth question is an analysis that can be told from others by `fingerprint`. */
  answer(nth: number, fingerprint = `${this.asked[nth]!.value.label}`): void {
    this.asked[nth]!.answer.resolve({ ok: true, analysis: { fingerprint } as Analysis });
  }
}
