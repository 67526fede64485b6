import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  caseDiff,
  caseEdit,
  caseParse,
  casePrint,
  caseValidate,
  diffApply,
  diffInvert,
  EDIT_NAMES,
  type EditName,
} from "../../../src/core/case/index.ts";
import { editStep, stepApply } from "./randomEdits.ts";
import { sampleCase } from "./sampleCase.ts";

describe("random sequences of random edits", () => {
  it("leave cases that open again, print alike, and are led back by their inverted differences", () => {
    const seen = new Set<EditName>();
    fc.assert(
      fc.property(fc.array(editStep, { minLength: 1, maxLength: 12 }), (steps) => {
        const first = sampleCase();
        const states = [first];
        for (const step of steps) states.push(stepApply(states.at(-1)!, step, seen));
        const diffs = states.slice(1).map((after, i) => caseDiff(states[i]!, after));

        states.slice(1).forEach((after, i) => {
          const before = states[i]!;
          expect(diffApply(diffs[i]!, before)).toEqual(after);
          expect(diffApply(diffInvert(diffs[i]!), after)).toEqual(before);
        });
        // Undone one by one from the end, then done again.
        const undone = diffs.reduceRight((value, diff) => diffApply(diffInvert(diff), value), states.at(-1)!);
        expect(undone).toEqual(first);
        expect(diffs.reduce((value, diff) => diffApply(diff, value), undone)).toEqual(states.at(-1));
        // In one leap.
        expect(diffApply(caseDiff(first, states.at(-1)!), first)).toEqual(states.at(-1));

        const last = states.at(-1)!;
        expect(caseValidate(last)).toEqual({ ok: true, value: last });
        const text = casePrint(last);
        expect(caseParse(text)).toEqual({ ok: true, value: last });
        expect(casePrint(structuredClone(last))).toBe(text);
        expect(sampleCase()).toEqual(first);
      }),
      { seed: 20260304, numRuns: 80 },
    );
    // Every edit took part.
    expect([...seen].sort()).toEqual([...EDIT_NAMES].sort());
  }, 60_000);
});

describe("caseDiff", () => {
  const before = sampleCase();

  it("is empty for the same case and for an equal one", () => {
    expect(caseDiff(before, before)).toEqual([]);
    expect(caseDiff(before, structuredClone(before))).toEqual([]);
  });

  it("names only what changed", () => {
    const after = caseEdit(before, "levelExclude", { id: "l1", reason: "late" });
    expect(caseDiff(before, after)).toEqual([
      { path: ["levels", 0, "excluded"], from: "absent", to: { value: "late" } },
    ]);
  });

  it("a diff does not fit another case", () => {
    const diff = caseDiff(before, caseEdit(before, "caseRename", { label: "new" }));
    const other = caseEdit(before, "caseRename", { label: "other" });
    expect(() => diffApply(diff, other)).toThrow(/label/);
    const added = caseDiff(before, caseEdit(before, "levelExclude", { id: "l1", reason: "late" }));
    expect(() => diffApply(added, caseEdit(before, "levelRemove", { id: "l1" }))).toThrow(RangeError);
  });

  it("shares what it does not touch", () => {
    const after = caseEdit(before, "caseRename", { label: "new" });
    const back = diffApply(diffInvert(caseDiff(before, after)), after);
    expect(back.medicine).toBe(before.medicine);
    expect(back.levels).toBe(before.levels);
  });
});
