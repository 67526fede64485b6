import type { Option } from "../../core/case/index.ts";
import { benchWords } from "../../core/messages/index.ts";
import { OptionBadge } from "./OptionBadge.tsx";

interface OptionHeadProps {
  readonly option: Option;
  readonly index: number;
  readonly lines: readonly { readonly id: string; readonly text: string }[];
  readonly onOpenLine: (lineId: string) => void;
  readonly onMenu: () => void;
}

/** The left end of an option's lane: letter, name, its dose lines in words; press the name for what can be done with it. */
export function OptionHead({ option, index, lines, onOpenLine, onMenu }: OptionHeadProps) {
  return (
    <>
      <button
        type="button"
        className="lane-line lane-title"
        onClick={onMenu}
        aria-label={`Option ${option.id}${option.chosen ? ", chosen" : ""}: open`}
      >
        <OptionBadge id={option.id} index={index} isChosen={option.chosen} />
        <span>
          {option.label}
          {option.chosen ? (
            <span className="lane-chosen">
              {option.label ? " · " : ""}
              {benchWords.chosen}
            </span>
          ) : null}
        </span>
      </button>
      <LaneLines lines={lines} onOpenLine={onOpenLine} onAdd={onMenu} />
    </>
  );
}

interface LaneLinesProps {
  readonly lines: readonly { readonly id: string; readonly text: string }[];
  readonly onOpenLine: (lineId: string) => void;
  readonly onAdd: () => void;
}

export function LaneLines({ lines, onOpenLine, onAdd }: LaneLinesProps) {
  return (
    <ul className="lane-lines">
      {lines.map((line) => (
        <li key={line.id}>
          <button type="button" className="lane-line" onClick={() => onOpenLine(line.id)}>
            {line.text}
          </button>
        </li>
      ))}
      {lines.length === 0 && (
        <li>
          <button type="button" className="lane-line lane-add" onClick={onAdd}>
            {benchWords.addDoses}
          </button>
        </li>
      )}
    </ul>
  );
}
