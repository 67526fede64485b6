import { readFileSync } from "node:fs";
import { expect, test } from "vitest";
import { derive } from "../../../src/core/analysis/index.ts";
import { caseParse } from "../../../src/core/case/index.ts";
import { analysisAnswer, arrayBuffers } from "../../../src/shell/workers/analysisAnswer.ts";

test("each buffer is named once, wherever it stands and however often", () => {
  const shared = new Float64Array([1, 2]);
  const other = new Float64Array([3]);
  expect(arrayBuffers({ a: shared, b: [{ c: shared }, null, "text", other] })).toEqual([shared.buffer, other.buffer]);
});

test("arrays are handed over, not copied, and nothing kept by the analysis is taken away with them", () => {
  const parsed = caseParse(readFileSync("demo-data/adjustment.ebbline.json", "utf8"));
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.issues));
  const answers = [0, 1].map((sequence) => {
    const { reply, transfer } = analysisAnswer({ sequence, case: parsed.value, isCrossChecked: false }, derive);
    expect(transfer.length).toBeGreaterThan(1);
    const received = structuredClone(reply, { transfer });
    expect(transfer.every((buffer) => buffer.byteLength === 0)).toBe(true);
    return "analysis" in received ? received.analysis : null;
  });
  // The second analysis, made after the first's arrays were handed over, is the same: none of them was shared.
  expect(answers[1]).toEqual(answers[0]);
  expect(answers[1]?.givenCurve?.values.length).toBeGreaterThan(10);
});
