import type { DoseMark } from "../../core/analysis/index.ts";
import { numberPrint } from "../../core/units/index.ts";
import type { ClockScale } from "../chart/clockScale.ts";

/** A dose on a lane as geometry. */
export interface LaneToken {
  readonly key: string;
  readonly mark: DoseMark;
  readonly x: number;
  /** Height by dose, px. */
  readonly height: number;
  /** Written under the token; empty where there is no room. */
  readonly label: string;
}

const TALLEST = 36;
const SHORTEST = 12;
/** From one token to the next of the same time, px. */
const SIDE_BY_SIDE = 26;
/** Room an amount needs under its token, px. */
const LABEL_ROOM = 30;

/** Tokens of a lane inside the scale. `largest`: the largest amount on the whole bench (in its own unit), which gets the full height. */
export function laneTokens(marks: readonly DoseMark[], scale: ClockScale, largest: number): LaneToken[] {
  const shown = marks.filter((mark) => mark.atH >= scale.fromH && mark.atH <= scale.toH);
  return shown.map((mark, i) => {
    const sameTime = shown.filter((other) => other.atH === mark.atH);
    // Doses of several lines at one time stand side by side.
    const x = scale.x(mark.atH) + sameTime.indexOf(mark) * SIDE_BY_SIDE;
    const next = shown.slice(i + 1).find((other) => other.atH > mark.atH);
    const previous = shown.slice(0, i).findLast((other) => other.atH < mark.atH);
    const room = Math.min(
      next ? scale.x(next.atH) - x : Number.POSITIVE_INFINITY,
      previous ? x - scale.x(previous.atH) : Number.POSITIVE_INFINITY,
    );
    const share = largest > 0 ? mark.amount.value / largest : 1;
    return {
      key: `${mark.lineId}/${mark.index}`,
      mark,
      x,
      height: Math.max(SHORTEST, Math.min(TALLEST, share * TALLEST)),
      label: room < LABEL_ROOM ? "" : mark.status === "missed" ? "missed" : numberPrint(mark.amount.value, {}),
    };
  });
}
