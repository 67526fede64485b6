import { type MedicineRecord, unverifiedFigures } from "../../core/medicine/index.ts";
import { medicinesWords, recordWords } from "../../core/messages/index.ts";
import { Notice } from "../ui/Notice.tsx";

/** What a reader has to know before any figure of the record is relied on; nothing where there is nothing to say. */
export function RecordBefore({ record }: { readonly record: MedicineRecord }) {
  const { memory, total } = unverifiedFigures(record);
  const said = [
    ...(record.invented ? [medicinesWords.invented] : []),
    ...(record.review.status === "not-reviewed" ? [recordWords.beforeReview] : []),
    ...(memory > 0 ? [recordWords.beforeUnverified(memory, total)] : []),
    ...(record.estimates.from === "pieced-together" ? [recordWords.beforePieced(record.estimates.text)] : []),
  ];
  if (said.length === 0) return null;
  return (
    <Notice gravity="check" title={record.invented ? medicinesWords.inventedTitle : recordWords.before}>
      <ul className="record-before">
        {said.map((sentence) => (
          <li key={sentence}>{sentence}</li>
        ))}
      </ul>
    </Notice>
  );
}
