/** Cube root of the rounding of 1: balances the h² error of a central difference against rounding. */
const STEP = 2 ** -17;
/** Where a side is not finite the step is divided by this, this many times at most. */
const SHORTEN = 16;
const MOST_SHORTENINGS = 8;

/**
 * The matrix of second derivatives, from differences of a gradient.
 *
 * Formula: Hᵢⱼ = (gᵢ(x + h·eⱼ) − gᵢ(x − h·eⱼ))/2h, then (H + Hᵀ)/2; h = 7.6e-6·max(|xⱼ|, scaleⱼ).
 * @param gradient analytic, or at least good to 1e-10: its error is divided by h
 * @param x where
 * @param scale the size of a typical change of each x, above 0
 * @returns H, symmetric; null where the gradient is not finite on some side even at a step of 2e-15·max(|xⱼ|, scaleⱼ)
 * Outside: not checked.
 * Accuracy: h²/6 times the third derivative of the gradient plus its rounding over h, about 1e-10 of H for a smooth gradient of
 * typical size (tests/core/numerics/hessianByDifferences.test.ts).
 * Source: standard (Dennis & Schnabel, Numerical Methods for Unconstrained Optimization, 1983, section 5.6; from memory, unverified).
 * @example hessianByDifferences(([x, y]) => [2 * x! * y!, x! * x!], [1, 3], [1, 1]) // [[6, 2], [2, 0]] to 1e-10
 */
export function hessianByDifferences(
  gradient: (x: readonly number[]) => readonly number[],
  x: readonly number[],
  scale: readonly number[],
): number[][] | null {
  const columns: number[][] = [];
  for (let j = 0; j < x.length; j++) {
    const column = differenceColumn(gradient, x, j, STEP * Math.max(Math.abs(x[j]!), scale[j]!));
    if (column === null) return null;
    columns.push(column);
  }
  return columns.map((column, i) => column.map((entry, j) => (entry + columns[j]![i]!) / 2));
}

function differenceColumn(
  gradient: (x: readonly number[]) => readonly number[],
  x: readonly number[],
  j: number,
  wanted: number,
): number[] | null {
  let h = wanted;
  for (let tries = 0; tries <= MOST_SHORTENINGS; tries++) {
    const above = [...x];
    const below = [...x];
    above[j] = x[j]! + h;
    below[j] = x[j]! - h;
    // The step as the machine made it, not as it was meant.
    const width = above[j]! - below[j]!;
    const high = gradient(above);
    const low = gradient(below);
    const column = high.map((entry, i) => (entry - low[i]!) / width);
    if (column.every(Number.isFinite)) return column;
    h /= SHORTEN;
  }
  return null;
}
