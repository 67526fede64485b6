/** What can be done to a record that is edited: copies, drafts, their steps back, and reading them as a record again. */
export {
  type DraftGroup,
  type DraftNode,
  type DraftPath,
  draftAt,
  draftTyped,
  isDraftGroup,
  isDraftList,
} from "./draftNode.ts";
export { isRecordSame } from "./isRecordSame.ts";
export { recordCopy, recordCopyName, recordNextVersion } from "./recordCopy.ts";
export { isSamePath, type RecordDraft, recordDraft, recordDraftRead } from "./recordDraft.ts";
export { isDraftChanged, recordDraftChange } from "./recordDraftChange.ts";
export {
  historyChange,
  historyRedo,
  historyUndo,
  type RecordDraftHistory,
  recordDraftHistory,
} from "./recordDraftHistory.ts";
export { recordPreview } from "./recordPreview.ts";
