import { recordWords } from "../../../core/messages/index.ts";
import { DraftChoice } from "./DraftChoice.tsx";
import { DraftSection } from "./DraftSection.tsx";
import { DraftText } from "./DraftText.tsx";
import { useDraft } from "./draftContext.ts";

const STATUSES = ["not-reviewed", "reviewed"] as const;

export function ReviewSection() {
  const { nodeAt } = useDraft();
  const isReviewed = nodeAt(["review", "status"]) === "reviewed";
  return (
    <DraftSection id="review" heading={recordWords.section.review} roots={["review"]}>
      <DraftChoice
        path={["review", "status"]}
        label={recordWords.reviewStatus}
        choices={STATUSES.map((value) => ({ value, label: recordWords.reviewStatuses[value] }))}
      />
      {isReviewed ? (
        <div className="draft-pair">
          <DraftText path={["review", "by"]} label={recordWords.reviewBy} />
          <DraftText path={["review", "on"]} label={recordWords.reviewOn} />
        </div>
      ) : null}
    </DraftSection>
  );
}
