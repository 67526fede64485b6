import { recordWords } from "../../../core/messages/index.ts";
import { DraftList } from "./DraftList.tsx";
import { DraftSection } from "./DraftSection.tsx";
import { DraftStatement, statementNew } from "./DraftStatement.tsx";
import { DraftText } from "./DraftText.tsx";

export function CautionsSection() {
  return (
    <DraftSection id="cautions" heading={recordWords.section.cautions} roots={["cautions"]}>
      <DraftList path={["cautions"]} entry={recordWords.caution} entryNew={() => ({ ...statementNew(), category: "" })}>
        {(path) => (
          <>
            <DraftText path={[...path, "category"]} label={recordWords.category} />
            <DraftStatement path={path} label={recordWords.text} />
          </>
        )}
      </DraftList>
    </DraftSection>
  );
}
