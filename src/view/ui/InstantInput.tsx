import { type KeyboardEvent, useState } from "react";
import { fieldWords, issueMessage } from "../../core/messages/index.ts";
import { instantMs, instantRead, instantText } from "../../core/time/index.ts";
import { FieldFrame } from "./FieldFrame.tsx";
import type { FieldQuestion } from "./fieldQuestion.ts";

export interface InstantInputProps {
  readonly label: string;
  /** As typed. */
  readonly text: string;
  readonly onChange: (text: string) => void;
  /** Zone in which clock times are meant. */
  readonly zone: string;
  /** Instant from which "today", a bare clock time and a date without a year are understood. */
  readonly now: string;
  /** Enter or leaving the field, and the answer to "first or second?". */
  readonly onLeave?: (text: string) => void;
  /** The form was sent: say what is wrong even before the field is left, an empty field included. */
  readonly isTold?: boolean;
  readonly fault?: string | undefined;
  readonly description?: string | undefined;
  readonly isReadOnly?: boolean;
  readonly isLabelHidden?: boolean;
}

/** The same instant as text that reads back to it, its offset added where the clock shows the time twice. */
export function instantTyped(iso: string, zone: string): string {
  return instantText(instantMs(iso), zone, "typed");
}

/** A date and clock time typed as one text, its meaning said back in full words while it is typed. */
export function InstantInput(props: InstantInputProps) {
  const { label, text, onChange, zone, now, onLeave, isTold = false, fault, description, isReadOnly = false } = props;
  const [isLeft, setLeft] = useState(false);
  const read = instantRead(text, zone, now);
  const isEmpty = text.trim() === "";
  const problem = read.ok ? undefined : read.issues[0];
  const isTwice = problem?.code === "clock-twice";
  const isSaid = isTold || (isLeft && !isEmpty);
  const question: FieldQuestion | undefined =
    isTwice && isSaid
      ? { text: issueMessage(problem), answers: twiceAnswers(problem.data.candidates, zone, take) }
      : undefined;
  function take(typed: string) {
    onChange(typed);
    onLeave?.(typed);
  }
  const leave = () => {
    setLeft(true);
    onLeave?.(text);
  };
  return (
    <FieldFrame
      label={label}
      isLabelHidden={props.isLabelHidden ?? false}
      description={description}
      reading={read.ok ? fieldWords.understood(instantText(instantMs(read.value), zone, "full")) : undefined}
      fault={problem && isSaid && !isTwice ? issueMessage(problem) : fault}
      question={question}
    >
      {(wiring) => (
        <input
          {...wiring}
          className="field-control"
          type="text"
          autoComplete="off"
          spellCheck={false}
          readOnly={isReadOnly}
          value={text}
          onChange={(event) => {
            setLeft(false);
            onChange(event.currentTarget.value);
          }}
          onBlur={leave}
          onKeyDown={(event: KeyboardEvent) => event.key === "Enter" && leave()}
        />
      )}
    </FieldFrame>
  );
}

function twiceAnswers(candidates: unknown, zone: string, take: (typed: string) => void): FieldQuestion["answers"] {
  const isos = Array.isArray(candidates) ? candidates.map(String) : [];
  return isos.map((iso, index) => ({
    label: fieldWords.twice(index === 0 ? "first" : "second", instantText(instantMs(iso), zone, "clock")),
    onAnswer: () => take(instantTyped(iso, zone)),
  }));
}
