import { recordWords } from "../../../core/messages/index.ts";
import { DraftFigure } from "./DraftFigure.tsx";
import { DraftList } from "./DraftList.tsx";
import { DraftSection } from "./DraftSection.tsx";
import { DraftStatement, statementNew } from "./DraftStatement.tsx";

export function SamplingSection() {
  return (
    <DraftSection
      id="sampling"
      heading={recordWords.section.sampling}
      roots={["earliestSample", "steadyStateAfter", "sampling"]}
    >
      <DraftFigure path={["earliestSample"]} label={recordWords.earliestSample} units={["h"]} isOptional />
      <DraftFigure path={["steadyStateAfter"]} label={recordWords.steadyStateAfter} units={["d", "h"]} isOptional />
      <DraftList path={["sampling"]} entry={recordWords.samplingAdvice} entryNew={statementNew}>
        {(path) => <DraftStatement path={path} label={recordWords.text} />}
      </DraftList>
    </DraftSection>
  );
}
