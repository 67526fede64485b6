import { type ReactNode, useId } from "react";

interface SummaryBlockProps {
  readonly title: string;
  /** Said beside the title, lighter. */
  readonly beside?: string;
  readonly children: ReactNode;
}

/** A titled block of the sheet. */
export function SummaryBlock({ title, beside, children }: SummaryBlockProps) {
  const id = useId();
  return (
    <section className="summary-block" aria-labelledby={id}>
      <h2>
        <span id={id}>{title}</span>
        {beside !== undefined && <span className="summary-beside">{beside}</span>}
      </h2>
      {children}
    </section>
  );
}
