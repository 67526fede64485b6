import type { DoseMark } from "../../core/analysis/index.ts";
import { laneTokenWords } from "../../core/messages/index.ts";
import { numberPrint } from "../../core/units/index.ts";
import type { ClockScale } from "../chart/clockScale.ts";

/** A dose on a lane as geometry. */
export interface LaneToken {
  readonly key: string;
  readonly mark: DoseMark;
  /** Where its time is: tokens of one time stand over each other, never beside. */
  readonly x: number;
  /** Height by dose, px; in a stack that would not fit, all in proportion. */
  readonly height: number;
  /** From the baseline to its foot, px: 0 but for those in a stack. */
  readonly above: number;
  /** Nothing stands on it. */
  readonly isTop: boolean;
  /** Written under the token, of a stack under the lowest; empty where there is no room. */
  readonly label: string;
}

const TALLEST = 36;
const SHORTEST = 12;
/** Between two tokens of a stack, px. */
const GAP = 2;
/** Room an amount needs under its token, px: alone, and behind "2×". */
const LABEL_ROOM = 30;
const STACK_LABEL_ROOM = 46;

/** Tokens of a lane inside the scale. `largest`: the largest amount on the whole bench (in its own unit), which gets the full height. */
export function laneTokens(marks: readonly DoseMark[], scale: ClockScale, largest: number): LaneToken[] {
  const shown = marks.filter((mark) => mark.atH >= scale.fromH && mark.atH <= scale.toH);
  return shown.map((mark, i) => {
    const stack = shown.filter((other) => other.atH === mark.atH);
    const place = stack.indexOf(mark);
    const heights = stackHeights(stack.map(({ amount }) => (largest > 0 ? amount.value / largest : 1)));
    const x = scale.x(mark.atH);
    const next = shown.slice(i + 1).find((other) => other.atH > mark.atH);
    const previous = shown.slice(0, i).findLast((other) => other.atH < mark.atH);
    const room = Math.min(
      next ? scale.x(next.atH) - x : Number.POSITIVE_INFINITY,
      previous ? x - scale.x(previous.atH) : Number.POSITIVE_INFINITY,
    );
    return {
      key: `${mark.lineId}/${mark.index}`,
      mark,
      x,
      height: heights[place] ?? SHORTEST,
      above: heights.slice(0, place).reduce((sum, height) => sum + height + GAP, 0),
      isTop: place === stack.length - 1,
      label: place === 0 ? stackLabel(stack, room) : "",
    };
  });
}

/** From the lowest up. */
function stackHeights(shares: readonly number[]): readonly number[] {
  const alone = shares.map((share) => Math.max(SHORTEST, Math.min(TALLEST, share * TALLEST)));
  const room = Math.max(alone.length, TALLEST - GAP * (alone.length - 1));
  const fit = Math.min(1, room / alone.reduce((sum, height) => sum + height, 0));
  return alone.length === 1 ? alone : alone.map((height) => height * fit);
}

/** How many is said even where there is no room for the amount. */
function stackLabel(stack: readonly DoseMark[], room: number): string {
  const texts = new Set(stack.map(dueText));
  const [text = ""] = texts;
  if (stack.length === 1) return room < LABEL_ROOM ? "" : text;
  return laneTokenWords.together(stack.length, texts.size > 1 || room < STACK_LABEL_ROOM ? "" : text);
}

function dueText({ status, amount }: DoseMark): string {
  return status === "missed" ? laneTokenWords.missed : numberPrint(amount.value, {});
}
