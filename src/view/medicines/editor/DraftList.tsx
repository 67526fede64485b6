import type { ReactNode } from "react";
import type { DraftNode, DraftPath } from "../../../core/medicine/index.ts";
import { recordWords } from "../../../core/messages/index.ts";
import { Button } from "../../ui/Button.tsx";
import { placeOf, useDraft } from "./draftContext.ts";

export interface DraftListProps {
  readonly path: DraftPath;
  /** What one entry is called: "caution". */
  readonly entry: string;
  readonly entryNew: (list: readonly DraftNode[]) => DraftNode;
  readonly children: (path: DraftPath, index: number) => ReactNode;
  /** The entry has its own way to be taken away. */
  readonly hasOwnAway?: boolean;
}

/** Entries that can be added at the end and taken away. */
export function DraftList({ path, entry, entryNew, children, hasOwnAway = false }: DraftListProps) {
  const { listAt, change, faultAt } = useDraft();
  const list = listAt(path);
  return (
    <div className="draft-list" data-place={placeOf(path)}>
      {list.map((_, index) => {
        const at = [...path, index];
        const fault = faultAt(at);
        return (
          <div key={index} className="draft-entry" data-place={placeOf(at)}>
            {fault ? <p className="draft-fault">{fault}</p> : null}
            {children(at, index)}
            {hasOwnAway ? null : (
              <div className="draft-away">
                <Button
                  kind="quiet"
                  onPress={() => change(at, undefined)}
                  name={recordWords.takeAwayName(recordWords.partOf(entry, index + 1))}
                >
                  {recordWords.takeAway}
                </Button>
              </div>
            )}
          </div>
        );
      })}
      <div>
        <Button onPress={() => change([...path, list.length], entryNew(list))}>{recordWords.add(entry)}</Button>
      </div>
    </div>
  );
}
