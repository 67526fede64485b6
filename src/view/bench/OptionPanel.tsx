import { optionNextId } from "../../core/case/index.ts";
import { benchWords } from "../../core/messages/index.ts";
import { DoseEntry } from "../entry/DoseEntry.tsx";
import { Button } from "../ui/Button.tsx";
import { TextField } from "../ui/TextField.tsx";
import { useWorkbench } from "../useWorkbench.ts";
import "./OptionPanel.css";

interface OptionPanelProps {
  readonly option: string;
  readonly lineId?: string;
  readonly onDone: () => void;
}

/** What can be done with an option as a whole, and its dose lines. */
export function OptionPanel({ option: id, lineId, onDone }: OptionPanelProps) {
  const value = useWorkbench((state) => state.open?.value ?? null);
  const isReader = useWorkbench((state) => state.open?.role === "reader");
  const edit = useWorkbench((state) => state.edit);
  const option = value?.options.find((candidate) => candidate.id === id);
  if (!value || !option) return <p>This option has been removed. Undo brings it back.</p>;
  return (
    <div className="option-panel">
      <div className="option-panel-buttons">
        <Button
          kind={option.chosen ? "plain" : "main"}
          isDisabled={isReader}
          onPress={() => edit("optionChoose", { id: option.chosen ? null : id })}
        >
          {option.chosen ? benchWords.unchoose : benchWords.choose}
        </Button>
        <Button
          isDisabled={isReader}
          onPress={() => edit("optionDuplicate", { id, newId: optionNextId(value), label: option.label })}
        >
          {benchWords.duplicate}
        </Button>
        <Button
          kind="grave"
          isDisabled={isReader}
          onPress={() => {
            edit("optionRemove", { id });
            onDone();
          }}
        >
          {benchWords.remove}
        </Button>
      </div>
      <TextField
        label="Name (optional)"
        value={option.label}
        onCommit={(label) => edit("optionRename", { id, label })}
        isReadOnly={isReader}
      />
      <DoseEntry lane={id} onDone={onDone} {...(lineId ? { lineId } : {})} />
    </div>
  );
}
