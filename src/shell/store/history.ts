import { type Case, type CaseDiff, caseDiff, diffApply, diffInvert, type EditName } from "../../core/case/index.ts";

export interface HistoryEntry {
  readonly name: EditName;
  readonly diff: CaseDiff;
}

/** Newest last. */
export interface History {
  readonly undo: readonly HistoryEntry[];
  readonly redo: readonly HistoryEntry[];
}

/** Ours: far more steps than anyone takes back; diffs share their values with the cases, so each costs little. */
export const HISTORY_MOST = 500;
export const HISTORY_EMPTY: History = { undo: [], redo: [] };

export function historyPush({ undo }: History, entry: HistoryEntry): History {
  return { undo: [...undo, entry].slice(-HISTORY_MOST), redo: [] };
}

/** A further edit joined to the newest step, so that one undo takes both back; none is left where they cancel out. `before`: the case as that step left it. */
export function historyMerge({ undo }: History, before: Case, after: Case): History {
  const entry = undo.at(-1);
  if (!entry) throw new RangeError("undo: there is no step to join");
  const diff = caseDiff(diffApply(diffInvert(entry.diff), before), after);
  const others = undo.slice(0, -1);
  return { undo: diff.length === 0 ? others : [...others, { name: entry.name, diff }], redo: [] };
}

/** null: nothing to take back. */
export function historyUndo({ undo, redo }: History, value: Case): { history: History; value: Case } | null {
  const entry = undo.at(-1);
  if (!entry) return null;
  return {
    history: { undo: undo.slice(0, -1), redo: [...redo, entry] },
    value: diffApply(diffInvert(entry.diff), value),
  };
}

export function historyRedo({ undo, redo }: History, value: Case): { history: History; value: Case } | null {
  const entry = redo.at(-1);
  if (!entry) return null;
  return { history: { undo: [...undo, entry], redo: redo.slice(0, -1) }, value: diffApply(entry.diff, value) };
}
