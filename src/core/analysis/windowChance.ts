import type { TargetWindow } from "../case/index.ts";
import type { WindowChance } from "./fitTypes.ts";

/** What a draw comes to, by what a window can be about. mg/L; auc24 mg·h/L. */
export interface WindowFigures {
  readonly peak: ArrayLike<number>;
  readonly lowest: ArrayLike<number>;
  readonly average: ArrayLike<number>;
  readonly auc24: ArrayLike<number>;
  /** Of levels at a stated time after each dose, the highest; `lowest` is then the lowest of them. */
  readonly timedHighest?: ArrayLike<number>;
}

/**
 * The share of equally weighted draws below, within and above a window, for what the window is about.
 * "lowest-and-highest": above where the highest level is above it, else below where the lowest is below it, else within; a draw that is both
 * counts as above, the graver. On an edge is within.
 */
export function windowChance(
  quantity: TargetWindow["quantity"],
  { low, high }: { readonly low: number; readonly high: number },
  figures: WindowFigures,
): WindowChance | null {
  const [lower, upper] =
    quantity === "lowest-and-highest"
      ? [figures.lowest, figures.peak]
      : quantity === "trough"
        ? [figures.lowest, figures.timedHighest ?? figures.lowest]
        : [figures[quantity], figures[quantity]];
  const count = lower.length;
  if (count === 0) return null;
  let below = 0;
  let above = 0;
  for (let i = 0; i < count; i++) {
    if (upper[i]! > high) above++;
    else if (lower[i]! < low) below++;
  }
  return { below: below / count, within: (count - below - above) / count, above: above / count };
}
