import { issueMessage, recordWords } from "../../../core/messages/index.ts";
import type { Issue } from "../../../core/result/index.ts";
import { Button } from "../../ui/Button.tsx";
import { Notice } from "../../ui/Notice.tsx";
import { placeOf } from "./draftContext.ts";

export interface EditorFaultsProps {
  readonly issues: readonly Issue[];
}

/** Everything in the way of saving, each with the way to its field. */
export function EditorFaults({ issues }: EditorFaultsProps) {
  if (issues.length === 0) return null;
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

/** Opens the fold the field lies under and puts the focus into it, or into the nearest that stands for it. */
function goTo(path: Issue["path"]): void {
  const fold = [...document.querySelectorAll<HTMLDetailsElement>("details[data-roots]")].find((each) =>
    each.dataset.roots?.split(" ").includes(String(path[0])),
  );
  if (fold) fold.open = true;
  // The fields of a fold are made once it says that it is open, which is after this turn.
  setTimeout(() => focusOn(path, fold), FOLD_OPENS_MS);
}

const FOLD_OPENS_MS = 60;

function focusOn(path: Issue["path"], fold: HTMLElement | undefined): void {
  for (let length = path.length; length > 0; length -= 1) {
    const place = document.querySelector<HTMLElement>(`[data-place="${CSS.escape(placeOf(path.slice(0, length)))}"]`);
    if (!place) continue;
    place.scrollIntoView({ block: "center" });
    place.querySelector<HTMLElement>("input, select, textarea, button")?.focus();
    return;
  }
  fold?.querySelector("summary")?.focus();
}
