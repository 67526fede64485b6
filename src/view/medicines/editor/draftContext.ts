import { createContext, useContext } from "react";
import {
  type DraftGroup,
  type DraftNode,
  type DraftPath,
  draftAt,
  isDraftGroup,
  isDraftList,
  isSamePath,
  type RecordDraft,
} from "../../../core/medicine/index.ts";
import { issueMessage } from "../../../core/messages/index.ts";
import type { Issue } from "../../../core/result/index.ts";

/** What every field of the editor shares: the draft, the way to change it, and what is wrong with it. */
export interface DraftEditing {
  readonly draft: RecordDraft;
  readonly change: (path: DraftPath, value: DraftNode | undefined) => void;
  readonly issues: readonly Issue[];
}

export const DraftContext = createContext<DraftEditing | null>(null);

export interface DraftFields extends DraftEditing {
  readonly nodeAt: (path: DraftPath) => DraftNode | undefined;
  readonly groupAt: (path: DraftPath) => DraftGroup | undefined;
  readonly listAt: (path: DraftPath) => readonly DraftNode[];
  /** The sentence on what is wrong with exactly this field. */
  readonly faultAt: (path: DraftPath) => string | undefined;
}

export function useDraft(): DraftFields {
  const editing = useContext(DraftContext);
  if (!editing) throw new RangeError("useDraft: no DraftContext above this field");
  const { draft, issues } = editing;
  return {
    ...editing,
    nodeAt: (path) => draftAt(draft, path),
    groupAt: (path) => {
      const found = draftAt(draft, path);
      return isDraftGroup(found) ? found : undefined;
    },
    listAt: (path) => {
      const found = draftAt(draft, path);
      return isDraftList(found) ? found : [];
    },
    faultAt: (path) => {
      const found = issues.find((each) => isSamePath(each.path, path));
      return found && issueMessage(found);
    },
  };
}

/** Marks the place of a field on the page, so that a fault can lead to it. */
export function placeOf(path: DraftPath): string {
  return path.join("/");
}
