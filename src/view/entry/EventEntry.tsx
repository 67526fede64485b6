import { useState } from "react";
import type { Case, Factor } from "../../core/case/index.ts";
import { eventEffectWords, eventName, eventWords, isEventMoment } from "../../core/messages/index.ts";
import { instantMs, instantText } from "../../core/time/index.ts";
import { Button } from "../ui/Button.tsx";
import { DataTable } from "../ui/DataTable.tsx";
import { useWorkbench } from "../useWorkbench.ts";
import { EventForm } from "./EventForm.tsx";
import { PanelDone } from "./PanelDone.tsx";
import "./entryPanel.css";
import "./EventEntry.css";

export interface EventEntryProps {
  /** The event to be changed at once: its place in the case. */
  readonly index?: number;
  readonly onDone: () => void;
}

/** What happened to the patient: listed, added, changed, taken away; each one undo step. */
export function EventEntry({ index, onDone }: EventEntryProps) {
  const open = useWorkbench((state) => state.open);
  const edit = useWorkbench((state) => state.edit);
  // The event itself, not only its place: an undo may put another one there.
  const [changing, setChanging] = useState<Factor | null>(() =>
    index === undefined || !open || open.role === "reader" ? null : (open.value.patient.factors[index] ?? null),
  );
  if (!open) return null;
  const { value } = open;
  const { factors } = value.patient;
  const isReadOnly = open.role === "reader";
  const place = changing ? factors.indexOf(changing) : -1;
  return (
    <div className="entry-panel">
      <EventTable
        value={value}
        isReadOnly={isReadOnly}
        onChange={(factor) => setChanging(factor)}
        onRemove={(at) => edit("factorRemove", { index: at })}
      />
      {isReadOnly ? null : changing && place >= 0 ? (
        <section aria-labelledby="event-entry-change">
          <h3 id="event-entry-change">
            {eventWords.changing}: {eventName(changing)}
          </h3>
          <EventForm
            key={place}
            value={value}
            event={changing}
            word={eventWords.save}
            onCancel={() => setChanging(null)}
            onEvent={(factor) => {
              edit("factorChange", { index: place, factor });
              setChanging(null);
            }}
          />
        </section>
      ) : (
        <section aria-labelledby="event-entry-add">
          <h3 id="event-entry-add">{eventWords.add}</h3>
          <EventForm
            key="new"
            value={value}
            word={eventWords.add}
            onEvent={(factor) => edit("factorAdd", { factor })}
          />
        </section>
      )}
      <p className="entry-panel-soft">{eventWords.vomitedDose}</p>
      <PanelDone onDone={onDone} />
    </div>
  );
}

interface EventTableProps {
  readonly value: Case;
  readonly isReadOnly: boolean;
  readonly onChange: (factor: Factor) => void;
  readonly onRemove: (index: number) => void;
}

function EventTable({ value, isReadOnly, onChange, onRemove }: EventTableProps) {
  const words = (iso: string) => instantText(instantMs(iso), value.timeZone, "dayClock");
  const rows = value.patient.factors
    .map((factor, index) => ({ factor, index }))
    .sort((a, b) => instantMs(a.factor.from) - instantMs(b.factor.from));
  return (
    <DataTable
      caption={eventWords.list}
      rows={rows}
      rowKey={({ index }) => String(index)}
      empty={eventWords.none}
      columns={[
        {
          id: "what",
          head: eventWords.head.what,
          isRowHead: true,
          cell: ({ factor }) => eventName(factor),
        },
        { id: "from", head: eventWords.head.from, cell: ({ factor }) => words(factor.from) },
        {
          id: "until",
          head: eventWords.head.until,
          cell: ({ factor }) => untilWords(factor, words),
        },
        {
          id: "effect",
          head: eventWords.head.effect,
          cell: ({ factor }) => eventEffectWords(factor) ?? eventWords.noEffect,
        },
        {
          id: "actions",
          head: eventWords.actions,
          isHeadHidden: true,
          align: "end",
          cell: ({ factor, index }) => (
            <span className="event-entry-actions">
              <Button
                kind="quiet"
                isDisabled={isReadOnly}
                onPress={() => onChange(factor)}
                name={`${eventWords.change} ${eventName(factor)}`}
              >
                {eventWords.change}
              </Button>
              <Button
                kind="quiet"
                isDisabled={isReadOnly}
                onPress={() => onRemove(index)}
                name={`${eventWords.remove} ${eventName(factor)}`}
              >
                {eventWords.remove}
              </Button>
            </span>
          ),
        },
      ]}
    />
  );
}

function untilWords(factor: Factor, words: (iso: string) => string): string {
  if (factor.to !== undefined) return words(factor.to);
  return isEventMoment(factor) ? "" : eventWords.goesOn;
}
