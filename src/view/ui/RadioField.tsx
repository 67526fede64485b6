import { Label, Radio, RadioGroup, Text } from "react-aria-components";
import type { Choice } from "./ChoiceField.tsx";
import "./RadioField.css";

export interface RadioFieldProps<Value extends string> {
  readonly label: string;
  readonly value: Value | null;
  readonly choices: readonly (Choice<Value> & { readonly detail?: string })[];
  readonly onChoose: (value: Value) => void;
  readonly description?: string;
  readonly isReadOnly?: boolean;
  /** "row": few short words beside each other; "list": one below the other, with a detail each. */
  readonly arrangement?: "row" | "list";
}

/** Few answers, all in sight. */
export function RadioField<Value extends string>(props: RadioFieldProps<Value>) {
  const { label, value, choices, onChoose, description, arrangement = "row", isReadOnly = false } = props;
  return (
    <RadioGroup
      className={`radio-field radio-field-${arrangement}`}
      value={value}
      isReadOnly={isReadOnly}
      onChange={(chosen) => {
        const choice = choices.find((one) => one.value === chosen);
        if (choice) onChoose(choice.value);
      }}
    >
      <Label className="radio-field-label">{label}</Label>
      <div className="radio-field-choices">
        {choices.map((choice) => (
          <Radio key={choice.value} value={choice.value} className="radio-field-choice">
            <span className="radio-field-dot" aria-hidden="true" />
            <span>
              {choice.label}
              {choice.detail ? <span className="radio-field-detail">{choice.detail}</span> : null}
            </span>
          </Radio>
        ))}
      </div>
      {description ? (
        <Text slot="description" className="field-frame-description">
          {description}
        </Text>
      ) : null}
    </RadioGroup>
  );
}
