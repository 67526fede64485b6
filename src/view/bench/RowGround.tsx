import type { ReactNode } from "react";
import type { ClockRow } from "./clockRow.ts";

interface RowGroundProps {
  readonly row: ClockRow;
  readonly height?: number | "100%";
  /** Drawn over the past and the days, under the now line. */
  readonly children?: ReactNode;
}

/** The ground of a row of the bench, within its svg: the past, a line a midnight, the now line. Its colours stand in DoseLane.css. */
export function RowGround({ row: { scale, nowX, midnightsX }, height = "100%", children }: RowGroundProps) {
  return (
    <>
      {nowX !== null && <rect className="lane-past" x={scale.left} y={0} width={nowX - scale.left} height={height} />}
      {midnightsX.map((x) => (
        <line key={x} className="lane-day" x1={x} x2={x} y1={0} y2={height} />
      ))}
      {children}
      {nowX !== null && <line className="lane-now" x1={nowX} x2={nowX} y1={0} y2={height} />}
    </>
  );
}
