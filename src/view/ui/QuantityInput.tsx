import { type KeyboardEvent, useState } from "react";
import { issueMessage } from "../../core/messages/index.ts";
import { type UnitCode, unitSpoken } from "../../core/units/index.ts";
import { FieldFrame } from "./FieldFrame.tsx";
import type { FieldQuestion } from "./fieldQuestion.ts";
import { isDraftEmpty, type QuantityDraft, quantityDraftRead } from "./quantityDraft.ts";
import "./QuantityInput.css";

export interface QuantityInputProps<U extends UnitCode> {
  readonly label: string;
  readonly draft: QuantityDraft<U>;
  readonly units: readonly U[];
  readonly onChange: (draft: QuantityDraft<U>) => void;
  /** Enter, leaving the field, or another unit. */
  readonly onLeave?: (draft: QuantityDraft<U>) => void;
  /** The form was sent: say what is wrong even before the field is left, an empty field included. */
  readonly isTold?: boolean;
  /** A fault the owner found in what reads well here. */
  readonly fault?: string | undefined;
  readonly question?: FieldQuestion | undefined;
  readonly description?: string | undefined;
  readonly reading?: string | undefined;
  readonly isLabelHidden?: boolean;
  readonly isReadOnly?: boolean;
  readonly hasInitialFocus?: boolean;
}

/** A number typed as text with its unit in the same field. What was typed is never changed while it can't be read. */
export function QuantityInput<U extends UnitCode>(props: QuantityInputProps<U>) {
  const { label, draft, units, onChange, onLeave, isTold = false, fault, question, description, reading } = props;
  const [isLeft, setLeft] = useState(false);
  const isReadOnly = props.isReadOnly ?? false;
  const read = quantityDraftRead(draft, units);
  const isEmpty = isDraftEmpty(draft);
  const own = (isTold || (isLeft && !isEmpty)) && !read.ok && read.issues[0] ? issueMessage(read.issues[0]) : undefined;
  const leave = (next = draft) => {
    setLeft(true);
    onLeave?.(next);
  };
  return (
    <FieldFrame
      label={label}
      isLabelHidden={props.isLabelHidden ?? false}
      description={description}
      reading={reading}
      fault={own ?? fault}
      question={own ? undefined : question}
    >
      {(wiring) => (
        <div className="quantity-input">
          <input
            {...wiring}
            className="field-control quantity-input-number"
            type="text"
            inputMode="decimal"
            autoComplete="off"
            spellCheck={false}
            readOnly={isReadOnly}
            // biome-ignore lint/a11y/noAutofocus: only in a panel that was opened to type here
            autoFocus={props.hasInitialFocus ?? false}
            value={draft.text}
            onChange={(event) => {
              setLeft(false);
              onChange({ ...draft, text: event.currentTarget.value });
            }}
            onBlur={() => leave()}
            onKeyDown={(event: KeyboardEvent) => event.key === "Enter" && leave()}
          />
          {units.length > 1 ? (
            <select
              className="field-control quantity-input-choice"
              aria-label={`${label}: unit`}
              disabled={isReadOnly}
              value={draft.unit}
              onChange={(event) => {
                const unit = units.find((one) => one === event.currentTarget.value);
                if (!unit) return;
                const next = { ...draft, unit };
                onChange(next);
                if (!isDraftEmpty(next)) leave(next);
              }}
            >
              {units.map((unit) => (
                <option key={unit} value={unit}>
                  {unitSpoken(unit, "screen")}
                </option>
              ))}
            </select>
          ) : (
            <span className="quantity-input-unit">{unitSpoken(draft.unit, "screen")}</span>
          )}
        </div>
      )}
    </FieldFrame>
  );
}
