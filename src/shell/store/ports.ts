import type { Analysis } from "../../core/analysis/index.ts";
import type { Case, TargetWindow } from "../../core/case/index.ts";
import type { MedicineRecord } from "../../core/medicine/index.ts";
import type { Result } from "../../core/result/index.ts";

/** The two ports the store is given. shell/storage and shell/workers fit them; the store knows nothing else of either. */

export interface CaseEntry {
  readonly id: string;
  readonly label: string;
  readonly medicine: string;
  readonly demo: boolean;
  /** Epoch milliseconds of the last save. */
  readonly savedAt: number;
}

export type StorageState =
  | { readonly kind: "ready" }
  /** The database is gone or was emptied by the browser, although the marker says there was work in it. */
  | { readonly kind: "lost"; readonly cases: number | null; readonly lastSavedAt: number | null; readonly detail: string }
  /** Written by a newer version of Ebbline: readable, never written. */
  | { readonly kind: "newer"; readonly found: number; readonly known: number }
  /** Another tab holds an older version open. */
  | { readonly kind: "blocked" }
  | { readonly kind: "unavailable"; readonly detail: string };

export type SaveOutcome =
  | { readonly ok: true; readonly savedAt: number }
  | { readonly ok: false; readonly reason: "quota" | "read-only" | "newer" | "closed" | "failed"; readonly detail: string };

export interface CaseRepository {
  open(): Promise<StorageState>;
  /** After "lost" was shown and accepted: start afresh, marker rewritten. */
  acceptLoss(): Promise<void>;
  list(): Promise<readonly CaseEntry[]>;
  load(id: string): Promise<Result<Case>>;
  /** One strict transaction; resolves when it is on disk. */
  save(value: Case): Promise<SaveOutcome>;
  remove(id: string): Promise<SaveOutcome>;
  /** One writer a case over all tabs (Web Locks). `onWriter` is called if the writer's place falls free later. */
  claim(id: string, onWriter: () => void): Promise<"writer" | "reader">;
  release(id: string): Promise<void>;
  readSetting(key: string): Promise<unknown>;
  writeSetting(key: string, value: unknown): Promise<SaveOutcome>;
  listMedicines(): Promise<readonly MedicineRecord[]>;
  saveMedicine(record: MedicineRecord): Promise<SaveOutcome>;
  removeMedicine(id: string): Promise<SaveOutcome>;
  /** The ward's own windows, by medicine id. */
  listWindows(): Promise<readonly { readonly medicine: string; readonly id: string; readonly window: TargetWindow }[]>;
  saveWindow(medicine: string, id: string, window: TargetWindow): Promise<SaveOutcome>;
  removeWindow(medicine: string, id: string): Promise<SaveOutcome>;
  /** Another tab saved or removed a case, or a newer version took over the database. */
  subscribe(listener: (change: { readonly kind: "saved" | "removed"; readonly id: string } | { readonly kind: "superseded" }) => void): () => void;
}

export interface AnalysisRunner {
  /** Latest wins: a call made while one runs replaces what waits. `null`: overtaken by a later call. */
  run(value: Case): Promise<{ readonly ok: true; readonly analysis: Analysis } | { readonly ok: false; readonly detail: string } | null>;
  readonly where: "worker" | "page";
}
