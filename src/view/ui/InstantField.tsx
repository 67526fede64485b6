import { useState } from "react";
import { issueMessage } from "../../core/messages/index.ts";
import type { Issue } from "../../core/result/index.ts";
import { instantMs, instantRead } from "../../core/time/index.ts";
import { InstantInput, instantTyped } from "./InstantInput.tsx";

export interface InstantFieldProps {
  readonly label: string;
  /** ISO 8601 with offset. */
  readonly value: string;
  readonly zone: string;
  readonly now: string;
  readonly onCommit: (iso: string) => void;
  readonly refuse?: (iso: string) => Issue | null;
  readonly description?: string | undefined;
  readonly isReadOnly?: boolean;
  readonly isLabelHidden?: boolean;
}

/** An instant of the open case: counts on Enter or on leaving the field. */
export function InstantField(props: InstantFieldProps) {
  const { label, value, zone, now, onCommit, refuse, description } = props;
  const [text, setText] = useState(() => instantTyped(value, zone));
  const [seen, setSeen] = useState(`${value} ${zone}`);
  const [fault, setFault] = useState<string>();
  if (seen !== `${value} ${zone}`) {
    setSeen(`${value} ${zone}`);
    setText(instantTyped(value, zone));
    setFault(undefined);
  }
  const commit = (left: string) => {
    const read = instantRead(left, zone, now);
    if (!read.ok) return;
    if (instantMs(read.value) === instantMs(value)) {
      setText(instantTyped(value, zone));
      return;
    }
    const refusal = refuse?.(read.value);
    if (refusal) setFault(issueMessage(refusal));
    else onCommit(read.value);
  };
  return (
    <InstantInput
      label={label}
      text={text}
      zone={zone}
      now={now}
      description={description}
      isReadOnly={props.isReadOnly ?? false}
      isLabelHidden={props.isLabelHidden ?? false}
      fault={fault}
      onChange={(next) => {
        setFault(undefined);
        setText(next);
      }}
      onLeave={commit}
    />
  );
}
