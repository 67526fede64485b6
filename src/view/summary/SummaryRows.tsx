import type { SummaryRow } from "./summaryModel.ts";

/** Name and value, a line each; label and value never part. */
export function SummaryRows({ rows }: { readonly rows: readonly SummaryRow[] }) {
  return (
    <dl className="summary-rows">
      {rows.map(({ label, value }) => (
        <div key={label}>
          <dt>{label}</dt>
          <dd>{value}</dd>
        </div>
      ))}
    </dl>
  );
}
