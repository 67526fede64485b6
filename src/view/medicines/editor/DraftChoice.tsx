import type { DraftPath } from "../../../core/medicine/index.ts";
import { type Choice, ChoiceField } from "../../ui/ChoiceField.tsx";
import { placeOf, useDraft } from "./draftContext.ts";

export interface DraftChoiceProps {
  readonly path: DraftPath;
  readonly label: string;
  readonly choices: readonly Choice<string>[];
  readonly prompt?: string;
  readonly description?: string;
  readonly fault?: string | undefined;
}

/** One of a few words. What is not chosen yet is not preselected. */
export function DraftChoice({ path, label, choices, prompt, description, fault }: DraftChoiceProps) {
  const { nodeAt, change, faultAt } = useDraft();
  const value = nodeAt(path);
  return (
    <div data-place={placeOf(path)}>
      <ChoiceField
        label={label}
        value={choices.find((each) => each.value === value)?.value ?? null}
        choices={choices}
        onChoose={(chosen) => change(path, chosen)}
        description={description}
        fault={fault ?? faultAt(path)}
        {...(prompt === undefined ? {} : { prompt })}
      />
    </div>
  );
}
