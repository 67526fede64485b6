import type { Analysis } from "../../core/analysis/index.ts";
import { instantText } from "../../core/time/index.ts";
import type { ClockRow } from "./clockRow.ts";
import { RowGround } from "./RowGround.tsx";

interface ClockHeadProps extends ClockRow {
  readonly clock: Analysis["clock"];
  readonly zone: string;
}

export const CLOCK_HEAD_HEIGHT = 54;
/** Room a day's name needs, px. */
const DAY_ROOM = 52;

/** Days of the shared clock, named at their beginning. */
export function ClockHead(props: ClockHeadProps) {
  const { scale, width, zone } = props;
  const { midnightsH, originMs } = props.clock;
  const days = midnightsH.flatMap((midnight, i) => {
    const next = midnightsH[i + 1] ?? scale.toH;
    const from = Math.max(midnight, scale.fromH);
    const to = Math.min(next, scale.toH);
    if (to <= from || (to - from) * ((scale.right - scale.left) / (scale.toH - scale.fromH)) < DAY_ROOM) return [];
    const words = instantText(originMs + midnight * 3_600_000, zone, "day").split(" ");
    return [{ x: scale.x(from), day: words.slice(0, 2).join(" "), month: words.slice(2).join(" "), midnight }];
  });
  return (
    <svg
      className="clock-head"
      width={width}
      height={CLOCK_HEAD_HEIGHT}
      viewBox={`0 0 ${width} ${CLOCK_HEAD_HEIGHT}`}
      aria-hidden="true"
    >
      <RowGround row={props} height={CLOCK_HEAD_HEIGHT}>
        {days.map((day) => (
          <g key={day.midnight}>
            <text className="clock-day" x={day.x + 8} y={23}>
              {day.day}
            </text>
            <text className="clock-month" x={day.x + 8} y={42}>
              {day.month}
            </text>
          </g>
        ))}
      </RowGround>
    </svg>
  );
}
