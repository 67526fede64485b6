import { issueMessage, recordWords } from "../../../core/messages/index.ts";
import type { Issue } from "../../../core/result/index.ts";
import { Button } from "../../ui/Button.tsx";
import { Notice } from "../../ui/Notice.tsx";
import { placeOf } from "./draftContext.ts";

export interface EditorFaultsProps {
  readonly issues: readonly Issue[];
  readonly isClean: boolean;
}

/** Everything in the way of saving, each with the way to its field. */
export function EditorFaults({ issues, isClean }: EditorFaultsProps) {
  if (issues.length === 0) {
    return (
      <p className="editor-state" role="status">
        {isClean ? recordWords.clean : recordWords.ready}
      </p>
    );
  }
  return (
    <Notice gravity="check" title={recordWords.inTheWay(issues.length)}>
      <ul className="editor-faults">
        {issues.map((issue, index) => (
          <li key={index}>
            {issueMessage(issue)}{" "}
            <Button kind="quiet" onPress={() => goTo(issue.path)} name={`${recordWords.goTo}: ${issueMessage(issue)}`}>
              {recordWords.goTo}
            </Button>
          </li>
        ))}
      </ul>
    </Notice>
  );
}

/** Opens what is folded over the field, or the nearest that stands for it, and puts the focus into it. */
function goTo(path: Issue["path"]): void {
  for (let length = path.length; length > 0; length -= 1) {
    const place = document.querySelector<HTMLElement>(`[data-place="${CSS.escape(placeOf(path.slice(0, length)))}"]`);
    if (!place) continue;
    for (let fold = place.closest("details"); fold; fold = fold.parentElement?.closest("details") ?? null)
      fold.open = true;
    place.scrollIntoView({ block: "center" });
    place.querySelector<HTMLElement>("input, select, textarea, button")?.focus();
    return;
  }
}
