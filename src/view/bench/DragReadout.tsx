import "./DragReadout.css";

interface DragReadoutProps {
  readonly words: string;
  /** Of what is dragged, px. */
  readonly x: number;
  readonly y: number;
  /** Of the row, px. */
  readonly width: number;
}

/** Beside what is dragged: what changes, from what to what. */
export function DragReadout({ words, x, y, width }: DragReadoutProps) {
  const isLeft = x > width / 2;
  return (
    <p
      className="drag-readout"
      role="status"
      style={{ top: Math.max(0, y - 38), ...(isLeft ? { right: width - x + 14 } : { left: x + 14 }) }}
    >
      {words}
    </p>
  );
}
