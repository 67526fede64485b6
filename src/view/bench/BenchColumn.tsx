import type { Analysis } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { benchWords } from "../../core/messages/index.ts";
import type { OpenCase } from "../../shell/store/workbenchState.ts";
import type { OpenPanel } from "./BenchPanel.tsx";
import { ChanceList } from "./ChanceList.tsx";
import { ConcernList } from "./ConcernList.tsx";
import { FirstSteps } from "./FirstSteps.tsx";
import { FitLine } from "./FitLine.tsx";
import { ReadingsTable } from "./ReadingsTable.tsx";
import type { ShownUnit } from "./shownUnit.ts";

interface BenchColumnProps {
  readonly open: OpenCase;
  /** As shown: a preview during a drag. */
  readonly value: Case;
  readonly analysis: Analysis | null;
  readonly unit: ShownUnit;
  readonly onPanel: (panel: OpenPanel) => void;
  readonly onAddOption: () => void;
  readonly onLit: (option: string | null) => void;
}

/** Beside the clock: what the figures rest on, the readings, the chances, then the concerns. */
export function BenchColumn({ open, value, analysis, unit, onPanel, onAddOption, onLit }: BenchColumnProps) {
  const isReader = open.role === "reader";
  const hasLines = value.options.some((option) => option.lines.length > 0);
  const isWhole = analysis !== null && value.options.length === analysis.options.length;
  return (
    <aside className="bench-column" aria-label="Readings and concerns">
      {open.analysis.status === "failed" && (
        <p className="bench-stale" role="alert">
          {benchWords.analysisStates.failed}: {open.analysis.failure}
        </p>
      )}
      {!isReader && <FirstSteps value={value} analysis={analysis} onPanel={onPanel} onAddOption={onAddOption} />}
      {!isReader && hasLines && !value.options.some((option) => option.chosen) && (
        <p className="bench-hint">{benchWords.noneChosen}</p>
      )}
      {analysis && (
        <FitLine
          fit={analysis.fit}
          levels={value.levels.length}
          use={value.fit.use}
          state={open.analysis}
          onOpen={() => onPanel({ kind: "learnt" })}
        />
      )}
      {isWhole && hasLines && (
        <>
          <ReadingsTable
            value={value}
            analysis={analysis}
            unit={unit}
            onWorking={(row, option, of) => onPanel({ kind: "working", row, option, of })}
            onLit={onLit}
          />
          <ChanceList value={value} analysis={analysis} onLit={onLit} />
        </>
      )}
      {analysis && <ConcernList concerns={analysis.concerns} />}
      <p className="bench-intended">{benchWords.intended}</p>
    </aside>
  );
}
