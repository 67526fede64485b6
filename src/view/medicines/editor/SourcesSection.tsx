import { type DraftNode, isDraftGroup, isDraftList } from "../../../core/medicine/index.ts";
import { recordWords } from "../../../core/messages/index.ts";
import { Button } from "../../ui/Button.tsx";
import { DraftSection } from "./DraftSection.tsx";
import { DraftText } from "./DraftText.tsx";
import { placeOf, useDraft } from "./draftContext.ts";

export function SourcesSection() {
  const { draft, groupAt, change } = useDraft();
  const sources = groupAt(["sources"]) ?? {};
  const ids = Object.keys(sources);
  const { sources: _, ...rest } = draft;
  const used = sourcesUsed(rest);
  return (
    <DraftSection id="sources" heading={recordWords.section.sources} roots={["sources"]}>
      {ids.map((id, index) => (
        <div key={id} className="draft-entry" data-place={placeOf(["sources", id])}>
          <h4>{recordWords.partOf(recordWords.source1, index + 1)}</h4>
          <DraftText path={["sources", id, "title"]} label={recordWords.sourceTitle} isMultiline />
          <div className="draft-triple">
            <DraftText path={["sources", id, "authors"]} label={recordWords.sourceAuthors} />
            <DraftText path={["sources", id, "year"]} label={recordWords.sourceYear} />
            <DraftText path={["sources", id, "place"]} label={recordWords.sourcePlace} />
          </div>
          {used.has(id) ? (
            <p className="draft-help">{recordWords.sourceInUse}</p>
          ) : (
            <div className="draft-away">
              <Button
                kind="quiet"
                onPress={() => change(["sources", id], undefined)}
                name={recordWords.takeAwayName(recordWords.partOf(recordWords.source1, index + 1))}
              >
                {recordWords.takeAway}
              </Button>
            </div>
          )}
        </div>
      ))}
      <div>
        <Button onPress={() => change(["sources", sourceId(ids)], { title: "" })}>
          {recordWords.add(recordWords.source1)}
        </Button>
      </div>
    </DraftSection>
  );
}

/** Ids of the sources that anything in the draft names now, its former self left aside. */
function sourcesUsed(node: DraftNode): ReadonlySet<string> {
  const used = new Set<string>();
  const visit = (each: DraftNode | undefined, key: string): void => {
    if (key === "source" && typeof each === "string" && each !== "") used.add(each);
    else if (isDraftList(each)) for (const one of each) visit(one, "");
    else if (isDraftGroup(each)) for (const [name, one] of Object.entries(each)) if (name !== "was") visit(one, name);
  };
  visit(node, "");
  return used;
}

function sourceId(ids: readonly string[]): string {
  for (let count = ids.length + 1; ; count += 1) {
    const id = `source-${count}`;
    if (!ids.includes(id)) return id;
  }
}
