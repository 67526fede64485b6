import { type DraftGroup, type DraftPath, draftTyped } from "../../../core/medicine/index.ts";
import { DraftProvenance } from "./DraftProvenance.tsx";
import { DraftText } from "./DraftText.tsx";
import { placeOf } from "./draftContext.ts";

/** A sentence of the record with its source. */
export function DraftStatement({ path, label }: { readonly path: DraftPath; readonly label: string }) {
  return (
    <div className="draft-statement" data-place={placeOf(path)}>
      <DraftText path={[...path, "text"]} label={label} isMultiline />
      <DraftProvenance path={path} before={(was) => `“${draftTyped(was.text)}”`} />
    </div>
  );
}

export function statementNew(): DraftGroup {
  return { text: "", source: "", basis: "" };
}
