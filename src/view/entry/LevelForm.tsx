import { type FormEvent, useState } from "react";
import type { Case, Level } from "../../core/case/index.ts";
import { issueMessage, levelWords } from "../../core/messages/index.ts";
import type { Quantity } from "../../core/units/index.ts";
import { Button } from "../ui/Button.tsx";
import { fieldQuestion } from "../ui/fieldQuestion.ts";
import { InstantInput } from "../ui/InstantInput.tsx";
import type { QuantityAsk } from "../ui/QuantityField.tsx";
import { QuantityInput } from "../ui/QuantityInput.tsx";
import { RadioField } from "../ui/RadioField.tsx";
import { type LevelDraft, type LevelUnit, levelDraft, levelDraftRead, levelLook, levelUnits } from "./levelDraft.ts";

export interface LevelFormProps {
  readonly value: Case;
  /** The level being changed; without one a new level is typed. */
  readonly level?: Level;
  readonly word: string;
  readonly onCancel?: () => void;
  readonly onLevel: (level: Omit<Level, "id" | "excluded">) => void;
}

/** A level is typed with the clock time it was drawn: no time is filled in beforehand. */
export function LevelForm({ value, level, word, onLevel, onCancel }: LevelFormProps) {
  const empty: LevelDraft = {
    quantity: { text: "", unit: value.levels.at(-1)?.quantity.unit ?? value.medicine.displayUnit },
    at: "",
    kind: "measured",
  };
  const [draft, setDraft] = useState(() => (level ? levelDraft(level, value.timeZone) : empty));
  const [isSent, setSent] = useState(false);
  const [asked, setAsked] = useState<QuantityAsk<LevelUnit>>();

  const read = levelDraftRead(draft, value);
  const faultOf = (path: string) => {
    const found = read.ok ? undefined : read.issues.find((one) => one.path[0] === path);
    return found && isSent ? issueMessage(found) : undefined;
  };
  const change = (next: LevelDraft) => {
    setDraft(next);
    setAsked(undefined);
    setSent(false);
  };
  const add = (quantity: Quantity<LevelUnit>, isConfirmed: boolean) => {
    if (!read.ok) return;
    onLevel({ ...read.value, quantity, ...(isConfirmed ? { confirmed: true } : {}) });
    change({ ...empty, quantity: { text: "", unit: quantity.unit } });
  };
  const send = (event: FormEvent) => {
    event.preventDefault();
    setSent(true);
    if (!read.ok) return;
    const { quantity } = read.value;
    const isAnswered =
      level?.confirmed === true && level.quantity.value === quantity.value && level.quantity.unit === quantity.unit;
    if (isAnswered) return add(quantity, true);
    const looked = levelLook(quantity, value.medicine);
    if (looked.kind === "asked") setAsked(looked.ask);
    else add(quantity, false);
  };
  return (
    <form className="entry-panel-form" onSubmit={send} noValidate aria-label={word}>
      <div className="level-entry-row">
        <QuantityInput
          label={levelWords.value}
          draft={draft.quantity}
          units={levelUnits(value, draft.quantity.unit)}
          hasInitialFocus
          isTold={isSent}
          fault={faultOf("quantity")}
          question={fieldQuestion(asked, add)}
          onChange={(quantity) => change({ ...draft, quantity })}
        />
        <InstantInput
          label={levelWords.drawnAt}
          text={draft.at}
          zone={value.timeZone}
          now={value.now}
          isTold={isSent}
          fault={faultOf("at")}
          description={levelWords.drawnHelp}
          onChange={(at) => change({ ...draft, at })}
        />
      </div>
      <RadioField
        label={levelWords.kind}
        value={draft.kind}
        choices={[
          { value: "measured", label: levelWords.measured },
          { value: "below-limit", label: levelWords.belowLimit },
        ]}
        onChoose={(kind) => change({ ...draft, kind })}
      />
      <div className="entry-panel-buttons">
        <Button kind="main" type="submit">
          {word}
        </Button>
        {onCancel ? (
          <Button kind="quiet" onPress={onCancel}>
            {levelWords.cancel}
          </Button>
        ) : null}
      </div>
    </form>
  );
}
