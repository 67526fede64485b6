import { type Issue, issue } from "../../core/result/index.ts";
import type { SummaryInput } from "./summaryInput.ts";

type Asked = Pick<
  SummaryInput,
  "case" | "analysis" | "revision" | "saving" | "analysisStatus" | "hasChanges" | "isDragging"
>;

/**
 * Why the summary is not to be printed now; null when it may be.
 * A sheet outlives the screen, so what is on it must be worked out from what is on disk: no stale figures, nothing unsaved, exactly one option chosen.
 * A read-only tab may print what it opened; once it holds changes of its own, nobody could find the case behind the sheet again.
 */
export function printRefusal(asked: Asked): Issue | null {
  return changeRefusal(asked) ?? analysisRefusal(asked) ?? savingRefusal(asked) ?? optionRefusal(asked);
}

function changeRefusal({ isDragging }: Asked): Issue | null {
  return isDragging ? issue("print-dragging") : null;
}

function analysisRefusal({ analysis, analysisStatus, revision }: Asked): Issue | null {
  if (analysisStatus.status === "running") return issue("print-running");
  if (analysisStatus.isFitStale || analysis.fit.kind === "pending") return issue("print-fitting");
  if (analysisStatus.status === "failed") return issue("print-failed", { detail: analysisStatus.failure ?? "" });
  return analysisStatus.revision === revision ? null : issue("print-stale");
}

function savingRefusal({ saving, hasChanges }: Asked): Issue | null {
  switch (saving.status) {
    case "saved":
      return null;
    case "read-only":
      return hasChanges ? issue("print-read-only-changed") : null;
    case "failed":
      return issue("print-save-failed", { detail: saving.detail });
    case "unsaved":
    case "saving":
      return issue("print-unsaved");
  }
}

function optionRefusal({ case: value, analysis }: Asked): Issue | null {
  const chosen = value.options.filter((option) => option.chosen);
  const [option] = chosen;
  if (!option) return issue("print-no-option");
  if (chosen.length > 1) return issue("print-several-options", { options: chosen.map(({ id }) => id).join(", ") });
  if (option.lines.length === 0) return issue("print-empty-option", { option: option.id });
  const result = analysis.options.find(({ id }) => id === option.id);
  return result?.doses.some((dose) => dose.countedMg > 0) ? null : issue("print-no-dose-left", { option: option.id });
}
