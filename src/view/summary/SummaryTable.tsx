import type { SummaryGrid } from "./summaryModel.ts";

interface SummaryTableProps {
  readonly grid: SummaryGrid;
  /** Above the names of the rows; "" where the title says it. */
  readonly first: string;
}

/** A small table of figures. */
export function SummaryTable({ grid, first }: SummaryTableProps) {
  return (
    <table className="summary-table summary-grid">
      <thead>
        <tr>
          {first === "" ? <td /> : <th scope="col">{first}</th>}
          {grid.columns.map((column) => (
            <th key={column} scope="col">
              {column}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {grid.rows.map(({ label, cells }) => (
          <tr key={label}>
            <th scope="row">{label}</th>
            {cells.map((cell, index) => (
              <td key={index}>{cell}</td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}
