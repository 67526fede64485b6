import { type Analysis, derive } from "../../../src/core/analysis/index.ts";
import type { Case } from "../../../src/core/case/index.ts";
import type { DoseLine } from "../../../src/core/regimen/index.ts";
import type { SummaryInput } from "../../../src/view/summary/summaryInput.ts";
import { caseBegun } from "../../core/case/caseBegun.ts";
import { orderedLine } from "../../core/case/orderedLine.ts";

/** An invented case for the summary: theophylline 200 mg every 12 hours, one dose missed, two levels, 300 mg proposed. */
export function summaryCase(change: Partial<Case> = {}, medicine = "theophylline"): Case {
  const at = "2026-03-01T08:00:00+00:00";
  const begun = caseBegun("summary-fixture", "Harbour ward 3, bed 12", medicine);
  return {
    ...begun,
    patient: {
      ...begun.patient,
      observations: [
        { id: "w", at, kind: "weight", quantity: { value: 58, unit: "kg" } },
        { id: "c", at, kind: "serumCreatinine", quantity: { value: 83, unit: "umol/L" } },
      ],
      factors: [{ kind: "interacting-medicine", from: "2026-03-03T08:00:00+00:00", detail: "clarithromycin" }],
    },
    window: { ...begun.window, basis: "invented ward window" },
    given: [
      {
        id: "given-1",
        product: "tablet-12h",
        amount: { value: 200, unit: "mg" },
        start: at,
        repeat: { every: { value: 12, unit: "h" } },
        except: [{ index: 3, status: "missed" }],
      },
    ],
    levels: [
      { id: "l1", at: "2026-03-02T19:30:00+00:00", quantity: { value: 6.5, unit: "mg/L" }, kind: "measured" },
      { id: "l2", at: "2026-03-04T07:30:00+00:00", quantity: { value: 5.2, unit: "mg/L" }, kind: "measured" },
    ],
    options: [
      { id: "A", label: "", chosen: true, lines: [orderedLine()] },
      { id: "B", label: "less", chosen: false, lines: [orderedLine({ id: "b", amount: { value: 200, unit: "mg" } })] },
    ],
    ...change,
  };
}

/** The case with one chosen option of these lines. */
export function caseOrdering(lines: readonly DoseLine[], change: Partial<Case> = {}, medicine = "theophylline"): Case {
  return summaryCase({ options: [{ id: "A", label: "", chosen: true, lines: [...lines] }], ...change }, medicine);
}

/** Of the typical patient: as with a medicine record that does not say how much patients differ. */
export function typicalAnalysis(value: Case): Analysis {
  const analysis = derive(value);
  return analysis.fit.kind === "pending" ? { ...analysis, fit: { kind: "none", reason: "no-variability" } } : analysis;
}

/** With the levels fitted: takes seconds, so once a file. */
export function fittedInputOf(value: Case, change: Partial<SummaryInput> = {}): SummaryInput {
  return summaryInputOf(value, { analysis: derive(value, { isFitted: true, isCrossChecked: true }), ...change });
}

export function summaryInputOf(value: Case, change: Partial<SummaryInput> = {}): SummaryInput {
  return {
    case: value,
    analysis: change.analysis ?? typicalAnalysis(value),
    settings: { pageSize: "A4", microgram: "microgram", preparedBy: "" },
    revision: 14,
    saving: { status: "saved", savedAt: Date.UTC(2026, 2, 4, 12, 3), detail: "" },
    analysisStatus: { status: "fresh", revision: 14, failure: null, isFitStale: false },
    hasChanges: true,
    isDragging: false,
    printedAtMs: Date.UTC(2026, 2, 4, 12, 5),
    programVersion: "0.1.0",
    ...change,
  };
}
