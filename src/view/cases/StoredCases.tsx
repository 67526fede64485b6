import { useState } from "react";
import { casesWords } from "../../core/messages/index.ts";
import { instantText } from "../../core/time/index.ts";
import type { CaseEntry } from "../../shell/store/ports.ts";
import { Button } from "../ui/Button.tsx";
import { DataTable } from "../ui/DataTable.tsx";
import { Dialog } from "../ui/Dialog.tsx";

export interface StoredCasesProps {
  readonly entries: readonly CaseEntry[];
  readonly zone: string;
  readonly canRemove: boolean;
  readonly onOpen: (id: string) => void;
  readonly onExport: (id: string) => void;
  readonly onRemove: (id: string) => void;
}

export function StoredCases({ entries, zone, canRemove, onOpen, onExport, onRemove }: StoredCasesProps) {
  const [leaving, setLeaving] = useState<CaseEntry | null>(null);
  const labelOf = (entry: CaseEntry) => entry.label || casesWords.unlabelled;
  return (
    <>
      <DataTable
        caption={casesWords.stored}
        isCaptionHidden
        rows={[...entries].sort((a, b) => b.savedAt - a.savedAt)}
        rowKey={(entry) => entry.id}
        columns={[
          {
            id: "label",
            head: casesWords.caseLabel,
            isRowHead: true,
            cell: (entry) => (
              <span>
                <strong>{labelOf(entry)}</strong>
                {entry.demo ? " " : null}
                {entry.demo ? <span className="cases-screen-demo">{casesWords.demoMark}</span> : null}
              </span>
            ),
          },
          { id: "medicine", head: casesWords.medicine, cell: (entry) => entry.medicine },
          { id: "saved", head: casesWords.savedWhen, cell: (entry) => instantText(entry.savedAt, zone, "typed") },
          {
            id: "actions",
            head: casesWords.actions,
            isHeadHidden: true,
            align: "end",
            cell: (entry) => (
              <span className="cases-screen-row-actions">
                <Button onPress={() => onOpen(entry.id)} name={`${casesWords.open} ${labelOf(entry)}`}>
                  {casesWords.open}
                </Button>
                <Button
                  kind="quiet"
                  onPress={() => onExport(entry.id)}
                  name={`${casesWords.exportFile} ${labelOf(entry)}`}
                >
                  {casesWords.exportFile}
                </Button>
                <Button
                  kind="quiet"
                  isDisabled={!canRemove}
                  onPress={() => setLeaving(entry)}
                  name={`${casesWords.remove} ${labelOf(entry)}`}
                >
                  {casesWords.remove}
                </Button>
              </span>
            ),
          },
        ]}
      />
      <Dialog title={casesWords.removeTitle} isOpen={leaving !== null} onClose={() => setLeaving(null)} isAlert>
        {leaving ? (
          <>
            <p>{casesWords.removeText(labelOf(leaving))}</p>
            <div className="dialog-actions">
              <Button onPress={() => onExport(leaving.id)}>{casesWords.exportFirst}</Button>
              <Button onPress={() => setLeaving(null)} hasInitialFocus>
                {casesWords.keep}
              </Button>
              <Button
                kind="grave"
                onPress={() => {
                  onRemove(leaving.id);
                  setLeaving(null);
                }}
              >
                {casesWords.removeNow}
              </Button>
            </div>
          </>
        ) : null}
      </Dialog>
    </>
  );
}
