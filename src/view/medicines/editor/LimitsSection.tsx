import { recordWords } from "../../../core/messages/index.ts";
import { DraftFigure } from "./DraftFigure.tsx";
import { DraftList } from "./DraftList.tsx";
import { DraftSection } from "./DraftSection.tsx";
import { DraftStatement, statementNew } from "./DraftStatement.tsx";

export function LimitsSection() {
  return (
    <DraftSection id="limits" heading={recordWords.section.limits} roots={["limits", "doseLimits"]}>
      <DraftFigure
        path={["limits", "maximumSingleDose"]}
        label={recordWords.maximumSingleDose}
        units={["mg"]}
        isOptional
      />
      <DraftFigure
        path={["limits", "maximumDailyDose"]}
        label={recordWords.maximumDailyDose}
        units={["mg"]}
        isOptional
      />
      <DraftList path={["doseLimits"]} entry={recordWords.doseLimit} entryNew={statementNew}>
        {(path) => <DraftStatement path={path} label={recordWords.text} />}
      </DraftList>
    </DraftSection>
  );
}
