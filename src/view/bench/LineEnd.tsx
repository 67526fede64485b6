import type { KeyboardEvent } from "react";
import type { DoseLine } from "../../core/regimen/index.ts";
import type { ClockScale } from "../chart/clockScale.ts";
import type { CurveStyle } from "../chart/ProfileChart.tsx";
import { useWorkbench } from "../useWorkbench.ts";
import { type LineReach, lineReachPulled, lineReachStepped } from "./gestures/lineReach.ts";
import { useAxisDrag } from "./gestures/useAxisDrag.ts";

interface LineEndProps {
  readonly lane: string;
  readonly line: DoseLine;
  readonly reach: LineReach;
  /** Elapsed hours of the line's last dose. */
  readonly lastH: number;
  readonly scale: ClockScale;
  readonly baseline: number;
  readonly style: CurveStyle;
  readonly onPress: () => void;
}

/** From the last token to its handle, px. */
const OFFSET = 24;

/** The end of a repeat: pulled along the clock, or lengthened and shortened with arrow keys. */
export function LineEnd({ lane, line, reach, lastH, scale, baseline, style, onPress }: LineEndProps) {
  const edit = useWorkbench((state) => state.edit);
  const previewEdit = useWorkbench((state) => state.previewEdit);
  const cancelPreview = useWorkbench((state) => state.cancelPreview);
  const pulled = (dx: number) => ({
    lane,
    lineId: line.id,
    ...lineReachPulled(line, reach, scale.hours(scale.left + dx) - scale.hours(scale.left)),
  });
  const start = useAxisDrag({
    axes: ["clock"],
    onMove: (_, dx) => previewEdit("lineStretch", pulled(dx)),
    onDrop: (_, dx) => {
      cancelPreview();
      edit("lineStretch", pulled(dx));
    },
    onCancel: cancelPreview,
    onPress,
  });
  const onKeyDown = (event: KeyboardEvent) => {
    const direction = event.key === "ArrowRight" ? 1 : event.key === "ArrowLeft" ? -1 : null;
    if (direction !== null) {
      event.preventDefault();
      edit("lineStretch", { lane, lineId: line.id, ...lineReachStepped(reach, direction) });
    } else if (event.key === "Enter") {
      event.preventDefault();
      onPress();
    }
  };
  const words = "days" in reach ? `${reach.days} days` : `${reach.count} doses`;
  const x = scale.x(lastH) + OFFSET;
  return (
    <g
      className={`line-end token-${style}`}
      role="slider"
      tabIndex={0}
      aria-label="End of the repeat"
      aria-valuemin={1}
      aria-valuenow={"days" in reach ? reach.days : reach.count}
      aria-valuetext={words}
      onPointerDown={start}
      onKeyDown={onKeyDown}
    >
      <title>{`End of the repeat: ${words}`}</title>
      <rect className="token-hit" x={x - 12} y={baseline - 38} width={24} height={44} />
      <path className="line-end-mark" d={`M${x - 2} ${baseline - 24}v16M${x + 3} ${baseline - 24}v16`} />
    </g>
  );
}
