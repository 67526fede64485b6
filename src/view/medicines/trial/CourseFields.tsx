import type { Product } from "../../../core/medicine/index.ts";
import { recordWords } from "../../../core/messages/index.ts";
import { ChoiceField } from "../../ui/ChoiceField.tsx";
import { QuantityInput } from "../../ui/QuantityInput.tsx";
import { type CourseDraft, DOSE_UNITS, INTERVAL_UNITS } from "./courseDraft.ts";
import "./trial.css";

export interface CourseFieldsProps {
  readonly draft: CourseDraft;
  readonly onChange: (draft: CourseDraft) => void;
  /** One choice a record: its label, its products, the one chosen. */
  readonly products: readonly {
    readonly label: string;
    readonly products: readonly Pick<Product, "id" | "name">[];
    readonly chosen: string;
    readonly onChoose: (product: string) => void;
  }[];
}

export function CourseFields({ draft, onChange, products }: CourseFieldsProps) {
  return (
    <fieldset className="trial-fields">
      <legend>{recordWords.course}</legend>
      {products.map((each) => (
        <ChoiceField
          key={each.label}
          label={each.label}
          value={each.chosen}
          choices={each.products.map(({ id, name }) => ({ value: id, label: name }))}
          onChoose={each.onChoose}
        />
      ))}
      <div className="trial-grid">
        <QuantityInput
          label={recordWords.doseAmount}
          draft={draft.dose}
          units={DOSE_UNITS}
          onChange={(dose) => onChange({ ...draft, dose })}
        />
        <QuantityInput
          label={recordWords.interval}
          draft={draft.interval}
          units={INTERVAL_UNITS}
          onChange={(interval) => onChange({ ...draft, interval })}
        />
      </div>
    </fieldset>
  );
}
