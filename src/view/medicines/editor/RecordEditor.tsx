import { useMemo, useState } from "react";
import { referenceCovariates } from "../../../core/analysis/index.ts";
import {
  type DraftNode,
  type DraftPath,
  historyChange,
  historyRedo,
  historyUndo,
  isRecordSame,
  type MedicineRecord,
  type RecordDraftHistory,
  recordDraftRead,
} from "../../../core/medicine/index.ts";
import { issueMessage, recordWords } from "../../../core/messages/index.ts";
import type { Issue, Result } from "../../../core/result/index.ts";
import type { RecordEdit } from "../../../shell/store/medicineState.ts";
import { Button } from "../../ui/Button.tsx";
import { Dialog } from "../../ui/Dialog.tsx";
import { Notice } from "../../ui/Notice.tsx";
import { type ReferenceDraft, referenceDraftRead } from "../trial/referenceDraft.ts";
import { CautionsSection } from "./CautionsSection.tsx";
import { DraftContext } from "./draftContext.ts";
import { EditorFaults } from "./EditorFaults.tsx";
import { EditorSide } from "./EditorSide.tsx";
import { IdentitySection } from "./IdentitySection.tsx";
import { InteractionsSection } from "./InteractionsSection.tsx";
import { KineticsSection } from "./KineticsSection.tsx";
import { LimitsSection } from "./LimitsSection.tsx";
import { PopulationSection } from "./PopulationSection.tsx";
import { ProductsSection } from "./ProductsSection.tsx";
import { ReviewSection } from "./ReviewSection.tsx";
import { SamplingSection } from "./SamplingSection.tsx";
import { SourcesSection } from "./SourcesSection.tsx";
import { VariabilitySection } from "./VariabilitySection.tsx";
import { WindowsSection } from "./WindowsSection.tsx";
import "./RecordEditor.css";

export interface RecordEditorProps {
  /** The record as it is saved. */
  readonly record: MedicineRecord;
  readonly edit: RecordEdit;
  /** null gives the changes up. */
  readonly onKeep: (edit: RecordEdit | null) => void;
  readonly onSave: () => Promise<Result<MedicineRecord>>;
  readonly onLeave: () => void;
  readonly reference: ReferenceDraft;
  readonly onReference: (draft: ReferenceDraft) => void;
}

/** A user's own record as a form. What is typed is kept as typed, right or wrong; only what is right can be saved. */
export function RecordEditor(props: RecordEditorProps) {
  const { record, edit, onKeep, onSave, onLeave, reference, onReference } = props;
  const { history } = edit;
  const { draft } = history;
  const read = useMemo(() => recordDraftRead(draft), [draft]);
  const issues = read.ok ? [] : read.issues;
  const isClean = history.undo.length === 0 && read.ok && isRecordSame(read.value, record);
  const [faults, setFaults] = useState<readonly Issue[]>([]);
  const [isGivingUp, setGivingUp] = useState(false);
  const step = (next: RecordDraftHistory) => onKeep({ ...edit, history: next });
  const change = (path: DraftPath, value: DraftNode | undefined) => step(historyChange(history, path, value));
  const save = async () => {
    const outcome = await onSave();
    setFaults(outcome.ok ? [] : outcome.issues);
  };
  const isReviewLost =
    !isClean && record.review.status === "reviewed" && read.ok && isRecordSame(read.value.review, record.review);
  return (
    <DraftContext value={{ draft, change, issues }}>
      <div className="editor">
        <header className="editor-head">
          <h2>{recordWords.editing(record.name)}</h2>
          <p className="record-page-state">
            {recordWords.editorAbout(record.recordVersion + 1)} {recordWords.frozen}
          </p>
          {edit.recordVersion === record.recordVersion ? null : (
            <Notice gravity="check">
              <p>{recordWords.overtaken(record.recordVersion, edit.recordVersion)}</p>
            </Notice>
          )}
          {isReviewLost ? <p className="editor-state">{recordWords.reviewGone}</p> : null}
          {faults.length > 0 ? (
            <Notice gravity="stop" title={recordWords.notSavedTitle} onDismiss={() => setFaults([])} isAnnounced>
              {faults.map((each, index) => (
                <p key={index}>{issueMessage(each)}</p>
              ))}
            </Notice>
          ) : null}
        </header>
        <div className="editor-bar">
          <div className="editor-actions">
            <Button kind="main" isDisabled={!read.ok || isClean} onPress={() => void save()}>
              {recordWords.save(record.recordVersion + 1)}
            </Button>
            <Button isDisabled={history.undo.length === 0} onPress={() => step(historyUndo(history))}>
              {recordWords.stepUndo}
            </Button>
            <Button isDisabled={history.redo.length === 0} onPress={() => step(historyRedo(history))}>
              {recordWords.stepRedo}
            </Button>
            <Button onPress={onLeave}>{recordWords.leave}</Button>
            {isClean ? null : (
              <Button kind="grave" onPress={() => setGivingUp(true)}>
                {recordWords.giveUp}
              </Button>
            )}
          </div>
          <p className="editor-state" role="status">
            {issues.length > 0 ? recordWords.inTheWay(issues.length) : isClean ? recordWords.clean : recordWords.ready}
          </p>
        </div>
        <div className="editor-form">
          <IdentitySection />
          <KineticsSection covariates={referenceCovariates(referenceDraftRead(reference))} />
          <ProductsSection />
          <WindowsSection />
          <LimitsSection />
          <SamplingSection />
          <InteractionsSection />
          <CautionsSection />
          <PopulationSection />
          <VariabilitySection />
          <SourcesSection />
          <ReviewSection />
        </div>
        <EditorSide draft={draft} base={record} reference={reference} onReference={onReference}>
          <EditorFaults issues={issues} />
        </EditorSide>
      </div>
      <Dialog title={recordWords.giveUpTitle} isOpen={isGivingUp} onClose={() => setGivingUp(false)} isAlert>
        <p>{recordWords.giveUpText(record.name, record.recordVersion)}</p>
        <div className="dialog-actions">
          <Button onPress={() => setGivingUp(false)} hasInitialFocus>
            {recordWords.keepOn}
          </Button>
          <Button
            kind="grave"
            onPress={() => {
              setGivingUp(false);
              onKeep(null);
              onLeave();
            }}
          >
            {recordWords.giveUpNow}
          </Button>
        </div>
      </Dialog>
    </DraftContext>
  );
}
