import { useState } from "react";
import { issueMessage } from "../../core/messages/index.ts";
import type { Issue } from "../../core/result/index.ts";
import type { Quantity, UnitCode } from "../../core/units/index.ts";
import { type FieldAsk, fieldQuestion } from "./fieldQuestion.ts";
import { QuantityInput } from "./QuantityInput.tsx";
import { isDraftEmpty, type QuantityDraft, quantityDraft, quantityDraftRead } from "./quantityDraft.ts";

export type QuantityAsk<U extends UnitCode> = FieldAsk<Quantity<U>>;

export type QuantityLook<U extends UnitCode> =
  | { readonly kind: "fine" }
  | { readonly kind: "refused"; readonly issue: Issue }
  | { readonly kind: "asked"; readonly ask: QuantityAsk<U> };

export interface QuantityFieldProps<U extends UnitCode> {
  readonly label: string;
  readonly value: Quantity<U> | null;
  readonly units: readonly U[];
  /** Unit chosen while there is no value. */
  readonly unit: U;
  readonly onCommit: (value: Quantity<U> | null, isConfirmed: boolean) => void;
  /** A second look at what reads well: refused, or asked about until it is answered. */
  readonly look?: (value: Quantity<U>) => QuantityLook<U>;
  readonly description?: string | undefined;
  readonly isReadOnly?: boolean;
  readonly isLabelHidden?: boolean;
}

const isSame = (a: Quantity | null, b: Quantity | null) =>
  a === b || (a !== null && b !== null && a.value === b.value && a.unit === b.unit);

/** A quantity of the open case: counts on Enter, on leaving the field, or once the question is answered. Emptied: null. */
export function QuantityField<U extends UnitCode>(props: QuantityFieldProps<U>) {
  const { label, value, units, unit, onCommit, look, description } = props;
  const [draft, setDraft] = useState(() => quantityDraft(value, unit));
  const [seen, setSeen] = useState(value);
  const [fault, setFault] = useState<string>();
  const [asked, setAsked] = useState<QuantityAsk<U>>();

  const readOf = (one: QuantityDraft<U>) => {
    const read = quantityDraftRead(one, units);
    return read.ok ? read.value : null;
  };
  // Undo, another tab or an answer changed it from outside: show that, but leave what reads the same as it was typed.
  if (!isSame(seen, value)) {
    setSeen(value);
    if (!isSame(readOf(draft), value)) {
      setDraft(quantityDraft(value, unit));
      setFault(undefined);
      setAsked(undefined);
    }
  }

  const take = (next: Quantity<U> | null, isConfirmed: boolean) => {
    setAsked(undefined);
    setFault(undefined);
    if (next && !isSame(readOf(draft), next)) setDraft(quantityDraft(next, unit));
    else if (next && /\p{L}/u.test(draft.text)) setDraft(quantityDraft(next, unit));
    onCommit(next, isConfirmed);
  };
  const commit = (left: QuantityDraft<U>) => {
    if (isDraftEmpty(left)) {
      if (value !== null) take(null, false);
      return;
    }
    const next = readOf(left);
    if (next === null || isSame(next, value)) return;
    const looked = look?.(next) ?? { kind: "fine" };
    if (looked.kind === "refused") setFault(issueMessage(looked.issue));
    else if (looked.kind === "asked") setAsked(looked.ask);
    else take(next, false);
  };
  return (
    <QuantityInput
      label={label}
      draft={draft}
      units={units}
      description={description}
      isReadOnly={props.isReadOnly ?? false}
      isLabelHidden={props.isLabelHidden ?? false}
      fault={fault}
      question={fieldQuestion(asked, take)}
      onChange={(next) => {
        setFault(undefined);
        setAsked(undefined);
        setDraft(next);
      }}
      onLeave={commit}
    />
  );
}
