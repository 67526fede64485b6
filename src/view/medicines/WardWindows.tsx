import { type FormEvent, useState } from "react";
import type { TargetWindow } from "../../core/case/index.ts";
import type { MedicineRecord } from "../../core/medicine/index.ts";
import { issueMessage, medicinesWords } from "../../core/messages/index.ts";
import type { Issue } from "../../core/result/index.ts";
import type { WorkbenchState } from "../../shell/store/workbenchState.ts";
import { Button } from "../ui/Button.tsx";
import { DataTable } from "../ui/DataTable.tsx";
import { Notice } from "../ui/Notice.tsx";
import { partId } from "../ui/partId.ts";
import { WindowFields } from "../ui/WindowFields.tsx";
import {
  type WindowAsk,
  type WindowDraft,
  windowAsk,
  windowDraftEmpty,
  windowDraftRead,
  windowUnitsFor,
} from "../ui/windowDraft.ts";
import { windowValue } from "./recordRows.ts";

export interface WardWindowsProps {
  readonly record: MedicineRecord;
  readonly windows: readonly { readonly id: string; readonly window: TargetWindow }[];
  readonly onSave: WorkbenchState["saveWindow"];
  readonly onRemove: WorkbenchState["removeWindow"];
}

/** The windows a ward keeps of its own for one medicine, offered on the bench beside those of the record. */
export function WardWindows({ record, windows, onSave, onRemove }: WardWindowsProps) {
  const [draft, setDraft] = useState<WindowDraft | null>(null);
  const [isSent, setSent] = useState(false);
  const [asked, setAsked] = useState<WindowAsk | null>(null);
  const [faults, setFaults] = useState<readonly Issue[]>([]);

  const change = (next: WindowDraft | null) => {
    setDraft(next);
    setAsked(null);
  };
  const store = async (taken: WindowDraft, isConfirmed: boolean) => {
    const read = windowDraftRead(taken);
    if (!read.ok) return;
    change(taken);
    const window = { ...read.value, ...(isConfirmed ? { confirmed: true as const } : {}) };
    const outcome = await onSave(record.id, partId(), window);
    setFaults(outcome.ok ? [] : outcome.issues);
    if (!outcome.ok) return;
    change(null);
    setSent(false);
  };
  const send = async (event: FormEvent) => {
    event.preventDefault();
    setSent(true);
    if (!draft || !windowDraftRead(draft).ok) return;
    const ask = windowAsk(draft, record);
    if (ask) setAsked(ask);
    else await store(draft, false);
  };
  const remove = async (id: string) => {
    const outcome = await onRemove(record.id, id);
    setFaults(outcome.ok ? [] : outcome.issues);
  };
  return (
    <div className="ward-windows">
      <DataTable
        caption={medicinesWords.wardWindows}
        rows={windows}
        rowKey={(row) => row.id}
        empty={medicinesWords.wardWindowsNone}
        columns={[
          { id: "window", head: medicinesWords.window, isRowHead: true, cell: (row) => windowValue(row.window) },
          { id: "basis", head: medicinesWords.basis, cell: (row) => row.window.basis },
          {
            id: "remove",
            head: medicinesWords.remove,
            isHeadHidden: true,
            align: "end",
            cell: (row) => (
              <Button
                kind="quiet"
                onPress={() => void remove(row.id)}
                name={`${medicinesWords.removeWindow} ${windowValue(row.window)}`}
              >
                {medicinesWords.removeWindow}
              </Button>
            ),
          },
        ]}
      />
      {faults.map((fault, index) => (
        <Notice key={index} gravity="stop" isAnnounced>
          <p>{issueMessage(fault)}</p>
        </Notice>
      ))}
      {draft ? (
        <form className="ward-windows-form" onSubmit={(event) => void send(event)} noValidate>
          <WindowFields
            draft={draft}
            onChange={change}
            molarMass={record.molarMass.value}
            isTold={isSent}
            units={windowUnitsFor(draft, record)}
            question={
              asked
                ? {
                    text: asked.text,
                    answers: asked.answers.map((answer) => ({
                      label: answer.label,
                      onAnswer: () => void store(answer.draft, answer.isConfirmed),
                    })),
                  }
                : undefined
            }
          />
          <div className="dialog-actions">
            <Button onPress={() => change(null)}>{medicinesWords.cancel}</Button>
            <Button kind="main" type="submit">
              {medicinesWords.wardWindowStore}
            </Button>
          </div>
        </form>
      ) : (
        <div>
          <Button onPress={() => change(windowDraftEmpty(record))}>{medicinesWords.wardWindowAdd}</Button>
        </div>
      )}
    </div>
  );
}
