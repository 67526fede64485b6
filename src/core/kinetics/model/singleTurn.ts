import { rootBracketed } from "../../numerics/index.ts";

/** A slope smaller than this part of what it is the difference of has no trustworthy sign. */
const NOISE = 1e-14;

/**
 * The turn of a level that can only turn from rising to falling, once: the zero of its slope.
 *
 * @param slope of the level, or of anything that rises and falls with it
 * @param bend derivative of `slope`
 * @param length h, where the stretch ends
 * @param size what the slope is a difference of: a slope within rounding of 0 at the end is no turn
 * @returns [u], h from the start of the stretch, strictly inside; [] when the level only rises or only falls
 * Accuracy: 4.4e-16·length, as far as rounding leaves the slope a sign.
 */
export function singleTurn(
  slope: (u: number) => number,
  bend: (u: number) => number,
  length: number,
  size: (u: number) => number,
): readonly number[] {
  if (!(slope(0) > 0)) return [];
  let far = length;
  // Far out everything may underflow to 0: come back to where the slope has a size.
  while (size(far) === 0 && far > 0) far /= 2;
  if (slope(far) >= -NOISE * size(far)) {
    // Still rising, or level with its plateau; past the plateau of a curve that underflowed it has turned nowhere visible.
    return [];
  }
  const found = rootBracketed(slope, bend, 0, far, far / 2, 0);
  if (!found.converged) throw new Error("singleTurn: the root search did not converge");
  return found.root > 0 && found.root < length ? [found.root] : [];
}
