import type { Analysis } from "../../core/analysis/index.ts";
import type { Case, TargetWindow } from "../../core/case/index.ts";
import type { MedicineRecord } from "../../core/medicine/index.ts";
import type { Issue, Result } from "../../core/result/index.ts";

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
  | {
      readonly kind: "lost";
      /** "some": it is the database expected, but cases are missing from it or stand at an earlier save. */
      readonly extent: "all" | "some";
      /** How many cases are concerned; null when nothing was noted outside the database. */
      readonly cases: number | null;
      readonly lastSavedAt: number | null;
      /** How many of them have a second copy, which `acceptLoss` puts back. */
      readonly recoverable: number;
      readonly detail: string;
    }
  /** Written by a newer version of Ebbline: never written; `readable` says whether this version may read it. */
  | { readonly kind: "newer"; readonly found: number; readonly known: number; readonly readable: boolean }
  /** Another tab holds an older version open. */
  | { readonly kind: "blocked" }
  | { readonly kind: "unavailable"; readonly detail: string };

export type SaveOutcome =
  | { readonly ok: true; readonly savedAt: number }
  | {
      readonly ok: false;
      readonly reason: "quota" | "read-only" | "newer" | "closed" | "failed";
      readonly detail: string;
    };

export type StorageChange =
  /** Another tab saved or removed a case. */
  | { readonly kind: "saved" | "removed"; readonly id: string }
  /** A newer version took over the database: this tab can no longer read or write it. */
  | { readonly kind: "superseded" }
  /** The connection was dropped or the database deleted under us: what was saved may not be there any more. */
  | { readonly kind: "gone" }
  /** What blocked `open` is gone: call it again. */
  | { readonly kind: "unblocked" }
  /** Something to say that belongs to no call. */
  | { readonly kind: "fault"; readonly issues: readonly Issue[] };

export interface CaseRepository {
  open(): Promise<StorageState>;
  /** After "lost" was shown and accepted: second copies are put back, then the database as it is becomes the one expected. */
  acceptLoss(): Promise<void>;
  list(): Promise<readonly CaseEntry[]>;
  load(id: string): Promise<Result<Case>>;
  /** One strict transaction; resolves when it is on disk. One at a time a case. */
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
  subscribe(listener: (change: StorageChange) => void): () => void;
}

export type AnalysisAnswer =
  | { readonly ok: true; readonly analysis: Analysis }
  /** "deadline": stopped because it took too long. */
  | { readonly ok: false; readonly reason: "deadline" | "failed"; readonly detail: string };

/** How far to go: the typical patient at once, the levels fitted, the second road. */
export interface AnalysisDepth {
  readonly isFitted?: boolean;
  readonly isCrossChecked?: boolean;
  /** Part done, 0 to 1, of work that takes its time. */
  readonly onProgress?: (part: number) => void;
}

export interface AnalysisRunner {
  /** Latest wins: a later call takes the place of what waits or runs. `null`: overtaken by a later call. */
  run(value: Case, options?: AnalysisDepth): Promise<AnalysisAnswer | null>;
  /** "page": the worker could not start, and the page itself does the work. */
  readonly where: "worker" | "page";
}
