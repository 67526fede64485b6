import type { ReactNode } from "react";
import type { MedicineRecord, Product } from "../../core/medicine/index.ts";
import { medicinesWords, recordWords } from "../../core/messages/index.ts";
import { unitSpoken } from "../../core/units/index.ts";
import { RecordBefore } from "./RecordBefore.tsx";
import { RecordShares } from "./RecordShares.tsx";
import { RecordStatements } from "./RecordStatements.tsx";
import { RecordTable } from "./RecordTable.tsx";
import { type RecordSection, recordSections } from "./recordSections.ts";
import "./RecordPage.css";

export interface RecordPageProps {
  readonly record: MedicineRecord;
  readonly isOwn: boolean;
  /** The record it was copied from, where it is still here. */
  readonly original: MedicineRecord | undefined;
  /** Under the name: what can be done with it. */
  readonly actions: ReactNode;
  /** Under the record's own windows: the ward's. */
  readonly wardWindows: ReactNode;
}

/** One record, every figure with its unit, source and basis. */
export function RecordPage({ record, isOwn, original, actions, wardWindows }: RecordPageProps) {
  const { review, population, autoinduction, copyOf } = record;
  const sections = recordSections(record);
  const section = (id: string): RecordSection => sections.find((each) => each.id === id) as RecordSection;
  const table = (id: string, empty?: string) => (
    <RecordTable
      caption={section(id).heading}
      record={record}
      rows={section(id).rows}
      {...(empty === undefined ? {} : { empty })}
    />
  );
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
            `${recordWords.shownIn} ${unitSpoken(record.displayUnit, "screen")}`,
          ].join(" · ")}
        </p>
        {copyOf ? (
          <p className="record-page-state">
            {original
              ? recordWords.copyOf(original.name, copyOf.recordVersion)
              : recordWords.copyOfGone(copyOf.id, copyOf.recordVersion)}
          </p>
        ) : null}
        {actions}
      </header>
      <RecordBefore record={record} />
      <RecordShares record={record} />
      <RecordStatements heading={medicinesWords.appliesTo} record={record} statements={[population]} />
      {population.setting ? (
        <p className="record-page-note">
          {recordWords.setting}: {population.setting}
        </p>
      ) : null}
      {section("population").rows.length > 0 ? table("population") : null}
      <section>
        <h3>{medicinesWords.windows}</h3>
        {table("windows", medicinesWords.windowsNone)}
        {wardWindows}
      </section>
      <RecordStatements heading={medicinesWords.cautions} record={record} statements={record.cautions} />
      <section>
        <h3>{recordWords.limits}</h3>
        {table("limits", record.doseLimits.length > 0 ? undefined : recordWords.limitsNone)}
        <RecordStatements heading="" record={record} statements={record.doseLimits} />
      </section>
      {section("sampling").rows.length + record.sampling.length > 0 ? (
        <section>
          <h3>{medicinesWords.sampling}</h3>
          {section("sampling").rows.length > 0 ? table("sampling") : null}
          <RecordStatements heading="" record={record} statements={record.sampling} />
        </section>
      ) : null}
      <section>
        <h3>{recordWords.interactions}</h3>
        {table("interactions", recordWords.interactionsNone)}
      </section>
      {autoinduction ? (
        <RecordStatements heading={recordWords.autoinduction} record={record} statements={[autoinduction]} />
      ) : null}
      {section("autoinduction").rows.length > 0 ? table("autoinduction") : null}
      <section>
        <h3>{medicinesWords.kinetics}</h3>
        {record.kinetics.apparent ? <p className="record-page-note">{medicinesWords.apparent}</p> : null}
        {table("kinetics")}
        <RecordStatements
          heading={record.estimates.from === "one-model" ? recordWords.oneModel : recordWords.estimates}
          record={record}
          statements={[record.estimates]}
        />
      </section>
      {record.products.map((product) => (
        <section key={product.id}>
          <h3>
            {record.name} {product.name}
          </h3>
          <p className="record-page-note">{productSentence(product)}</p>
          {table(`product ${product.id}`)}
        </section>
      ))}
      {section("variability").rows.length > 0 ? (
        <section>
          <h3>{medicinesWords.variability}</h3>
          {table("variability")}
        </section>
      ) : null}
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
    ...(product.salt ? [recordWords.saltOf(product.salt)] : []),
    ...(product.form === "liquid" ? [] : [medicinesWords.divisible[product.divisible]]),
    ...(product.swallowWhole ? [medicinesWords.swallowWhole] : []),
  ].join(", ");
}
