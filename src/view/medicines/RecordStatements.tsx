import type { Basis, MedicineRecord } from "../../core/medicine/index.ts";
import { RecordProvenance } from "./RecordProvenance.tsx";

export interface RecordStatementsProps {
  readonly heading: string;
  readonly record: MedicineRecord;
  readonly statements: readonly {
    readonly text: string;
    readonly source: string;
    readonly basis: Basis;
    readonly note?: string | undefined;
  }[];
}

/** Sentences of the record (cautions, dose limits, sampling), each with its source; left out when there is none. Without a heading they go on under the one before. */
export function RecordStatements({ heading, record, statements }: RecordStatementsProps) {
  if (statements.length === 0) return null;
  return (
    <section>
      {heading === "" ? null : <h3>{heading}</h3>}
      <ul className="record-page-statements">
        {statements.map((statement) => (
          <li key={statement.text}>
            <span>
              {statement.text}
              {statement.note ? <span className="record-page-note">{statement.note}</span> : null}
            </span>
            <RecordProvenance record={record} source={statement.source} basis={statement.basis} />
          </li>
        ))}
      </ul>
    </section>
  );
}
