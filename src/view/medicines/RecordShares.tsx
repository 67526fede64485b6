import { BASES, type MedicineRecord, recordFigures } from "../../core/medicine/index.ts";
import { recordWords } from "../../core/messages/index.ts";
import { numberPrint } from "../../core/units/index.ts";

/** How many of a record's figures are known in which way, as a list and a bar of the same shares. */
export function RecordShares({ record }: { readonly record: MedicineRecord }) {
  const figures = recordFigures(record);
  const shares = BASES.map((basis) => ({ basis, count: figures.filter((each) => each.basis === basis).length })).filter(
    ({ count }) => count > 0,
  );
  return (
    <section>
      <h3>{recordWords.shares}</h3>
      <div className="record-shares-bar" aria-hidden="true">
        {shares.map(({ basis, count }) => (
          <span
            key={basis}
            className={`record-share record-share-${basis.replace(" ", "-")}`}
            style={{ flexGrow: count }}
          />
        ))}
      </div>
      <ul className="record-shares">
        {shares.map(({ basis, count }) => (
          <li key={basis}>
            <span className={`record-share-key record-share-${basis.replace(" ", "-")}`} aria-hidden="true" />
            {recordWords.bases[basis]}:{" "}
            {recordWords.share(count, numberPrint((100 * count) / figures.length, { significant: 2 }))}
          </li>
        ))}
      </ul>
    </section>
  );
}
