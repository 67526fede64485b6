import type { Analysis } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import type { AnalysisState, OpenCase, Saving, Settings } from "../../shell/store/workbenchState.ts";

/** All the summary is made of. The clock and the program's version are handed in; nothing is looked up. */
export interface SummaryInput {
  readonly case: Case;
  readonly analysis: Analysis;
  readonly settings: Settings;
  readonly revision: number;
  readonly saving: Pick<Saving, "status" | "detail" | "savedAt">;
  readonly analysisStatus: Pick<AnalysisState, "status" | "revision" | "failure" | "isFitStale">;
  /** Something was changed since the case was opened, undone or not. */
  readonly hasChanges: boolean;
  /** A drag is under way: what is shown is not yet an edit. */
  readonly isDragging: boolean;
  readonly printedAtMs: number;
  readonly programVersion: string;
}

/** null while there is no result at all. */
export function summaryInput(
  open: OpenCase,
  settings: Settings,
  printedAtMs: number,
  programVersion: string,
): SummaryInput | null {
  const { result, ...analysisStatus } = open.analysis;
  if (!result) return null;
  return {
    case: open.value,
    analysis: result,
    settings,
    revision: open.revision,
    saving: open.saving,
    analysisStatus,
    hasChanges: open.undo.length + open.redo.length > 0,
    isDragging: open.preview !== null || open.analysis.ofPreview,
    printedAtMs,
    programVersion,
  };
}
