import type { DraftGroup, DraftNode } from "../../../core/medicine/index.ts";
import { recordWords } from "../../../core/messages/index.ts";
import { Button } from "../../ui/Button.tsx";
import { DraftChoice } from "./DraftChoice.tsx";
import { DraftFigure, figureNew } from "./DraftFigure.tsx";
import { DraftList } from "./DraftList.tsx";
import { DraftSection } from "./DraftSection.tsx";
import { DraftStatement, statementNew } from "./DraftStatement.tsx";
import { DraftText } from "./DraftText.tsx";
import { useDraft } from "./draftContext.ts";
import { entryId } from "./entryId.ts";

const PARAMETERS = ["clearance", "volume"] as const;

export function InteractionsSection() {
  const { groupAt, change } = useDraft();
  const autoinduction = groupAt(["autoinduction"]);
  return (
    <DraftSection
      id="interactions"
      heading={recordWords.section.interactions}
      roots={["interactions", "autoinduction"]}
    >
      <DraftList path={["interactions"]} entry={recordWords.interaction} entryNew={interactionNew}>
        {(path) => (
          <>
            <div className="draft-pair">
              <DraftText path={[...path, "medicine"]} label={recordWords.interactionMedicine} />
              <DraftChoice
                path={[...path, "parameter"]}
                label={recordWords.interactionParameter}
                choices={PARAMETERS.map((value) => ({ value, label: recordWords.interactionParameters[value] }))}
              />
            </div>
            <DraftText path={[...path, "text"]} label={recordWords.text} isMultiline />
            <DraftFigure path={[...path, "factor"]} label={recordWords.factor} units={["1"]} />
            <DraftFigure path={[...path, "onset"]} label={recordWords.onset} units={["d"]} isOptional />
          </>
        )}
      </DraftList>
      {autoinduction ? (
        <div className="draft-entry">
          <DraftStatement path={["autoinduction"]} label={recordWords.autoinduction} />
          <DraftFigure
            path={["autoinduction", "settledAfter"]}
            label={recordWords.settledAfter}
            units={["d"]}
            isOptional
          />
          <div className="draft-away">
            <Button
              kind="quiet"
              onPress={() => change(["autoinduction"], undefined)}
              name={recordWords.takeAwayName(recordWords.autoinduction)}
            >
              {recordWords.takeAway}
            </Button>
          </div>
        </div>
      ) : (
        <div>
          <Button onPress={() => change(["autoinduction"], statementNew())}>
            {recordWords.add(recordWords.autoinduction)}
          </Button>
        </div>
      )}
    </DraftSection>
  );
}

function interactionNew(list: readonly DraftNode[]): DraftGroup {
  return {
    id: entryId("interaction", list),
    medicine: "",
    parameter: "clearance",
    factor: figureNew("1"),
    text: "",
  };
}
