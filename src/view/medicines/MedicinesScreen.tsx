import { useState } from "react";
import type { MedicineRecord } from "../../core/medicine/index.ts";
import { casesWords, issueMessage, medicinesWords, recordWords } from "../../core/messages/index.ts";
import type { Issue, Result } from "../../core/result/index.ts";
import { Button } from "../ui/Button.tsx";
import { FilePicker } from "../ui/FilePicker.tsx";
import { fileSave } from "../ui/fileSave.ts";
import { Notice } from "../ui/Notice.tsx";
import { ScreenHead } from "../ui/ScreenHead.tsx";
import { screenPlaces } from "../ui/screenPlaces.ts";
import { useWorkbench } from "../useWorkbench.ts";
import { RecordEditor } from "./editor/RecordEditor.tsx";
import { RecordCompare } from "./RecordCompare.tsx";
import { RecordList } from "./RecordList.tsx";
import { RecordPage } from "./RecordPage.tsx";
import { REFERENCE_AT_FIRST } from "./trial/referenceDraft.ts";
import { WardWindows } from "./WardWindows.tsx";
import "./MedicinesScreen.css";

type Mode = "read" | "edit" | "compare";

/** What is said at the top: something done, or something refused with its reasons. */
interface Said {
  readonly title: string;
  readonly text: string;
  readonly issues: readonly Issue[];
}

export function MedicinesScreen() {
  const medicines = useWorkbench((state) => state.medicines);
  const ownMedicines = useWorkbench((state) => state.ownMedicines);
  const wardWindows = useWorkbench((state) => state.wardWindows);
  const recordEdits = useWorkbench((state) => state.recordEdits);
  const importMedicine = useWorkbench((state) => state.importMedicine);
  const exportMedicine = useWorkbench((state) => state.exportMedicine);
  const copyMedicine = useWorkbench((state) => state.copyMedicine);
  const removeMedicine = useWorkbench((state) => state.removeMedicine);
  const startRecordEdit = useWorkbench((state) => state.startRecordEdit);
  const keepRecordEdit = useWorkbench((state) => state.keepRecordEdit);
  const saveRecordEdit = useWorkbench((state) => state.saveRecordEdit);
  const saveWindow = useWorkbench((state) => state.saveWindow);
  const removeWindow = useWorkbench((state) => state.removeWindow);
  const show = useWorkbench((state) => state.show);
  const hasOpenCase = useWorkbench((state) => state.open !== null);
  const [chosen, setChosen] = useState<string | null>(null);
  const [mode, setMode] = useState<Mode>("read");
  const [said, setSaid] = useState<Said | null>(null);
  const [reference, setReference] = useState(REFERENCE_AT_FIRST);

  const record = medicines.find((one) => one.id === chosen) ?? medicines[0];
  const isOwn = record !== undefined && ownMedicines.includes(record.id);
  const choose = (id: string, next: Mode = "read") => {
    setChosen(id);
    setMode(next);
  };
  const refuse = (title: string, issues: readonly Issue[]) => setSaid({ title, text: "", issues });

  const importOne = async (file: File) => {
    const result: Result<MedicineRecord> = await importMedicine(file.name, await file.text());
    if (!result.ok) return refuse(medicinesWords.refusedTitle(file.name), result.issues);
    const { id, name, recordVersion } = result.value;
    setSaid({ title: medicinesWords.importedTitle, text: medicinesWords.imported(name, recordVersion), issues: [] });
    choose(id);
  };
  const copy = async (id: string) => {
    const result = await copyMedicine(id);
    if (!result.ok) return refuse(recordWords.notSavedTitle, result.issues);
    setSaid(null);
    startRecordEdit(result.value.id);
    choose(result.value.id, "edit");
  };
  const edit = (one: MedicineRecord) => {
    setSaid(null);
    startRecordEdit(one.id);
    setMode("edit");
  };
  const save = async (id: string) => {
    const result = await saveRecordEdit(id);
    if (result.ok) {
      setMode("read");
      const text = recordWords.saved(result.value.name, result.value.recordVersion);
      setSaid({ title: recordWords.savedTitle, text, issues: [] });
    }
    return result;
  };
  const remove = async (id: string) => {
    const result = await removeMedicine(id);
    if (!result.ok) refuse(recordWords.notRemovedTitle, result.issues);
    else setSaid(null);
  };
  const exportOne = (id: string) => {
    const file = exportMedicine(id);
    fileSave(file.name, file.text);
  };
  const leaveEditor = () => {
    if (record && recordEdits[record.id]?.history.undo.length === 0) keepRecordEdit(record.id, null);
    setMode("read");
  };

  const openEdit = record && isOwn ? recordEdits[record.id] : undefined;
  const original = record && medicines.find((one) => one.id === record.copyOf?.id);
  const second = original ?? medicines.find((one) => one.id !== record?.id);
  return (
    <>
      <ScreenHead places={screenPlaces("medicines", show, hasOpenCase)} />
      <main className="medicines-screen">
        <header>
          <h1>{medicinesWords.heading}</h1>
          <p className="medicines-screen-soft">{medicinesWords.about}</p>
        </header>
        {said ? (
          <Notice
            gravity={said.issues.length > 0 ? "stop" : "note"}
            title={said.title}
            onDismiss={() => setSaid(null)}
            isAnnounced
          >
            {said.text === "" ? null : <p>{said.text}</p>}
            {said.issues.length > 0 ? <IssueList issues={said.issues} /> : null}
          </Notice>
        ) : null}
        {record && mode === "edit" && openEdit ? (
          <RecordEditor
            key={record.id}
            record={record}
            edit={openEdit}
            onKeep={(next) => keepRecordEdit(record.id, next)}
            onSave={() => save(record.id)}
            onLeave={leaveEditor}
            reference={reference}
            onReference={setReference}
          />
        ) : record && second && mode === "compare" ? (
          <RecordCompare
            key={record.id}
            records={medicines}
            first={original ?? record}
            second={original ? record : second}
            edited={Object.keys(recordEdits)}
            onLeave={() => setMode("read")}
            reference={reference}
            onReference={setReference}
          />
        ) : (
          <div className="medicines-screen-columns">
            <RecordList
              records={medicines}
              own={ownMedicines}
              edited={Object.keys(recordEdits)}
              chosen={record?.id}
              onChoose={choose}
            >
              <div className="medicines-screen-import">
                <FilePicker
                  word={medicinesWords.importRecord}
                  endings={[".json"]}
                  onFile={(file) => void importOne(file)}
                />
                <p className="medicines-screen-soft">{medicinesWords.importHelp}</p>
              </div>
            </RecordList>
            {record ? (
              <RecordPage
                record={record}
                isOwn={isOwn}
                original={original}
                actions={
                  <>
                    <p className="record-page-state">{isOwn ? recordWords.frozen : recordWords.builtInFixed}</p>
                    <div className="record-page-actions">
                      {isOwn ? (
                        <Button kind="main" onPress={() => edit(record)}>
                          {openEdit ? recordWords.editOn : recordWords.edit}
                        </Button>
                      ) : null}
                      <Button kind={isOwn ? "plain" : "main"} onPress={() => void copy(record.id)}>
                        {recordWords.copy}
                      </Button>
                      <Button onPress={() => setMode("compare")}>{recordWords.compare}</Button>
                      <Button onPress={() => exportOne(record.id)}>{recordWords.export}</Button>
                      {isOwn ? (
                        <Button kind="grave" onPress={() => void remove(record.id)}>
                          {recordWords.remove}
                        </Button>
                      ) : null}
                    </div>
                  </>
                }
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
            ) : null}
          </div>
        )}
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
