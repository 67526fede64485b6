import { type ReactNode, useState } from "react";

export interface DraftSectionProps {
  readonly id: string;
  readonly heading: string;
  /** First parts of the paths of the fields in it: how a fault finds the fold it lies under. */
  readonly roots: readonly string[];
  readonly isOpen?: boolean;
  readonly children: ReactNode;
}

/** A part of the editor that can be folded; its fields are made when it is first opened. What is folded is checked all the same. */
export function DraftSection({ id, heading, roots, isOpen = false, children }: DraftSectionProps) {
  const [isMade, setMade] = useState(isOpen);
  return (
    <details
      className="draft-section"
      id={`draft-${id}`}
      data-roots={roots.join(" ")}
      open={isOpen}
      onToggle={(event) => event.currentTarget.open && setMade(true)}
    >
      <summary>
        <h3>{heading}</h3>
      </summary>
      {isMade ? <div className="draft-section-body">{children}</div> : null}
    </details>
  );
}
