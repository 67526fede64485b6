import { useState } from "react";
import type { TargetWindow } from "../../core/case/index.ts";
import type { MedicineRecord } from "../../core/medicine/index.ts";
import { issueMessage, medicinesWords } from "../../core/messages/index.ts";
import type { Issue } from "../../core/result/index.ts";
import type { WorkbenchState } from "../../shell/store/workbenchState.ts";
import { Button } from "../ui/Button.tsx";
import { DataTable } from "../ui/DataTable.tsx";
import { Notice } from "../ui/Notice.tsx";
import { partId } from "../ui/partId.ts";
import { NO_WINDOW_TYPED, WindowForm } from "../ui/WindowForm.tsx";
import { type WindowDraft, windowDraftEmpty } from "../ui/windowDraft.ts";
import { windowValue } from "./recordRows.ts";

export interface WardWindowsProps {
  readonly record: MedicineRecord;
  readonly windows: readonly { readonly id: string; readonly window: TargetWindow }[];
  readonly onSave: WorkbenchState["saveWindow"];
  readonly onRemove: WorkbenchState["removeWindow"];
}

/** The windows a ward keeps of its own for one medicine, offered on the bench beside those of the record. */
export function WardWindows({ record, windows, onSave, onRemove }: WardWindowsProps) {
  const [typed, setTyped] = useState(NO_WINDOW_TYPED);
  const [faults, setFaults] = useState<readonly Issue[]>([]);

  /** Begins anew, without what was said of an entry before it; null closes the form. */
  const begin = (draft: WindowDraft | null) => {
    setTyped({ ...NO_WINDOW_TYPED, draft });
    setFaults([]);
  };
  const store = async (window: TargetWindow) => {
    const outcome = await onSave(record.id, partId(), window);
    setFaults(outcome.ok ? [] : outcome.issues);
    if (outcome.ok) setTyped(NO_WINDOW_TYPED);
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
      {typed.draft ? (
        <WindowForm
          className="ward-windows-form"
          typed={typed}
          onTyped={setTyped}
          record={record}
          onWindow={(window) => void store(window)}
        >
          <div className="dialog-actions">
            <Button onPress={() => begin(null)}>{medicinesWords.cancel}</Button>
            <Button kind="main" type="submit">
              {medicinesWords.wardWindowStore}
            </Button>
          </div>
        </WindowForm>
      ) : (
        <div>
          <Button onPress={() => begin(windowDraftEmpty(record))}>{medicinesWords.wardWindowAdd}</Button>
        </div>
      )}
    </div>
  );
}
