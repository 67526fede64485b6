import { rootBracketed } from "../../numerics/index.ts";
import type { Stretch } from "./stretch.ts";

/** For how long the level is strictly beyond `edge` between two points between which it only rises or only falls, h. */
function hoursBeyond(stretch: Stretch, from: number, to: number, edge: number, side: "above" | "below"): number {
  const sign = side === "above" ? 1 : -1;
  const isFromBeyond = sign * (stretch.levelAt(from) - edge) > 0;
  const isToBeyond = sign * (stretch.levelAt(to) - edge) > 0;
  if (isFromBeyond === isToBeyond) return isFromBeyond ? to - from : 0;
  const isRising = isToBeyond === (side === "above");
  // Falling it is nearly an exponential: Newton on its logarithm.
  const found =
    isRising || edge === 0
      ? rootBracketed(
          (u) => stretch.levelAt(u) - edge,
          (u) => stretch.slopeAt(u),
          from,
          to,
          from,
          0,
        )
      : rootBracketed(
          (u) => Math.log(stretch.levelAt(u) / edge),
          (u) => stretch.slopeAt(u) / stretch.levelAt(u),
          from,
          to,
          to,
          0,
        );
  if (!found.converged) throw new Error("stretchHours: the root search did not converge");
  return isToBeyond ? to - found.root : found.root - from;
}

/** For how long within the next `length` h the level is strictly above (or below) a level in mg/L; `turns` as the stretch gives them. */
export function stretchHours(
  stretch: Stretch,
  length: number,
  turns: readonly number[],
  edge: number,
  side: "above" | "below",
): number {
  let hours = 0;
  let from = 0;
  for (const to of [...turns, length]) {
    hours += hoursBeyond(stretch, from, to, edge, side);
    from = to;
  }
  return hours;
}
