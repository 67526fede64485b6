import { instantText } from "../../core/time/index.ts";
import type { ClockScale } from "../chart/clockScale.ts";

interface ClockHeadProps {
  readonly scale: ClockScale;
  readonly width: number;
  readonly midnightsH: readonly number[];
  readonly nowX: number | null;
  readonly originMs: number;
  readonly zone: string;
}

export const CLOCK_HEAD_HEIGHT = 54;
/** Room a day's name needs, px. */
const DAY_ROOM = 52;

/** Days of the shared clock, named at their beginning. */
export function ClockHead({ scale, width, midnightsH, nowX, originMs, zone }: ClockHeadProps) {
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
      {nowX !== null && (
        <rect className="lane-past" x={scale.left} y={0} width={nowX - scale.left} height={CLOCK_HEAD_HEIGHT} />
      )}
      {midnightsH
        .filter((midnight) => midnight > scale.fromH && midnight < scale.toH)
        .map((midnight) => (
          <line
            key={midnight}
            className="lane-day"
            x1={scale.x(midnight)}
            x2={scale.x(midnight)}
            y1={0}
            y2={CLOCK_HEAD_HEIGHT}
          />
        ))}
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
      {nowX !== null && <line className="lane-now" x1={nowX} x2={nowX} y1={0} y2={CLOCK_HEAD_HEIGHT} />}
    </svg>
  );
}
