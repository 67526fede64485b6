import type { MedicineRecord } from "../../core/medicine/index.ts";
import { medicinesWords } from "../../core/messages/index.ts";
import { DataTable } from "../ui/DataTable.tsx";
import { RecordProvenance } from "./RecordProvenance.tsx";
import type { RecordRow } from "./recordRows.ts";

export interface RecordTableProps {
  readonly caption: string;
  readonly record: MedicineRecord;
  readonly rows: readonly RecordRow[];
  readonly empty?: string;
}

export function RecordTable({ caption, record, rows, empty }: RecordTableProps) {
  return (
    <DataTable
      caption={caption}
      isCaptionHidden
      rows={rows}
      rowKey={(row) => row.id}
      {...(empty ? { empty } : {})}
      columns={[
        { id: "figure", head: medicinesWords.figure, isRowHead: true, cell: (row) => row.name },
        {
          id: "value",
          head: medicinesWords.value,
          cell: (row) => (
            <span>
              {row.value}
              {row.note ? <span className="record-page-note">{row.note}</span> : null}
            </span>
          ),
        },
        {
          id: "source",
          head: medicinesWords.source,
          cell: (row) => <RecordProvenance record={record} source={row.source} basis={row.basis} />,
        },
      ]}
    />
  );
}
