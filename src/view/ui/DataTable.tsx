import type { ReactNode } from "react";
import "./DataTable.css";

export interface DataColumn<Row> {
  readonly id: string;
  readonly head: string;
  readonly cell: (row: Row) => ReactNode;
  /** "end" for figures, so that they line up. */
  readonly align?: "start" | "end";
  /** The cell that names its row. */
  readonly isRowHead?: boolean;
  /** The head is there for screen readers only (a column of buttons). */
  readonly isHeadHidden?: boolean;
}

export interface DataTableProps<Row> {
  readonly caption: string;
  readonly isCaptionHidden?: boolean;
  readonly columns: readonly DataColumn<Row>[];
  readonly rows: readonly Row[];
  readonly rowKey: (row: Row) => string;
  /** A row that does not count: drawn lighter, its reason is said in a cell. */
  readonly isRowFaint?: (row: Row) => boolean;
  /** Stands in place of rows when there is none. */
  readonly empty?: string;
}

/** A plain table; on a narrow screen each row folds into a list of head and value (the roles keep it a table). */
export function DataTable<Row>({
  caption,
  isCaptionHidden = false,
  columns,
  rows,
  rowKey,
  isRowFaint,
  empty,
}: DataTableProps<Row>) {
  if (rows.length === 0 && empty) {
    return (
      <div className="data-table-none">
        <p className={isCaptionHidden ? "visually-hidden" : "data-table-caption"}>{caption}</p>
        <p>{empty}</p>
      </div>
    );
  }
  return (
    // biome-ignore-start lint/a11y/noRedundantRoles: display:block on a narrow screen takes the table's own roles away
    // biome-ignore-start lint/a11y/useSemanticElements: the same
    <table className="data-table" role="table">
      <caption className={isCaptionHidden ? "visually-hidden" : "data-table-caption"}>{caption}</caption>
      <thead role="rowgroup">
        <tr role="row">
          {columns.map((column) => (
            <th
              key={column.id}
              role="columnheader"
              scope="col"
              className={`data-table-head data-table-${column.align ?? "start"}`}
            >
              {column.isHeadHidden ? <span className="visually-hidden">{column.head}</span> : column.head}
            </th>
          ))}
        </tr>
      </thead>
      <tbody role="rowgroup">
        {rows.map((row) => (
          <tr key={rowKey(row)} role="row" className={isRowFaint?.(row) ? "data-table-faint" : undefined}>
            {columns.map((column) => {
              const className = `data-table-cell data-table-${column.align ?? "start"}`;
              const head = column.isHeadHidden ? "" : column.head;
              return column.isRowHead ? (
                <th key={column.id} role="rowheader" scope="row" className={className} data-head={head}>
                  {column.cell(row)}
                </th>
              ) : (
                <td key={column.id} role="cell" className={className} data-head={head}>
                  {column.cell(row)}
                </td>
              );
            })}
          </tr>
        ))}
      </tbody>
    </table>
    // biome-ignore-end lint/a11y/useSemanticElements: the same
    // biome-ignore-end lint/a11y/noRedundantRoles: the same
  );
}
