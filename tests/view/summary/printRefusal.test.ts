// @vitest-environment node
import { describe, expect, it } from "vitest";
import { issueMessage } from "../../../src/core/messages/index.ts";
import { printRefusal } from "../../../src/view/summary/printRefusal.ts";
import type { SummaryInput } from "../../../src/view/summary/summaryInput.ts";
import { orderedLine } from "../../core/case/orderedLine.ts";
import { summaryCase, summaryInputOf } from "./summaryFixture.ts";

const good = summaryInputOf(summaryCase());
const optioned = (options: SummaryInput["case"]["options"]) => summaryInputOf(summaryCase({ options }));
const option = { id: "A", label: "", chosen: true, lines: [orderedLine()] };

const TABLE: readonly (readonly [name: string, input: SummaryInput, code: string | null])[] = [
  ["all is saved and fresh", good, null],
  [
    "the analysis runs",
    { ...good, analysisStatus: { status: "running", revision: 14, failure: null, isFitStale: false } },
    "print-running",
  ],
  [
    "the analysis is of an earlier revision",
    { ...good, analysisStatus: { status: "fresh", revision: 13, failure: null, isFitStale: false } },
    "print-stale",
  ],
  [
    "the fit is of an earlier state",
    { ...good, analysisStatus: { status: "fresh", revision: 14, failure: null, isFitStale: true } },
    "print-fitting",
  ],
  [
    "the levels are being fitted",
    { ...good, analysis: { ...good.analysis, fit: { kind: "pending" } } },
    "print-fitting",
  ],
  ["the case has gone back by undo", { ...good, revision: 15 }, "print-stale"],
  [
    "the analysis failed",
    { ...good, analysisStatus: { status: "failed", revision: 14, failure: "Broken.", isFitStale: false } },
    "print-failed",
  ],
  ["a change is not saved", { ...good, saving: { status: "unsaved", savedAt: null, detail: "" } }, "print-unsaved"],
  ["a change is being saved", { ...good, saving: { status: "saving", savedAt: null, detail: "" } }, "print-unsaved"],
  [
    "saving failed",
    { ...good, saving: { status: "failed", savedAt: null, detail: "The disk is full." } },
    "print-save-failed",
  ],
  [
    "read-only with changes",
    { ...good, saving: { status: "read-only", savedAt: null, detail: "" }, hasChanges: true },
    "print-read-only-changed",
  ],
  [
    "read-only, as opened",
    { ...good, saving: { status: "read-only", savedAt: null, detail: "" }, hasChanges: false },
    null,
  ],
  ["a drag is under way", { ...good, isDragging: true }, "print-dragging"],
  ["no option is chosen", optioned([{ ...option, chosen: false }]), "print-no-option"],
  ["there is no option", optioned([]), "print-no-option"],
  ["two are chosen", optioned([option, { ...option, id: "B" }]), "print-several-options"],
  ["the chosen one is empty", optioned([{ ...option, lines: [] }]), "print-empty-option"],
  [
    "every dose lies before the now line",
    optioned([
      {
        ...option,
        lines: [
          orderedLine({ start: "2026-03-03T20:00:00+00:00", repeat: { every: { value: 12, unit: "h" }, count: 1 } }),
        ],
      },
    ]),
    "print-no-dose-left",
  ],
];

describe("printRefusal", () => {
  it.each(TABLE)("%s", (_, input, code) => {
    expect(printRefusal(input)?.code ?? null).toBe(code);
  });

  it("has a sentence for every refusal, with what was found", () => {
    for (const [, input, code] of TABLE) {
      const refusal = printRefusal(input);
      if (!refusal || code === null) continue;
      const sentence = issueMessage(refusal);
      expect(sentence).toMatch(/^[A-Z].*\.$/s);
      expect(sentence).not.toContain("undefined");
    }
    const refusalOf = (name: string) => issueMessage(printRefusal(TABLE.find(([each]) => each === name)![1])!);
    expect(refusalOf("the analysis failed")).toContain("Broken.");
    expect(refusalOf("saving failed")).toContain("The disk is full.");
  });

  it("a pick of the gravest: stale before unsaved before the order", () => {
    const all = { ...optioned([]), revision: 99, saving: { status: "unsaved" as const, savedAt: null, detail: "" } };
    expect(printRefusal(all)?.code).toBe("print-stale");
    expect(printRefusal({ ...all, revision: 14 })?.code).toBe("print-unsaved");
  });
});
