import { type ReactNode, useId } from "react";
import { DemoWatermark } from "./DemoWatermark.tsx";
import type { SummaryModel } from "./summaryModel.ts";

interface SummaryPaperProps {
  readonly model: SummaryModel;
  readonly heading: string;
  /** Set smaller: working to look things up in. */
  readonly isDetails?: boolean;
  readonly children: ReactNode;
}

/** One sheet. Its head is a table header group in print, so it comes again on every page the sheet runs over to. */
export function SummaryPaper({ model, heading, isDetails = false, children }: SummaryPaperProps) {
  const id = useId();
  return (
    <article className={isDetails ? "summary-paper summary-details" : "summary-paper"} aria-labelledby={id}>
      <header className="summary-head">
        <div className="summary-head-inner">
          <div>
            <h1 id={id}>{heading}</h1>
            <p>
              {model.label} · {model.person}
              {model.watermark && <strong className="summary-demo">{model.watermark}</strong>}
            </p>
          </div>
          <div className="summary-when">
            <p>{model.printed}</p>
            <p>{model.saved}</p>
          </div>
          {model.marks !== "" && <p className="summary-marks">{model.marks}</p>}
        </div>
      </header>
      <div className="summary-body">{children}</div>
      {model.watermark && <DemoWatermark />}
    </article>
  );
}
