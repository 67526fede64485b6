import { fitWords } from "../../core/messages/index.ts";
import { CaseEntry } from "../entry/CaseEntry.tsx";
import { DoseEntry } from "../entry/DoseEntry.tsx";
import { EventEntry } from "../entry/EventEntry.tsx";
import { LevelEntry } from "../entry/LevelEntry.tsx";
import type { OpenLevel } from "../entry/LevelTable.tsx";
import { PatientPanel } from "../entry/PatientPanel.tsx";
import { WindowEntry } from "../entry/WindowEntry.tsx";
import { RichLevelsPanel } from "../rich/RichLevelsPanel.tsx";
import { Dialog } from "../ui/Dialog.tsx";
import { LearntPanel } from "./LearntPanel.tsx";
import { MedicinePanel } from "./MedicinePanel.tsx";
import { OptionPanel } from "./OptionPanel.tsx";
import type { ReadingOf } from "./ReadingsTable.tsx";
import type { ShownUnit } from "./shownUnit.ts";
import { WorkingPanel } from "./WorkingPanel.tsx";

export type BenchPanelKind = "case" | "patient" | "medicine" | "window" | "levels" | "rich" | "learnt";

/** Which drawer is open: one of the simple ones, the doses of a lane, an option, or the working of a reading. */
export type OpenPanel =
  | { readonly kind: BenchPanelKind }
  | { readonly kind: "doses"; readonly lineId?: string }
  | { readonly kind: "events"; readonly index?: number }
  | ({ readonly kind: "level" } & OpenLevel)
  | { readonly kind: "option"; readonly option: string; readonly lineId?: string }
  | { readonly kind: "working"; readonly row: string; readonly option: string; readonly of: ReadingOf };

const TITLES: Readonly<Record<BenchPanelKind | "doses" | "events" | "level", string>> = {
  case: "Case",
  patient: "Patient",
  medicine: "Medicine",
  window: "Target window",
  levels: "Measured levels",
  level: "Measured levels",
  rich: "Levels without a model",
  learnt: fitWords.taughtTitle,
  doses: "Doses given",
  events: "Events",
};

interface BenchPanelProps {
  readonly panel: OpenPanel;
  readonly unit: ShownUnit;
  readonly onClose: () => void;
}

export function BenchPanel({ panel, unit, onClose }: BenchPanelProps) {
  const title =
    panel.kind === "option" ? `Option ${panel.option}` : panel.kind === "working" ? "Working" : TITLES[panel.kind];
  return (
    <Dialog title={title} isOpen onClose={onClose} place="side">
      {panel.kind === "case" && <CaseEntry onDone={onClose} />}
      {panel.kind === "patient" && <PatientPanel onDone={onClose} />}
      {panel.kind === "medicine" && <MedicinePanel />}
      {panel.kind === "window" && <WindowEntry onDone={onClose} />}
      {panel.kind === "levels" && <LevelEntry onDone={onClose} />}
      {panel.kind === "level" && (
        <LevelEntry key={panel.id} opened={{ id: panel.id, form: panel.form }} onDone={onClose} />
      )}
      {panel.kind === "learnt" && <LearntPanel />}
      {panel.kind === "rich" && <RichLevelsPanel unit={unit} />}
      {panel.kind === "doses" && (
        <DoseEntry lane="given" onDone={onClose} {...(panel.lineId ? { lineId: panel.lineId } : {})} />
      )}
      {panel.kind === "events" && (
        <EventEntry onDone={onClose} {...(panel.index === undefined ? {} : { index: panel.index })} />
      )}
      {panel.kind === "option" && (
        <OptionPanel option={panel.option} onDone={onClose} {...(panel.lineId ? { lineId: panel.lineId } : {})} />
      )}
      {panel.kind === "working" && <WorkingPanel row={panel.row} option={panel.option} of={panel.of} unit={unit} />}
    </Dialog>
  );
}
