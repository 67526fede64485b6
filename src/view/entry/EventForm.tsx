import { type FormEvent, useState } from "react";
import { interactionsFor } from "../../core/analysis/index.ts";
import type { Case, Factor } from "../../core/case/index.ts";
import { eventWords, issueMessage } from "../../core/messages/index.ts";
import { numberPrint } from "../../core/units/index.ts";
import { Button } from "../ui/Button.tsx";
import { ChoiceField } from "../ui/ChoiceField.tsx";
import { InstantInput } from "../ui/InstantInput.tsx";
import { QuantityInput } from "../ui/QuantityInput.tsx";
import { isDraftEmpty, quantityDraftRead } from "../ui/quantityDraft.ts";
import { TextField } from "../ui/TextField.tsx";
import {
  EMPTY_EVENT,
  type EventDraft,
  type EventField,
  eventDraft,
  eventDraftChange,
  eventDraftRead,
  eventDraftWith,
} from "./eventDraft.ts";

export interface EventFormProps {
  readonly value: Case;
  /** The event being changed; without one a new event is typed. */
  readonly event?: Factor;
  readonly word: string;
  readonly onCancel?: () => void;
  readonly onEvent: (event: Factor) => void;
}

/** What an interaction of a record can be about: another medicine, smoking, a genotype. */
const OFFERED_FOR: ReadonlySet<Factor["kind"]> = new Set(["interacting-medicine", "smoking", "other"]);
const KINDS = Object.entries(eventWords.kinds).map(([value, label]) => ({ value: value as Factor["kind"], label }));

/** What happened, when, and what it does to the kinetics if the user has a figure for it. */
export function EventForm({ value, event, word, onEvent, onCancel }: EventFormProps) {
  const [draft, setDraft] = useState<EventDraft>(() => (event ? eventDraft(event, value.timeZone) : EMPTY_EVENT));
  const [isSent, setSent] = useState(false);
  const read = eventDraftRead(draft, value);
  const faultOf = (field: EventField) => {
    const found = read.ok ? undefined : read.issues.find((one) => one.path[0] === field);
    return found && isSent ? issueMessage(found) : undefined;
  };
  const change = (next: Partial<EventDraft>) => {
    setDraft(eventDraftChange(draft, next));
    setSent(false);
  };
  const send = (submitted: FormEvent) => {
    submitted.preventDefault();
    setSent(true);
    if (!read.ok) return;
    onEvent(read.value);
    setDraft(EMPTY_EVENT);
    setSent(false);
  };
  const offered = draft.kind !== null && OFFERED_FOR.has(draft.kind) ? interactionsFor(value) : [];
  const taken = offered.find((one) => eventDraftWith(draft, one, value.medicine).source === draft.source)?.id ?? null;
  const clearance = quantityDraftRead(draft.clearance, ["%"]);
  const instants = { zone: value.timeZone, now: value.now };
  return (
    <form className="entry-panel-form" onSubmit={send} noValidate aria-label={word}>
      <div className="event-entry-row">
        <ChoiceField
          label={eventWords.kind}
          value={draft.kind}
          choices={KINDS}
          prompt={eventWords.kindPrompt}
          fault={faultOf("kind")}
          onChoose={(kind) => change({ kind })}
        />
        <TextField
          label={eventWords.name}
          value={draft.name}
          description={eventWords.nameHelp}
          fault={faultOf("name")}
          maxLength={200}
          onChange={(name) => change({ name })}
        />
      </div>
      <div className="event-entry-pair">
        <InstantInput
          {...instants}
          label={eventWords.from}
          text={draft.from}
          isTold={isSent}
          fault={faultOf("from")}
          onChange={(from) => change({ from })}
        />
        <InstantInput
          {...instants}
          label={eventWords.to}
          text={draft.to}
          isTold={isSent && draft.to.trim() !== ""}
          fault={faultOf("to")}
          description={eventWords.toHelp}
          onChange={(to) => change({ to })}
        />
      </div>
      <fieldset className="event-entry-effect">
        <legend>{eventWords.effect}</legend>
        <p className="entry-panel-soft">{eventWords.effectHelp}</p>
        {offered.length > 0 ? (
          <ChoiceField
            label={eventWords.interaction}
            value={taken}
            prompt={eventWords.interactionPrompt}
            description={eventWords.interactionHelp}
            choices={offered.map(({ id, medicine, parameter, factor }) => ({
              value: id,
              label: eventWords.interactionChoice(
                medicine,
                parameter,
                numberPrint(factor.value * 100, { significant: 4 }),
              ),
            }))}
            onChoose={(id) => {
              const chosen = offered.find((one) => one.id === id);
              if (!chosen) return;
              setDraft(eventDraftWith(draft, chosen, value.medicine));
              setSent(false);
            }}
          />
        ) : null}
        {draft.source === null ? null : <p>{eventWords.sourceIs(draft.source)}</p>}
        <div className="event-entry-three">
          <QuantityInput
            label={eventWords.clearance}
            draft={draft.clearance}
            units={["%"]}
            isTold={isSent && !isDraftEmpty(draft.clearance)}
            fault={faultOf("clearance")}
            reading={
              read.ok && clearance.ok
                ? eventWords.clearanceIs(
                    clearance.value.value / 100,
                    numberPrint(clearance.value.value, { significant: 4 }),
                  )
                : undefined
            }
            onChange={(next) => change({ clearance: next })}
          />
          <QuantityInput
            label={eventWords.volume}
            draft={draft.volume}
            units={["%"]}
            isTold={isSent && !isDraftEmpty(draft.volume)}
            fault={faultOf("volume")}
            onChange={(next) => change({ volume: next })}
          />
          <QuantityInput
            label={eventWords.onset}
            draft={draft.onset}
            units={["d"]}
            isTold={isSent && !isDraftEmpty(draft.onset)}
            fault={faultOf("onset")}
            description={eventWords.onsetHelp}
            onChange={(next) => change({ onset: next })}
          />
        </div>
      </fieldset>
      <div className="entry-panel-buttons">
        <Button kind="main" type="submit">
          {word}
        </Button>
        {onCancel ? (
          <Button kind="quiet" onPress={onCancel}>
            {eventWords.cancel}
          </Button>
        ) : null}
      </div>
    </form>
  );
}
