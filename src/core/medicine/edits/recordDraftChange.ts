import {
  type DraftGroup,
  type DraftNode,
  type DraftPath,
  draftAt,
  draftPut,
  draftTyped,
  isDraftGroup,
  isDraftList,
} from "./draftNode.ts";
import type { RecordDraft } from "./recordDraft.ts";

/** How a figure is known, and what it is called: changing these does not make it another figure. */
const PROVENANCE = new Set(["source", "basis", "note", "was"]);
const NAMES = new Set(["id", "label", "use", "category"]);

/**
 * The draft with another node at a path; `undefined` takes it away.
 * A figure or statement that comes to say something else loses its source, basis and note, as they spoke for what it said before:
 * its editor has to name new ones. One that comes to say the same again gets them back.
 */
export function recordDraftChange(draft: RecordDraft, path: DraftPath, value: DraftNode | undefined): RecordDraft {
  const next = draftPut(draft, path, value) as RecordDraft;
  for (let depth = path.length; depth >= 0; depth -= 1) {
    const at = path.slice(0, depth);
    const after = draftAt(next, at);
    if (!isDraftGroup(after) || !isDraftGroup(after.was)) continue;
    // "" where the node itself was put in place.
    const key = String(path[depth] ?? "");
    if (PROVENANCE.has(key) || NAMES.has(key)) return next;
    const before = draftAt(draft, at);
    return draftPut(next, at, provenanceFollows(isDraftGroup(before) ? before : {}, after)) as RecordDraft;
  }
  return next;
}

function provenanceFollows(before: DraftGroup, after: DraftGroup): DraftGroup {
  const { note: _, ...bare } = after;
  if (!isDraftChanged(after) && isDraftGroup(after.was)) {
    const { source, basis, note } = after.was;
    return { ...bare, source, basis, ...(note === undefined ? {} : { note }) };
  }
  return isDraftChanged(before) ? after : { ...bare, source: "", basis: "" };
}

/** Whether a figure or statement says something else than when editing began. */
export function isDraftChanged(node: DraftGroup): boolean {
  return isDraftGroup(node.was) && !isSameContent(node, node.was);
}

/** What a node says: its own fields without provenance, names, and figures inside it that have their own source. */
function isSameContent(a: DraftNode | undefined, b: DraftNode | undefined): boolean {
  if (isDraftGroup(a) && isDraftGroup(b)) {
    const keys = new Set([...Object.keys(a), ...Object.keys(b)]);
    return [...keys].every((key) => {
      if (PROVENANCE.has(key) || NAMES.has(key)) return true;
      const [one, other] = [a[key], b[key]];
      return hasOwnSource(one) || hasOwnSource(other) || isSameContent(one, other);
    });
  }
  if (isDraftList(a) && isDraftList(b)) return a.length === b.length && a.every((each, i) => isSameContent(each, b[i]));
  return a === b || (a !== undefined && b !== undefined && draftTyped(a) === draftTyped(b));
}

function hasOwnSource(node: DraftNode | undefined): boolean {
  return isDraftGroup(node) && "source" in node;
}
