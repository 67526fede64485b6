import type { ReactNode } from "react";

/** A part of the editor that can be folded. What is folded is still searched for faults and found by a fault's link. */
export function DraftSection({
  id,
  heading,
  isOpen = false,
  children,
}: {
  readonly id: string;
  readonly heading: string;
  readonly isOpen?: boolean;
  readonly children: ReactNode;
}) {
  return (
    <details className="draft-section" id={`draft-${id}`} open={isOpen}>
      <summary>
        <h3>{heading}</h3>
      </summary>
      <div className="draft-section-body">{children}</div>
    </details>
  );
}
