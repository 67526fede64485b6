import { useState } from "react";
import type { MedicineRecord } from "../../core/medicine/index.ts";
import { casesWords, issueMessage, medicinesWords } from "../../core/messages/index.ts";
import type { Issue, Result } from "../../core/result/index.ts";
import { Button } from "../ui/Button.tsx";
import { Dialog } from "../ui/Dialog.tsx";
import { FilePicker } from "../ui/FilePicker.tsx";
import { Notice } from "../ui/Notice.tsx";
import { ScreenHead } from "../ui/ScreenHead.tsx";
import { screenPlaces } from "../ui/screenPlaces.ts";
import { useWorkbench } from "../useWorkbench.ts";
import { RecordPage } from "./RecordPage.tsx";
import { WardWindows } from "./WardWindows.tsx";
import "./MedicinesScreen.css";

export function MedicinesScreen() {
  const medicines = useWorkbench((state) => state.medicines);
  const ownMedicines = useWorkbench((state) => state.ownMedicines);
  const wardWindows = useWorkbench((state) => state.wardWindows);
  const importMedicine = useWorkbench((state) => state.importMedicine);
  const removeMedicine = useWorkbench((state) => state.removeMedicine);
  const saveWindow = useWorkbench((state) => state.saveWindow);
  const removeWindow = useWorkbench((state) => state.removeWindow);
  const show = useWorkbench((state) => state.show);
  const hasOpenCase = useWorkbench((state) => state.open !== null);
  const [chosen, setChosen] = useState<string | null>(null);
  const [outcome, setOutcome] = useState<{ readonly file: string; readonly result: Result<MedicineRecord> } | null>(
    null,
  );
  const [leaving, setLeaving] = useState<MedicineRecord | null>(null);
  const [faults, setFaults] = useState<readonly Issue[]>([]);

  const record = medicines.find((one) => one.id === chosen) ?? medicines[0];
  const importOne = async (file: File) => {
    const result = await importMedicine(file.name, await file.text());
    setOutcome({ file: file.name, result });
    if (result.ok) setChosen(result.value.id);
  };
  const remove = async (one: MedicineRecord) => {
    setLeaving(null);
    const result = await removeMedicine(one.id);
    setFaults(result.ok ? [] : result.issues);
  };
  return (
    <>
      <ScreenHead places={screenPlaces("medicines", show, hasOpenCase)} />
      <main className="medicines-screen">
        <header>
          <h1>{medicinesWords.heading}</h1>
          <p className="medicines-screen-soft">{medicinesWords.about}</p>
        </header>
        {outcome ? (
          <Notice
            gravity={outcome.result.ok ? "note" : "stop"}
            title={outcome.result.ok ? medicinesWords.importedTitle : medicinesWords.refusedTitle(outcome.file)}
            onDismiss={() => setOutcome(null)}
            isAnnounced
          >
            {outcome.result.ok ? (
              <p>{medicinesWords.imported(outcome.result.value.name, outcome.result.value.recordVersion)}</p>
            ) : (
              <IssueList issues={outcome.result.issues} />
            )}
          </Notice>
        ) : null}
        {faults.length > 0 ? (
          <Notice gravity="stop" onDismiss={() => setFaults([])} isAnnounced>
            <IssueList issues={faults} />
          </Notice>
        ) : null}
        <div className="medicines-screen-columns">
          <nav className="medicines-screen-list" aria-label={medicinesWords.list}>
            <ul>
              {medicines.map((one) => (
                <li key={one.id}>
                  <button
                    type="button"
                    className="medicines-screen-choice"
                    aria-current={one.id === record?.id ? "true" : undefined}
                    onClick={() => setChosen(one.id)}
                  >
                    {one.name}
                    <span>{ownMedicines.includes(one.id) ? medicinesWords.own : medicinesWords.builtIn}</span>
                  </button>
                </li>
              ))}
            </ul>
            <div className="medicines-screen-import">
              <FilePicker
                word={medicinesWords.importRecord}
                endings={[".json"]}
                onFile={(file) => void importOne(file)}
              />
              <p className="medicines-screen-soft">{medicinesWords.importHelp}</p>
            </div>
          </nav>
          {record ? (
            <div>
              <RecordPage
                record={record}
                isOwn={ownMedicines.includes(record.id)}
                wardWindows={
                  <WardWindows
                    key={record.id}
                    record={record}
                    windows={wardWindows.filter((one) => one.medicine === record.id)}
                    onSave={saveWindow}
                    onRemove={removeWindow}
                  />
                }
              />
              {ownMedicines.includes(record.id) ? (
                <Button kind="grave" onPress={() => setLeaving(record)}>
                  {medicinesWords.remove}
                </Button>
              ) : null}
            </div>
          ) : null}
        </div>
        <Dialog title={medicinesWords.removeTitle} isOpen={leaving !== null} onClose={() => setLeaving(null)} isAlert>
          {leaving ? (
            <>
              <p>{medicinesWords.removeText(leaving.name)}</p>
              <div className="dialog-actions">
                <Button onPress={() => setLeaving(null)} hasInitialFocus>
                  {medicinesWords.keep}
                </Button>
                <Button kind="grave" onPress={() => void remove(leaving)}>
                  {medicinesWords.removeNow}
                </Button>
              </div>
            </>
          ) : null}
        </Dialog>
      </main>
    </>
  );
}

function IssueList({ issues }: { readonly issues: readonly Issue[] }) {
  return (
    <ul className="medicines-screen-faults">
      {issues.map((issue, index) => (
        <li key={index}>
          {issueMessage(issue)}
          {issue.path.length > 1 ? <span className="medicines-screen-soft"> {casesWords.at(issue.path)}</span> : null}
        </li>
      ))}
    </ul>
  );
}
