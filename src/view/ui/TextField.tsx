import { type KeyboardEvent, useEffect, useState } from "react";
import { FieldFrame } from "./FieldFrame.tsx";

export interface TextFieldProps {
  readonly label: string;
  readonly value: string;
  /** Every keystroke. */
  readonly onChange?: (text: string) => void;
  /** Enter or leaving the field, only when the text differs from `value`. */
  readonly onCommit?: (text: string) => void;
  readonly description?: string | undefined;
  readonly reading?: string | undefined;
  readonly fault?: string | undefined;
  readonly isMultiline?: boolean;
  readonly isLabelHidden?: boolean;
  readonly isReadOnly?: boolean;
  readonly hasInitialFocus?: boolean;
  readonly maxLength?: number;
}

/** Words. With `onChange` the owner holds the text; with `onCommit` the field holds it until Enter or blur. */
export function TextField(props: TextFieldProps) {
  const { label, value, onChange, onCommit, description, reading, fault } = props;
  const [text, setText] = useState(value);
  useEffect(() => setText(value), [value]);
  const shown = onChange ? value : text;
  const commit = () => {
    if (!onChange && onCommit && text !== value) onCommit(text);
  };
  return (
    <FieldFrame
      label={label}
      isLabelHidden={props.isLabelHidden ?? false}
      description={description}
      reading={reading}
      fault={fault}
    >
      {(wiring) => {
        const shared = {
          ...wiring,
          className: "field-control",
          value: shown,
          readOnly: props.isReadOnly ?? false,
          autoComplete: "off",
          autoFocus: props.hasInitialFocus ?? false,
          ...(props.maxLength === undefined ? {} : { maxLength: props.maxLength }),
          onChange: (event: { currentTarget: { value: string } }) =>
            onChange ? onChange(event.currentTarget.value) : setText(event.currentTarget.value),
          onBlur: commit,
        };
        if (props.isMultiline) return <textarea {...shared} rows={4} />;
        return (
          <input
            {...shared}
            type="text"
            spellCheck={false}
            onKeyDown={(event: KeyboardEvent) => event.key === "Enter" && commit()}
          />
        );
      }}
    </FieldFrame>
  );
}
