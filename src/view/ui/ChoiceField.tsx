import { FieldFrame } from "./FieldFrame.tsx";

export interface Choice<Value extends string> {
  readonly value: Value;
  readonly label: string;
}

export interface ChoiceFieldProps<Value extends string> {
  readonly label: string;
  /** null: nothing chosen yet; `prompt` is then shown and nothing is preselected. */
  readonly value: Value | null;
  readonly choices: readonly Choice<Value>[];
  readonly onChoose: (value: Value) => void;
  readonly prompt?: string;
  readonly description?: string | undefined;
  readonly fault?: string | undefined;
  readonly isLabelHidden?: boolean;
  readonly isDisabled?: boolean;
}

export function ChoiceField<Value extends string>(props: ChoiceFieldProps<Value>) {
  const { label, value, choices, onChoose, prompt = "Choose …", description, fault, isLabelHidden, isDisabled } = props;
  return (
    <FieldFrame label={label} isLabelHidden={isLabelHidden ?? false} description={description} fault={fault}>
      {(wiring) => (
        <select
          {...wiring}
          className="field-control"
          value={value ?? ""}
          disabled={isDisabled ?? false}
          onChange={(event) => {
            const chosen = choices.find((choice) => choice.value === event.currentTarget.value);
            if (chosen) onChoose(chosen.value);
          }}
        >
          {value === null ? (
            <option value="" disabled>
              {prompt}
            </option>
          ) : null}
          {choices.map((choice) => (
            <option key={choice.value} value={choice.value}>
              {choice.label}
            </option>
          ))}
        </select>
      )}
    </FieldFrame>
  );
}
