import { casesWords, issueMessage } from "../../core/messages/index.ts";
import { Button } from "../ui/Button.tsx";
import { Notice } from "../ui/Notice.tsx";
import type { ImportOutcome } from "./caseImport.ts";

/** Faults listed before the rest is only counted. */
const MOST_SHOWN = 6;

export interface ImportOutcomeNoticeProps {
  readonly outcome: ImportOutcome;
  readonly onOpen: (id: string) => void;
  readonly onDismiss: () => void;
}

export function ImportOutcomeNotice({ outcome, onOpen, onDismiss }: ImportOutcomeNoticeProps) {
  const { fileName, result } = outcome;
  if (result.ok) {
    const { id, label } = result.value;
    return (
      <Notice gravity="note" title={casesWords.importedTitle} onDismiss={onDismiss} isAnnounced>
        <p>{casesWords.imported(label || casesWords.unlabelled)}</p>
        <div>
          <Button onPress={() => onOpen(id)}>{casesWords.open}</Button>
        </div>
      </Notice>
    );
  }
  const shown = result.issues.slice(0, MOST_SHOWN);
  const more = result.issues.length - shown.length;
  return (
    <Notice gravity="stop" title={casesWords.refusedTitle(fileName)} onDismiss={onDismiss} isAnnounced>
      <ul className="cases-screen-faults">
        {shown.map((issue, index) => (
          <li key={index}>
            {issueMessage(issue)}
            {issue.path.length > 1 ? <span> {casesWords.at(issue.path)}</span> : null}
          </li>
        ))}
        {more > 0 ? <li>{casesWords.refusedMore(more)}</li> : null}
      </ul>
    </Notice>
  );
}
