import { casesWords, caseWords } from "../../core/messages/index.ts";
import { Button } from "../ui/Button.tsx";
import { ChoiceField } from "../ui/ChoiceField.tsx";
import { InstantField } from "../ui/InstantField.tsx";
import { presentMinute } from "../ui/presentMinute.ts";
import { TextField } from "../ui/TextField.tsx";
import { timeZoneNames } from "../ui/timeZones.ts";
import { useWorkbench } from "../useWorkbench.ts";
import { PanelDone } from "./PanelDone.tsx";
import "./entryPanel.css";

export interface CaseEntryProps {
  readonly onDone: () => void;
}

/** The case as a whole: its label, where its now line stands, its zone, notes. */
export function CaseEntry({ onDone }: CaseEntryProps) {
  const value = useWorkbench((state) => state.open?.value ?? null);
  const isReadOnly = useWorkbench((state) => state.open?.role === "reader");
  const edit = useWorkbench((state) => state.edit);
  if (!value) return null;
  return (
    <div className="entry-panel">
      <TextField
        label={caseWords.label}
        value={value.label}
        maxLength={120}
        isReadOnly={isReadOnly}
        description={casesWords.labelHelp}
        onCommit={(label) => edit("caseRename", { label: label.trim() })}
      />
      <div className="case-entry-now">
        <InstantField
          label={caseWords.now}
          value={value.now}
          zone={value.timeZone}
          now={presentMinute(value.timeZone)}
          isReadOnly={isReadOnly}
          description={caseWords.nowHelp}
          onCommit={(at) => edit("nowSet", { at })}
        />
        <Button isDisabled={isReadOnly} onPress={() => edit("nowSet", { at: presentMinute(value.timeZone) })}>
          {caseWords.nowPresent}
        </Button>
      </div>
      <ChoiceField
        label={caseWords.timeZone}
        value={value.timeZone}
        isDisabled={isReadOnly}
        description={caseWords.timeZoneHelp}
        choices={timeZoneNames(value.timeZone).map((name) => ({ value: name, label: name }))}
        onChoose={(timeZone) => edit("timeZoneSet", { timeZone })}
      />
      <TextField
        label={caseWords.notes}
        value={value.notes}
        maxLength={10_000}
        isMultiline
        isReadOnly={isReadOnly}
        description={caseWords.notesHelp}
        onCommit={(notes) => edit("notesSet", { notes })}
      />
      <PanelDone onDone={onDone} />
    </div>
  );
}
