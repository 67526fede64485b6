import { fitWords, individualWorking, readingWorking } from "../../core/messages/index.ts";
import { useWorkbench } from "../useWorkbench.ts";
import type { ReadingOf } from "./ReadingsTable.tsx";
import type { ShownUnit } from "./shownUnit.ts";
import "./OptionPanel.css";

/** The arithmetic of one reading, so that a second person can check it by hand. */
export function WorkingPanel({
  row,
  option,
  of,
  unit,
}: {
  readonly row: string;
  readonly option: string;
  readonly of: ReadingOf;
  readonly unit: ShownUnit;
}) {
  const open = useWorkbench((state) => state.open);
  const analysis = open?.analysis.result;
  const working =
    open && analysis
      ? (of === "typical" ? readingWorking : individualWorking)(open.value, analysis, option, row, unit)
      : null;
  if (!working) return <p>There is nothing to show for this reading now.</p>;
  return (
    <div className="working">
      <h3>
        {working.title}, option {option}, {of === "typical" ? fitWords.typicalPatient : fitWords.individual}
      </h3>
      {working.steps.map((step) => (
        <p key={step} className="working-line">
          {step}
        </p>
      ))}
      <p className="working-result">{working.result}</p>
      <ul className="working-source">
        {working.sources.map((source) => (
          <li key={source}>{source}</li>
        ))}
      </ul>
    </div>
  );
}
