import { rootBracketed } from "./rootBracketed.ts";

/**
 * Where a function changes sign, given points between which it does so at most once.
 *
 * Formula: from one point to the next with the opposite sign a bracketed root (see rootBracketed). A point where the function is 0
 * without changing sign is no sign change.
 * @param value the function; Infinity allowed, NaN is not
 * @param slope its derivative, or NaN where it is not known
 * @param points ascending, at least two
 * @returns the roots, ascending, strictly inside the first and last point
 * Outside: throws Error when a root search fails.
 * Accuracy: 4.4e-16·|root|, as far as the signs of `value` can be trusted.
 * Source: written here.
 * @example signChanges((x) => x * x - 2, (x) => 2 * x, [-2, 0, 2]) // [-1.414…, 1.414…]
 */
export function signChanges(
  value: (x: number) => number,
  slope: (x: number) => number,
  points: readonly number[],
): number[] {
  const first = points[0]!;
  const last = points[points.length - 1]!;
  const roots: number[] = [];
  let signed: number | undefined;
  let sign = 0;
  for (const point of points) {
    const here = Math.sign(value(point));
    if (here === 0) continue;
    if (signed !== undefined && here !== sign) {
      const found = rootBracketed(value, slope, signed, point, (signed + point) / 2, 0);
      if (!found.converged) throw new Error("signChanges: the root search did not converge");
      if (found.root > first && found.root < last) roots.push(found.root);
    }
    signed = point;
    sign = here;
  }
  return roots;
}
