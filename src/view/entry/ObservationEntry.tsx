import { type FormEvent, useState } from "react";
import type { Case, Observation } from "../../core/case/index.ts";
import { issueMessage, patientWords } from "../../core/messages/index.ts";
import { type Issue, issue } from "../../core/result/index.ts";
import { instantMs, instantRead, instantText } from "../../core/time/index.ts";
import { type Quantity, quantityPrint, type UnitCode } from "../../core/units/index.ts";
import { Button } from "../ui/Button.tsx";
import { DataTable } from "../ui/DataTable.tsx";
import { fieldQuestion } from "../ui/fieldQuestion.ts";
import { InstantInput, instantTyped } from "../ui/InstantInput.tsx";
import type { QuantityAsk, QuantityLook } from "../ui/QuantityField.tsx";
import { QuantityInput } from "../ui/QuantityInput.tsx";
import { quantityDraft, quantityDraftRead } from "../ui/quantityDraft.ts";

export interface ObservationEntryProps<U extends UnitCode> {
  readonly value: Case;
  readonly words: { readonly label: string; readonly list: string; readonly none: string; readonly at: string };
  readonly observations: readonly Observation[];
  readonly units: readonly U[];
  readonly unit: U;
  readonly look: (typed: Quantity<U>) => QuantityLook<U>;
  readonly onAdd: (at: string, quantity: Quantity<U>, isConfirmed: boolean) => void;
  readonly onRemove: (id: string) => void;
  readonly isReadOnly: boolean;
}

/** What was measured of one kind, and a line to add the next: value, unit, clock time (the now line until another is typed). */
export function ObservationEntry<U extends UnitCode>(props: ObservationEntryProps<U>) {
  const { value, words, observations, units, unit, look, onAdd, onRemove, isReadOnly } = props;
  const { timeZone: zone, now } = value;
  const [draft, setDraft] = useState(() => quantityDraft<U>(null, unit));
  const [atText, setAtText] = useState(() => instantTyped(now, zone));
  const [isSent, setSent] = useState(false);
  const [fault, setFault] = useState<string>();
  const [asked, setAsked] = useState<QuantityAsk<U>>();

  const at = instantRead(atText, zone, now);
  const atFault = at.ok ? observationAtFault(at.value, value) : null;
  const add = (quantity: Quantity<U>, isConfirmed: boolean) => {
    if (!at.ok || atFault) return;
    onAdd(at.value, quantity, isConfirmed);
    setDraft(quantityDraft<U>(null, quantity.unit));
    setAsked(undefined);
    setSent(false);
  };
  const send = (event: FormEvent) => {
    event.preventDefault();
    setSent(true);
    const read = quantityDraftRead(draft, units);
    if (!read.ok || !at.ok || atFault) return;
    const looked = look(read.value);
    if (looked.kind === "refused") setFault(issueMessage(looked.issue));
    else if (looked.kind === "asked") setAsked(looked.ask);
    else add(read.value, false);
  };
  return (
    <div className="observation-entry">
      <DataTable
        caption={words.list}
        rows={observations}
        rowKey={(row) => row.id}
        empty={words.none}
        columns={[
          {
            id: "value",
            head: patientWords.value,
            isRowHead: true,
            cell: (row) => (
              <span>
                {quantityPrint(row.quantity, { style: "screen" })}
                {row.confirmed ? <span className="entry-panel-soft"> ({patientWords.confirmed})</span> : null}
              </span>
            ),
          },
          { id: "at", head: words.at.toLowerCase(), cell: (row) => instantText(instantMs(row.at), zone, "full") },
          {
            id: "remove",
            head: patientWords.remove,
            isHeadHidden: true,
            align: "end",
            cell: (row) => (
              <Button
                kind="quiet"
                isDisabled={isReadOnly}
                onPress={() => onRemove(row.id)}
                name={`${patientWords.remove} ${quantityPrint(row.quantity, { style: "screen" })}`}
              >
                {patientWords.remove}
              </Button>
            ),
          },
        ]}
      />
      {isReadOnly ? null : (
        <form className="observation-entry-form" onSubmit={send} noValidate>
          <QuantityInput
            label={words.label}
            draft={draft}
            units={units}
            isTold={isSent}
            fault={fault}
            question={fieldQuestion(asked, add)}
            onChange={(next) => {
              setFault(undefined);
              setAsked(undefined);
              setSent(false);
              setDraft(next);
            }}
          />
          <InstantInput
            label={words.at}
            text={atText}
            onChange={setAtText}
            zone={zone}
            now={now}
            isTold={isSent}
            fault={atFault ? issueMessage(atFault) : undefined}
          />
          <Button type="submit">{patientWords.add}</Button>
        </form>
      )}
    </div>
  );
}

function observationAtFault(at: string, { now, timeZone }: Case): Issue | null {
  if (instantMs(at) <= instantMs(now)) return null;
  const words = (iso: string) => instantText(instantMs(iso), timeZone, "dayClock");
  return issue("observation-after-now", { at: words(at), now: words(now) });
}
