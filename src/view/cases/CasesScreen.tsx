import { useState } from "react";
import { casesWords, INTENDED_USE, issueMessage } from "../../core/messages/index.ts";
import type { Issue } from "../../core/result/index.ts";
import { FileDropArea } from "../ui/FileDropArea.tsx";
import { FilePicker } from "../ui/FilePicker.tsx";
import { fileSave } from "../ui/fileSave.ts";
import { Notice } from "../ui/Notice.tsx";
import { ScreenHead } from "../ui/ScreenHead.tsx";
import { screenPlaces } from "../ui/screenPlaces.ts";
import { timeZoneHere } from "../ui/timeZones.ts";
import { useWorkbench } from "../useWorkbench.ts";
import { BootNotice } from "./BootNotice.tsx";
import { caseImport, type ImportOutcome } from "./caseImport.ts";
import { DemoCases } from "./DemoCases.tsx";
import { ImportOutcomeNotice } from "./ImportOutcomeNotice.tsx";
import { NewCaseForm } from "./NewCaseForm.tsx";
import { StoredCases } from "./StoredCases.tsx";
import "./CasesScreen.css";

export function CasesScreen() {
  const boot = useWorkbench((state) => state.boot);
  const entries = useWorkbench((state) => state.entries);
  const medicines = useWorkbench((state) => state.medicines);
  const demos = useWorkbench((state) => state.demos);
  const newCase = useWorkbench((state) => state.newCase);
  const openCase = useWorkbench((state) => state.openCase);
  const openDemo = useWorkbench((state) => state.openDemo);
  const removeCase = useWorkbench((state) => state.removeCase);
  const importFile = useWorkbench((state) => state.importFile);
  const exportStored = useWorkbench((state) => state.exportStored);
  const acceptLoss = useWorkbench((state) => state.acceptLoss);
  const show = useWorkbench((state) => state.show);
  const hasOpenCase = useWorkbench((state) => state.open !== null);
  const [outcome, setOutcome] = useState<ImportOutcome | null>(null);
  const [exportFault, setExportFault] = useState<readonly Issue[]>([]);
  const [zone] = useState(timeZoneHere);

  const importOne = async (file: File) => setOutcome(await caseImport(file, importFile));
  const exportOne = async (id: string) => {
    const file = await exportStored(id);
    setExportFault(file.ok ? [] : file.issues);
    if (file.ok) fileSave(file.value.name, file.value.text);
  };
  const canWork = boot.kind === "ready" || boot.kind === "unavailable";
  const canRead = canWork || (boot.kind === "newer" && boot.readable);
  const isEmpty = entries.length === 0;

  return (
    <FileDropArea word={casesWords.importDrop} onFile={(file) => void importOne(file)} isDisabled={!canWork}>
      <ScreenHead places={screenPlaces("cases", show, hasOpenCase)} />
      <main className="cases-screen">
        <header className="cases-screen-head">
          <h1>{casesWords.heading}</h1>
          <p>{casesWords.about}</p>
        </header>
        <div className="cases-screen-notices">
          <BootNotice
            boot={boot}
            zone={zone}
            onAcceptLoss={() => void acceptLoss()}
            onBackup={(file) => void acceptLoss().then(() => importOne(file))}
            onReload={() => location.reload()}
          />
          {outcome ? (
            <ImportOutcomeNotice
              outcome={outcome}
              onOpen={(id) => void openCase(id)}
              onDismiss={() => setOutcome(null)}
            />
          ) : null}
          {exportFault.length > 0 ? (
            <Notice
              gravity="stop"
              title={casesWords.exportFailedTitle}
              onDismiss={() => setExportFault([])}
              isAnnounced
            >
              {exportFault.map((issue, index) => (
                <p key={index}>{issueMessage(issue)}</p>
              ))}
            </Notice>
          ) : null}
        </div>
        {canRead ? (
          <div className={isEmpty ? "cases-screen-empty" : "cases-screen-columns"}>
            {isEmpty ? null : (
              <section aria-labelledby="cases-stored">
                <h2 id="cases-stored">{casesWords.stored}</h2>
                <StoredCases
                  entries={entries}
                  zone={zone}
                  canRemove={canWork}
                  onOpen={(id) => void openCase(id)}
                  onExport={(id) => void exportOne(id)}
                  onRemove={(id) => void removeCase(id)}
                />
              </section>
            )}
            {canWork ? (
              <section aria-labelledby="cases-new">
                <h2 id="cases-new">{isEmpty ? casesWords.newCaseFirst : casesWords.newCase}</h2>
                <NewCaseForm medicines={medicines} onCreate={newCase} />
              </section>
            ) : null}
            {canWork ? (
              <section className="cases-screen-aside" aria-labelledby="cases-demos">
                <h2 id="cases-demos">{isEmpty ? casesWords.demos : casesWords.demosWithCases}</h2>
                <p className="cases-screen-help">{casesWords.demosHelp}</p>
                <DemoCases demos={demos} onOpen={(name) => void openDemo(name)} />
                <h2>{casesWords.importFile}</h2>
                <p className="cases-screen-help">{casesWords.importHelp}</p>
                <div>
                  <FilePicker
                    word={casesWords.importFile}
                    endings={[".json"]}
                    onFile={(file) => void importOne(file)}
                  />
                </div>
              </section>
            ) : null}
          </div>
        ) : null}
        <footer className="cases-screen-foot">{INTENDED_USE}</footer>
      </main>
    </FileDropArea>
  );
}
