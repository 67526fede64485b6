import { recordWords } from "../../../core/messages/index.ts";
import { QuantityInput } from "../../ui/QuantityInput.tsx";
import { RadioField } from "../../ui/RadioField.tsx";
import type { ReferenceDraft } from "./referenceDraft.ts";
import "./trial.css";

export interface ReferenceFieldsProps {
  readonly draft: ReferenceDraft;
  readonly onChange: (draft: ReferenceDraft) => void;
}

const SEXES = ["female", "male"] as const;

export function ReferenceFields({ draft, onChange }: ReferenceFieldsProps) {
  return (
    <fieldset className="trial-fields">
      <legend>{recordWords.reference}</legend>
      <p className="trial-help">{recordWords.referenceHelp}</p>
      <RadioField
        label={recordWords.sex}
        value={draft.sex}
        choices={SEXES.map((value) => ({ value, label: recordWords.sexes[value] }))}
        onChoose={(sex) => onChange({ ...draft, sex })}
      />
      <div className="trial-grid">
        <QuantityInput
          label={recordWords.age}
          draft={draft.age}
          units={["a"]}
          onChange={(age) => onChange({ ...draft, age })}
        />
        <QuantityInput
          label={recordWords.weight}
          draft={draft.weight}
          units={["kg"]}
          onChange={(weight) => onChange({ ...draft, weight })}
        />
        <QuantityInput
          label={recordWords.height}
          draft={draft.height}
          units={["cm"]}
          onChange={(height) => onChange({ ...draft, height })}
        />
        <QuantityInput
          label={recordWords.creatinineClearance}
          draft={draft.creatinineClearance}
          units={["mL/min"]}
          onChange={(creatinineClearance) => onChange({ ...draft, creatinineClearance })}
        />
        <QuantityInput
          label={recordWords.albumin}
          draft={draft.albumin}
          units={["g/L"]}
          onChange={(albumin) => onChange({ ...draft, albumin })}
        />
      </div>
    </fieldset>
  );
}
