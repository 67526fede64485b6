import type { MedicineRecord } from "../../core/medicine/index.ts";
import type { Issue } from "../../core/result/index.ts";
import type { Session } from "./createSession.ts";
import type { AnalysisRunner, CaseRepository } from "./ports.ts";
import type { Notice, WorkbenchState } from "./workbenchState.ts";

/** What the store is made of: everything that touches the world comes in here. */
export interface WorkbenchSetting {
  readonly repository: CaseRepository;
  readonly runner: AnalysisRunner;
  /** For the fits, which take longer: one of its own, so that the curve under a drag never waits for one. */
  readonly fitter: AnalysisRunner;
  /** Epoch milliseconds. */
  readonly clock: () => number;
  readonly newId: () => string;
  /** Bundled demonstration cases, as read from their files, by name. */
  readonly demos: Readonly<Record<string, unknown>>;
  readonly builtInRecords: readonly MedicineRecord[];
}

/** What the groups of actions share. */
export interface StoreContext extends WorkbenchSetting {
  get(): WorkbenchState;
  set(change: Partial<WorkbenchState>): void;
  say(gravity: Notice["gravity"], ...issues: readonly Issue[]): void;
  /** Says what was done, with the way back. */
  offer(gravity: Notice["gravity"], issues: readonly Issue[], undo: () => Promise<void>): void;
  /** The open case's own machinery; null when none is open. */
  session: Session | null;
  /** Why this tab's storage is at an end, once it is: only a reload helps. */
  ended: Issue | null;
  /** One at a time: opening, closing and the like wait for each other. */
  inTurn<T>(work: () => Promise<T>): Promise<T>;
}
