import type { Case } from "../../core/case/index.ts";
import type { SaveOutcome } from "./ports.ts";
import { failureSaving } from "./storageSentences.ts";
import type { Saving } from "./workbenchState.ts";

/** Waits between tries after a failure, ms; the last one repeats. */
const RETRY_WAITS = [5_000, 10_000, 20_000, 60_000] as const;
/** Reasons that don't pass by themselves. */
const LASTING: ReadonlySet<Saving["reason"]> = new Set(["newer", "other-tab"] as const);

export interface Autosave {
  /** A newer state: written at once, or straight after the write under way. States in between are skipped. */
  queue(value: Case): void;
  /** Resolves when the newest state is on disk, or one more try has failed. */
  settle(): Promise<void>;
  isSaved(): boolean;
  stop(): void;
}

/**
 * Writes the open case, newest state only, one write at a time. "saved" is reported only when the newest state's own write
 * has been acknowledged and nothing newer was queued meanwhile.
 */
export function createAutosave(setting: {
  readonly save: (value: Case) => Promise<SaveOutcome>;
  readonly report: (saving: Saving) => void;
  readonly onSaved: (value: Case, savedAt: number) => void;
  /** When the state it starts from was saved; null if it never was. */
  readonly savedAt: number | null;
}): Autosave {
  const { save, report, onSaved } = setting;
  let savedAt = setting.savedAt;
  let unsaved: Case | null = null;
  let isWriting = false;
  let writing: Promise<void> = Promise.resolve();
  let failure: Saving["reason"] = null;
  let tries = 0;
  let timer: ReturnType<typeof setTimeout> | undefined;
  let isStopped = false;

  const plain = (status: "unsaved" | "saving" | "saved"): Saving => ({ status, savedAt, reason: null, detail: "" });

  async function writeAll(): Promise<void> {
    try {
      while (unsaved && !isStopped) {
        const value = unsaved;
        report(plain("saving"));
        const outcome = await saveSafely(value);
        if (outcome.ok) acknowledge(value, outcome.savedAt);
        else if (unsaved === value) {
          giveUp(failureSaving(outcome, savedAt));
          return;
        } // else a newer state is there, and is tried at once
      }
    } finally {
      isWriting = false; // in the same step as the loop's last look: no state can be queued in between and be forgotten
    }
  }

  function acknowledge(value: Case, at: number): void {
    savedAt = at;
    tries = 0;
    failure = null;
    onSaved(value, at);
    if (unsaved !== value) return;
    unsaved = null;
    report(plain("saved"));
  }

  function giveUp(saving: Saving): void {
    failure = saving.reason;
    report(saving);
    if (LASTING.has(failure) || isStopped) return;
    timer = setTimeout(start, RETRY_WAITS[Math.min(tries, RETRY_WAITS.length - 1)]);
    tries += 1;
  }

  async function saveSafely(value: Case): Promise<SaveOutcome> {
    try {
      return await save(value);
    } catch (error) {
      return { ok: false, reason: "failed", detail: String(error) };
    }
  }

  function start(): void {
    clearTimeout(timer);
    if (isWriting) return;
    isWriting = true;
    writing = writeAll();
  }

  return {
    queue(value) {
      unsaved = value;
      report(plain("unsaved"));
      start();
    },
    async settle() {
      if (unsaved && !LASTING.has(failure)) start();
      await writing;
    },
    isSaved: () => unsaved === null,
    stop() {
      isStopped = true;
      clearTimeout(timer);
    },
  };
}
