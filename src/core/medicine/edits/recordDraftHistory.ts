import type { DraftNode, DraftPath } from "./draftNode.ts";
import type { RecordDraft } from "./recordDraft.ts";
import { recordDraftChange } from "./recordDraftChange.ts";

/** A draft with what it was before each change, and each change taken back. */
export interface RecordDraftHistory {
  readonly draft: RecordDraft;
  readonly undo: readonly DraftStep[];
  readonly redo: readonly DraftStep[];
}

interface DraftStep {
  readonly draft: RecordDraft;
  /** The field that was changed next; "" for what stands alone. */
  readonly field: string;
}

/** Ours: far more than anyone takes back by hand. */
const STEPS_MOST = 200;

export function recordDraftHistory(draft: RecordDraft): RecordDraftHistory {
  return { draft, undo: [], redo: [] };
}

/** A change as one step; typing on in the same field is one step with what was typed before. */
export function historyChange(
  history: RecordDraftHistory,
  path: DraftPath,
  value: DraftNode | undefined,
): RecordDraftHistory {
  const draft = recordDraftChange(history.draft, path, value);
  const field = typeof value === "string" ? path.join("/") : "";
  const isTypingOn = field !== "" && history.redo.length === 0 && history.undo.at(-1)?.field === field;
  const undo = isTypingOn ? history.undo : [...history.undo, { draft: history.draft, field }].slice(-STEPS_MOST);
  return { draft, undo, redo: [] };
}

export function historyUndo(history: RecordDraftHistory): RecordDraftHistory {
  const step = history.undo.at(-1);
  if (!step) return history;
  const redo = [...history.redo, { draft: history.draft, field: step.field }];
  return { draft: step.draft, undo: history.undo.slice(0, -1), redo };
}

export function historyRedo(history: RecordDraftHistory): RecordDraftHistory {
  const step = history.redo.at(-1);
  if (!step) return history;
  const undo = [...history.undo, { draft: history.draft, field: step.field }];
  return { draft: step.draft, undo, redo: history.redo.slice(0, -1) };
}
