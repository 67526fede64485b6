import {
  BASES,
  type DraftGroup,
  type DraftPath,
  draftTyped,
  isDraftChanged,
  isDraftGroup,
  isSamePath,
} from "../../../core/medicine/index.ts";
import { recordWords } from "../../../core/messages/index.ts";
import { sourceNumber, sourceShort } from "../recordRows.ts";
import { DraftChoice } from "./DraftChoice.tsx";
import { DraftText } from "./DraftText.tsx";
import { useDraft } from "./draftContext.ts";

export interface DraftProvenanceProps {
  /** Of the figure or statement itself. */
  readonly path: DraftPath;
  /** What it said before, in words, for a figure that was changed. */
  readonly before?: ((was: DraftGroup) => string) | undefined;
}

/** Where a figure or statement comes from and how it is known; asked for anew once it says something else. */
export function DraftProvenance({ path, before }: DraftProvenanceProps) {
  const { draft, groupAt, issues } = useDraft();
  const node = groupAt(path);
  const sources = isDraftGroup(draft.sources) ? draft.sources : {};
  const named = Object.fromEntries(
    Object.entries(sources).flatMap(([id, source]) => (isDraftGroup(source) ? [[id, sourceOf(source)]] : [])),
  );
  const isInvented = draft.invented === true;
  const was = node && isDraftChanged(node) && isDraftGroup(node.was) ? node.was : null;
  const isAsked = was !== null && (node?.source === "" || node?.basis === "");
  const isMissing = (field: string) =>
    issues.some(({ code, path: at }) => code === "record-figure-without-source" && isSamePath(at, [...path, field]));
  return (
    <div className="draft-provenance">
      <DraftChoice
        path={[...path, "source"]}
        label={recordWords.sourceField}
        prompt={recordWords.sourcePrompt}
        fault={isMissing("source") ? recordWords.sourceMissing : undefined}
        choices={Object.keys(named).map((value) => ({
          value,
          label: `${sourceShort({ sources: named }, value) || value} [${sourceNumber({ sources: named }, value)}]`,
        }))}
      />
      <DraftChoice
        path={[...path, "basis"]}
        label={recordWords.basisField}
        prompt={recordWords.basisPrompt}
        fault={isMissing("basis") ? recordWords.basisMissing : undefined}
        choices={BASES.filter((each) => isInvented || each !== "invented").map((value) => ({
          value,
          label: recordWords.bases[value],
        }))}
      />
      <DraftText path={[...path, "note"]} label={recordWords.noteField} />
      {was && before ? (
        <p className="draft-was">
          {recordWords.wasBefore(before(was), sourceShort({ sources: named }, draftTyped(was.source)))}{" "}
          {isAsked ? <strong>{recordWords.newSourceAsked}</strong> : null}
        </p>
      ) : null}
    </div>
  );
}

/** A source as far as it has been typed. */
function sourceOf(node: DraftGroup) {
  const text = (key: string) => draftTyped(node[key]).trim();
  return {
    title: text("title"),
    ...(text("authors") === "" ? {} : { authors: text("authors") }),
    ...(text("year") === "" ? {} : { year: text("year") }),
  };
}
