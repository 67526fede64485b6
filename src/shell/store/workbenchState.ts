import type { Analysis } from "../../core/analysis/index.ts";
import type { Case, EditArguments, EditName, TargetWindow } from "../../core/case/index.ts";
import type { MedicineRecord } from "../../core/medicine/index.ts";
import type { Issue, Result } from "../../core/result/index.ts";
import type { MedicineState } from "./medicineState.ts";
import type { CaseEntry, StorageState } from "./ports.ts";

/** The state of the open workbench and what can be done to it. Screens read this through view/useWorkbench.ts. */

export type Screen = "cases" | "bench" | "summary" | "medicines" | "settings";

export interface Settings {
  readonly pageSize: "A4" | "Letter";
  /** How micrograms are written in print: "microgram" or "mcg". */
  readonly microgram: "microgram" | "mcg";
  readonly preparedBy: string;
}

export interface Saving {
  readonly status: "unsaved" | "saving" | "saved" | "failed" | "read-only";
  readonly savedAt: number | null;
  /** Why, for failed and read-only. */
  readonly reason: "quota" | "newer" | "other-tab" | "closed" | "failed" | null;
  /** The sentence for `reason`, ready to show; empty without one. */
  readonly detail: string;
}

export interface AnalysisState {
  readonly result: Analysis | null;
  /** Revision of the case the result came from. */
  readonly revision: number;
  /** True while `result` is that of a preview: shown, not to be printed. */
  readonly ofPreview: boolean;
  /** What the levels make of this patient is still that of an earlier state of the case: shown, marked, not to be printed. */
  readonly isFitStale: boolean;
  /** Part done of a fit that takes its time, 0 to 1; null when none runs. */
  readonly fitProgress: number | null;
  readonly status: "running" | "fresh" | "failed";
  /** A sentence, ready to show. */
  readonly failure: string | null;
}

export interface OpenCase {
  readonly value: Case;
  /** Counts every change, undo and redo included. */
  readonly revision: number;
  readonly role: "writer" | "reader";
  readonly undo: readonly { readonly name: EditName }[];
  readonly redo: readonly { readonly name: EditName }[];
  readonly saving: Saving;
  readonly analysis: AnalysisState;
  /** A drag in progress: what is shown but not yet an edit. */
  readonly preview: Case | null;
}

export interface Notice {
  readonly id: number;
  readonly gravity: "stop" | "check" | "note";
  readonly issues: readonly Issue[];
  /** The way back, offered with what was done. */
  readonly undo?: () => Promise<void>;
}

/** A bundled demonstration, as offered on the cases screen. */
export interface DemoEntry {
  /** What `openDemo` is called with. */
  readonly name: string;
  readonly label: string;
  readonly medicine: string;
  /** One sentence: what it shows. */
  readonly about: string;
}

/** A target window the ward keeps of its own, for one medicine. */
export interface WardWindow {
  readonly medicine: string;
  readonly id: string;
  readonly window: TargetWindow;
}

export interface WorkbenchState extends MedicineState {
  readonly boot: { readonly kind: "opening" } | StorageState;
  readonly screen: Screen;
  readonly entries: readonly CaseEntry[];
  /** Built-in records first, then the ward's own. */
  readonly medicines: readonly MedicineRecord[];
  /** Ids of those in `medicines` that are the ward's own and can be removed. */
  readonly ownMedicines: readonly string[];
  readonly wardWindows: readonly WardWindow[];
  readonly demos: readonly DemoEntry[];
  readonly settings: Settings;
  readonly open: OpenCase | null;
  readonly notices: readonly Notice[];
  readonly update: "none" | "waiting";

  start(): Promise<void>;
  acceptLoss(): Promise<void>;
  show(screen: Screen): void;
  newCase(fields: { label: string; medicine: string; timeZone: string; now: string }): Promise<void>;
  openCase(id: string): Promise<void>;
  /** Makes a fresh copy of a bundled demo case and opens it. */
  openDemo(name: string): Promise<void>;
  closeCase(): Promise<void>;
  removeCase(id: string): Promise<void>;
  /** Nothing is written unless the whole file is good; a case with the same id is kept beside it under a new id. */
  importFile(name: string, text: string): Promise<Result<Case>>;
  /** The open case as a file. Works also when nothing can be saved. */
  exportFile(): { readonly name: string; readonly text: string } | null;
  /** A stored case as a file, without opening it. */
  exportStored(id: string): Promise<Result<{ readonly name: string; readonly text: string }>>;

  saveWindow(medicine: string, id: string, window: TargetWindow): Promise<Result<null>>;
  removeWindow(medicine: string, id: string): Promise<Result<null>>;

  /** `nudged`: what an arrow key nudged. The same nudge of the same thing within a second joins the step before it. */
  edit<N extends EditName>(name: N, args: EditArguments<N>, nudged?: string): void;
  /** During a drag: show the outcome of the edit without making it. */
  previewEdit<N extends EditName>(name: N, args: EditArguments<N>): void;
  cancelPreview(): void;
  undo(): void;
  redo(): void;

  changeSettings(change: Partial<Settings>): Promise<void>;
  notify(gravity: Notice["gravity"], issues: readonly Issue[]): void;
  dismiss(id: number): void;
  /** Takes the way back that a notice offers. */
  undoNotice(id: number): Promise<void>;
  /** A new version of the program waits; `applyUpdate` saves first, then takes it. */
  offerUpdate(apply: () => void): void;
  applyUpdate(): Promise<void>;
  /** Everything on disk: resolves when nothing is unsaved or saving (or it can't be saved). */
  settle(): Promise<void>;
}
