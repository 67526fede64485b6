import { halfNanograms, milligrams, tabletPieces } from "./tabletPieces.ts";
import type { Divisible } from "./tabletsFor.ts";

export interface AmountSteps {
  /** mg; null when nothing smaller (or nothing at all) can be made. */
  readonly down: number | null;
  readonly up: number | null;
}

/** Beyond this many steps the search is not made. */
const MOST_STEPS = 1_000_000;

/**
 * The nearest amounts below and above one that a product's tablets can make.
 *
 * @param amountMg mg, 0 or more; need not be makeable itself
 * @param strengthsMg mg, each above 0; without any (a liquid) both are null
 * @param divisible "half" allows halves
 * @returns mg. Exact. Example: 300 mg from 200 mg tablets: 200 and 400; from 200 mg that may be halved: 200 and 400; from 250 mg and 200 mg: 250 and 400.
 */
export function amountSteps(amountMg: number, strengthsMg: readonly number[], divisible: Divisible): AmountSteps {
  if (!(amountMg >= 0) || !Number.isFinite(amountMg))
    throw new RangeError(`amountMg: ${amountMg} mg; allowed 0 or more`);
  if (strengthsMg.length === 0) return { down: null, up: null };
  const { pieces, stepHalfNg } = tabletPieces(strengthsMg, divisible === "half");
  // An amount between two nanograms is between two makeable ones; the lower nanogram is then below it.
  const exact = halfNanograms(amountMg);
  const position = (exact ?? amountMg * 2_000_000) / stepHalfNg;
  const smallest = Math.min(...pieces.map((piece) => piece.steps));
  const top = Math.floor(position) + smallest;
  if (top > MOST_STEPS) return { down: null, up: null };

  const canMake = new Uint8Array(top + 1);
  canMake[0] = 1;
  for (let made = 1; made <= top; made += 1) {
    canMake[made] = pieces.some((piece) => canMake[made - piece.steps] === 1) ? 1 : 0;
  }
  const down = position > 0 ? canMake.lastIndexOf(1, Math.ceil(position) - 1) : 0;
  const up = canMake.indexOf(1, Math.floor(position) + 1);
  return {
    down: down > 0 ? milligrams(down * stepHalfNg) : null,
    up: up > 0 ? milligrams(up * stepHalfNg) : null,
  };
}
