import type { ReactNode } from "react";
import { type MedicineRecord, type Product, unverifiedFigures } from "../../core/medicine/index.ts";
import { medicinesWords } from "../../core/messages/index.ts";
import { Notice } from "../ui/Notice.tsx";
import { RecordStatements } from "./RecordStatements.tsx";
import { RecordTable } from "./RecordTable.tsx";
import { kineticsRows, productRows, variabilityRows, windowRows } from "./recordRows.ts";
import "./RecordPage.css";

export interface RecordPageProps {
  readonly record: MedicineRecord;
  readonly isOwn: boolean;
  /** Under the record's own windows: the ward's. */
  readonly wardWindows: ReactNode;
}

/** One record, every figure with its unit, source and basis. */
export function RecordPage({ record, isOwn, wardWindows }: RecordPageProps) {
  const unverified = unverifiedFigures(record);
  const { review, population } = record;
  return (
    <article className="record-page" aria-labelledby="record-page-name">
      <header>
        <h2 id="record-page-name">{record.name}</h2>
        <p className="record-page-state">
          {[
            isOwn ? medicinesWords.own : medicinesWords.builtIn,
            medicinesWords.recordVersion(record.recordVersion),
            review.status === "reviewed" ? medicinesWords.reviewed(review.by, review.on) : medicinesWords.notReviewed,
            `${medicinesWords.measuredIn} ${record.matrix}`,
          ].join(" · ")}
        </p>
      </header>
      {record.invented ? (
        <Notice gravity="check" title={medicinesWords.inventedTitle}>
          <p>{medicinesWords.invented}</p>
        </Notice>
      ) : null}
      {unverified.memory > 0 ? (
        <Notice gravity="check" title={medicinesWords.unverifiedTitle}>
          <p>{medicinesWords.unverified(unverified.memory, unverified.total)}</p>
        </Notice>
      ) : null}
      <RecordStatements heading={medicinesWords.appliesTo} record={record} statements={[population]} />
      <section>
        <h3>{medicinesWords.windows}</h3>
        <RecordTable
          caption={medicinesWords.windows}
          record={record}
          rows={windowRows(record)}
          empty={medicinesWords.windowsNone}
        />
        {wardWindows}
      </section>
      <RecordStatements heading={medicinesWords.cautions} record={record} statements={record.cautions} />
      <RecordStatements heading={medicinesWords.doseLimits} record={record} statements={record.doseLimits} />
      <RecordStatements heading={medicinesWords.sampling} record={record} statements={record.sampling} />
      <section>
        <h3>{medicinesWords.kinetics}</h3>
        {record.kinetics.apparent ? <p className="record-page-note">{medicinesWords.apparent}</p> : null}
        <RecordTable caption={medicinesWords.kinetics} record={record} rows={kineticsRows(record)} />
      </section>
      {record.products.map((product) => (
        <section key={product.id}>
          <h3>
            {record.name} {product.name}
          </h3>
          <p className="record-page-note">{productSentence(product)}</p>
          <RecordTable caption={product.name} record={record} rows={productRows(product)} />
        </section>
      ))}
      <section>
        <h3>{medicinesWords.variability}</h3>
        <RecordTable caption={medicinesWords.variability} record={record} rows={variabilityRows(record)} />
      </section>
      <section>
        <h3>{medicinesWords.sources}</h3>
        <ol className="record-page-sources">
          {Object.entries(record.sources).map(([id, source]) => (
            <li key={id}>
              {[source.authors, source.title, source.year, source.place]
                .filter((part) => part !== undefined)
                .join(". ")}
            </li>
          ))}
        </ol>
      </section>
    </article>
  );
}

function productSentence(product: Product): string {
  return [
    product.form,
    medicinesWords.release[product.release],
    ...(product.form === "liquid" ? [] : [medicinesWords.divisible[product.divisible]]),
    ...(product.swallowWhole ? [medicinesWords.swallowWhole] : []),
  ].join(", ");
}
