import type { SummaryRow } from "./summaryModel.ts";

interface SummaryRowsProps {
  readonly rows: readonly SummaryRow[];
  /** Side by side instead of one below the other. */
  readonly isBeside?: boolean;
}

/** Names with their values; a name and its value never part. */
export function SummaryRows({ rows, isBeside = false }: SummaryRowsProps) {
  return (
    <dl className={isBeside ? "summary-rows summary-rows-beside" : "summary-rows"}>
      {rows.map(({ label, value }) => (
        <div key={label}>
          <dt>{label}</dt>
          <dd>{value}</dd>
        </div>
      ))}
    </dl>
  );
}
