import type { Analysis } from "../../core/analysis/index.ts";
import { type ClockScale, clockScale } from "../chart/clockScale.ts";
import { type BenchSpan, spanHas } from "./benchSpan.ts";

/** What every row of the bench draws on: the part of the clock shown, and where now and the midnights lie in it. */
export interface ClockRow {
  readonly scale: ClockScale;
  /** px, the room at the right included */
  readonly width: number;
  /** null: outside the part shown */
  readonly nowX: number | null;
  readonly midnightsX: readonly number[];
}

/** `right`: room kept free at the right of the clock, px. */
export function clockRow(
  { nowH, midnightsH }: Analysis["clock"],
  span: BenchSpan,
  width: number,
  right: number,
): ClockRow {
  const scale = clockScale(span.fromH, span.toH, 0, width - right);
  return {
    scale,
    width,
    nowX: spanHas(span, nowH) ? scale.x(nowH) : null,
    midnightsX: midnightsH.filter((hours) => hours > span.fromH && hours < span.toH).map(scale.x),
  };
}
