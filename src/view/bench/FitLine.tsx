import type { FitState } from "../../core/analysis/index.ts";
import { fitLine, fitWords } from "../../core/messages/index.ts";
import type { AnalysisState } from "../../shell/store/workbenchState.ts";
import { Button } from "../ui/Button.tsx";
import "./FitLine.css";

interface FitLineProps {
  readonly fit: FitState;
  /** How many levels the case has, used or not. */
  readonly levels: number;
  /** On which patient the order rests. */
  readonly use: "typical" | "individual";
  readonly state: Pick<AnalysisState, "isFitStale" | "fitProgress">;
  readonly onOpen: () => void;
}

/** What the figures rest on: levels used, the typical patient alone, being worked out, or withheld and why. */
export function FitLine({ fit, levels, use, state, onOpen }: FitLineProps) {
  return (
    <div className={`fit-line fit-line-${fit.kind}`} data-fit={state.isFitStale ? "stale" : fit.kind}>
      <p className="fit-line-words" role="status">
        {fitLine(fit, levels, use)}
        {state.isFitStale && <span className="fit-line-stale">{fitWords.stale}</span>}
      </p>
      {state.fitProgress !== null && (
        <progress className="fit-line-progress" aria-label={fitWords.progress} max={1} value={state.fitProgress} />
      )}
      {levels > 0 && fit.kind !== "pending" && (
        <Button kind="quiet" onPress={onOpen}>
          {fitWords.openTaught}
        </Button>
      )}
    </div>
  );
}
