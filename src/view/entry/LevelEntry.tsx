import { fitWords, levelWords } from "../../core/messages/index.ts";
import { partId } from "../ui/partId.ts";
import { useWorkbench } from "../useWorkbench.ts";
import { LevelForm } from "./LevelForm.tsx";
import { LevelTable, type OpenLevel } from "./LevelTable.tsx";
import { PanelDone } from "./PanelDone.tsx";
import "./entryPanel.css";
import "./LevelEntry.css";

export interface LevelEntryProps {
  readonly onDone: () => void;
  /** The form of one level, open from the start. */
  readonly opened?: OpenLevel;
}

export function LevelEntry({ onDone, opened }: LevelEntryProps) {
  const open = useWorkbench((state) => state.open);
  const edit = useWorkbench((state) => state.edit);
  if (!open) return null;
  const isReadOnly = open.role === "reader";
  const { result, revision, isFitStale } = open.analysis;
  const isStale = result !== null && (revision !== open.revision || isFitStale);
  const hasFit = result?.fit.kind === "fitted";
  return (
    <div className="entry-panel">
      <div className="level-entry-table">
        <LevelTable
          value={open.value}
          results={result?.levels ?? []}
          isReadOnly={isReadOnly}
          {...(opened ? { opened } : {})}
          onExclude={(id, reason) => edit("levelExclude", { id, reason })}
          onChange={(level) => edit("levelChange", { level })}
          onRemove={(id) => edit("levelRemove", { id })}
        />
        {open.value.levels.length > 0 ? (
          <p className="entry-panel-soft">{hasFit ? fitWords.predictedBy : levelWords.predictedBy}</p>
        ) : null}
        {isStale ? <p className="entry-panel-soft">{levelWords.stale}</p> : null}
      </div>
      {isReadOnly || opened ? null : (
        <section aria-labelledby="level-entry-add">
          <h3 id="level-entry-add">{levelWords.add}</h3>
          <LevelForm
            value={open.value}
            word={levelWords.add}
            onLevel={(level) => edit("levelAdd", { level: { ...level, id: partId() } })}
          />
        </section>
      )}
      <PanelDone onDone={onDone} />
    </div>
  );
}
