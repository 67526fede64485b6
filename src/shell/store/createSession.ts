import { type Case, caseDiff, caseEditTry, type EditArguments, type EditName } from "../../core/case/index.ts";
import { issue } from "../../core/result/index.ts";
import { ANALYSIS_NONE, createAnalysisFeed } from "./createAnalysisFeed.ts";
import { createAutosave } from "./createAutosave.ts";
import {
  HISTORY_EMPTY,
  type History,
  type HistoryEntry,
  historyMerge,
  historyPush,
  historyRedo,
  historyUndo,
} from "./history.ts";
import { readerSaving } from "./storageSentences.ts";
import type { StoreContext } from "./storeContext.ts";
import type { OpenCase, Saving } from "./workbenchState.ts";

/** Presses on one thing within this of each other are one step back. Ours: a hand that goes on. ms */
export const NUDGE_MS = 1_000;

export interface Session {
  readonly id: string;
  edit<N extends EditName>(name: N, args: EditArguments<N>, nudged?: string): void;
  previewEdit<N extends EditName>(name: N, args: EditArguments<N>): void;
  cancelPreview(): void;
  undo(): void;
  redo(): void;
  /** The stored state takes the place of what is shown: for a reader only, history begins anew. */
  replace(value: Case, role: OpenCase["role"], savedAt: number): void;
  /** This tab can no longer write. What is not on disk stays in memory, and is said to be. */
  freeze(): void;
  /** What was on disk may not be there any more: written again. */
  saveAgain(): void;
  settle(): Promise<void>;
  /** Nothing would be lost: all is on disk, or this very state was exported. */
  isSafeToLeave(): boolean;
  noteExport(): void;
  stop(): void;
}

export interface SessionStart {
  readonly value: Case;
  readonly role: OpenCase["role"];
  /** null: not stored yet. */
  readonly savedAt: number | null;
  readonly readerReason: "newer" | "other-tab";
  readonly onSaved: (value: Case, savedAt: number) => void;
}

/** The open case: its edits, history, saving and analysis. Puts what it has into the state's `open`. */
export function createSession(context: StoreContext, start: SessionStart): Session {
  const { id } = start.value;
  let history: History = HISTORY_EMPTY;
  let exported: Case | null = null;
  /** The last edit, if it was a nudge: what it was of, the step it stands in, and when. */
  let nudge: { readonly of: string; readonly entry: HistoryEntry; readonly at: number } | null = null;
  let isFrozen = false;
  let isStopped = false;
  let open: OpenCase = {
    value: start.value,
    revision: 1,
    role: start.role,
    ...HISTORY_EMPTY,
    saving: start.role === "reader" ? readerSaving(start.readerReason, start.savedAt) : savedAs("saved", start.savedAt),
    analysis: ANALYSIS_NONE,
    preview: null,
  };

  let isTogether = false;

  function put(change: Partial<OpenCase>): void {
    if (isStopped) return;
    open = { ...open, ...change };
    if (!isTogether) context.set({ open });
  }

  /** One change of the state for all that `work` puts: nobody sees a new value beside the "saved" of the one before. */
  function together(work: () => void): void {
    isTogether = true;
    try {
      work();
    } finally {
      isTogether = false;
    }
    put({});
  }

  let autosave = makeAutosave(start.savedAt);
  const feed = createAnalysisFeed(context, (analysis) => put({ analysis }));

  function makeAutosave(savedAt: number | null) {
    return createAutosave({
      save: (value) => context.repository.save(value),
      report: (saving) =>
        put({ saving: isFrozen && saving.status === "saved" ? readerSaving("newer", saving.savedAt) : saving }),
      onSaved: start.onSaved,
      savedAt,
    });
  }

  /** The one way to a new state of the case. */
  function change(value: Case, next: History): void {
    history = next;
    nudge = null;
    together(() => {
      put({ value, revision: open.revision + 1, preview: null, undo: history.undo, redo: history.redo });
      autosave.queue(value);
      feed.ask(value, open.revision);
    });
  }

  function mayChange(): boolean {
    if (open.role === "writer") return true;
    context.say("check", issue("edit-read-only"));
    return false;
  }

  const session: Session = {
    id,
    edit(name, args, nudged) {
      if (!mayChange()) return;
      const result = caseEditTry(open.value, name, args);
      if (!result.ok) {
        session.cancelPreview();
        context.say("check", ...result.issues);
        return;
      }
      const diff = caseDiff(open.value, result.value);
      if (diff.length === 0) {
        session.cancelPreview();
        return;
      }
      const of = nudged === undefined ? null : `${name} ${nudged}`;
      const at = context.clock();
      const goesOn = nudge?.of === of && nudge.entry === history.undo.at(-1) && at - nudge.at <= NUDGE_MS;
      const next = goesOn ? historyMerge(history, open.value, result.value) : historyPush(history, { name, diff });
      // Steps that cancelled out have left none to join.
      const entry = next.undo.length < history.undo.length ? undefined : next.undo.at(-1);
      change(result.value, next);
      nudge = of !== null && entry ? { of, entry, at } : null;
    },
    previewEdit(name, args) {
      if (!mayChange()) return;
      const result = caseEditTry(open.value, name, args);
      // A state that could not be opened again is never shown or made. A drag over a place where it can't be dropped stays at the last good one; the drop itself says why.
      if (!result.ok) return;
      // A hand moves in pixels, what it moves in steps: most moves show what is shown already.
      if (caseDiff(open.preview ?? open.value, result.value).length === 0) return;
      together(() => {
        put({ preview: result.value });
        feed.askPreview(result.value, open.revision);
      });
    },
    cancelPreview() {
      if (!open.preview) return;
      together(() => {
        put({ preview: null });
        feed.cancelPreview(open.value, open.revision);
      });
    },
    undo() {
      const step = mayChange() ? historyUndo(history, open.value) : null;
      if (step) change(step.value, step.history);
    },
    redo() {
      const step = mayChange() ? historyRedo(history, open.value) : null;
      if (step) change(step.value, step.history);
    },
    replace(value, role, savedAt) {
      autosave.stop();
      autosave = makeAutosave(savedAt);
      history = HISTORY_EMPTY;
      const saving = role === "reader" ? readerSaving("other-tab", savedAt) : savedAs("saved", savedAt);
      together(() => {
        put({ value, role, saving, revision: open.revision + 1, preview: null, ...HISTORY_EMPTY });
        feed.ask(value, open.revision);
      });
    },
    freeze() {
      isFrozen = true;
      session.cancelPreview();
      const { savedAt } = open.saving;
      const reader = readerSaving("newer", savedAt);
      put({ role: "reader", saving: autosave.isSaved() ? reader : { ...reader, status: "failed" } });
    },
    saveAgain() {
      if (open.role === "writer") autosave.queue(open.value);
    },
    settle: () => autosave.settle(),
    isSafeToLeave: () => autosave.isSaved() || exported === open.value,
    noteExport() {
      exported = open.value;
    },
    stop() {
      isStopped = true;
      autosave.stop();
      feed.stop();
    },
  };

  together(() => {
    feed.ask(open.value, open.revision);
    if (start.savedAt === null && start.role === "writer") autosave.queue(open.value);
  });
  return session;
}

function savedAs(status: Saving["status"], savedAt: number | null): Saving {
  return { status: savedAt === null ? "unsaved" : status, savedAt, reason: null, detail: "" };
}
