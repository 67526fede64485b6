export interface SimplexMinimum {
  readonly x: number[];
  readonly value: number;
  readonly evaluations: number;
  readonly converged: boolean;
}

/**
 * A minimum by the downhill simplex search, which asks for values only: what the benchmark measures the gradient method against.
 *
 * Formula: n + 1 points; the worst is reflected through the centre of the others, stretched (2) where that is the best so far, drawn in
 * (1/2) where it is no better than the second worst, and all drawn to the best (1/2) where that fails too.
 * @param value the objective; NaN counts as Infinity
 * @param start n variables; the other points lie `size` away along each
 * @param size first edge, above 0
 * @param tolerance it ends when the values of all points lie within this of the best
 * @param mostEvaluations default 10,000
 * @returns the best point met
 * Accuracy: the value to about `tolerance` on smooth functions of a few variables (tests/core/numerics/simplexMinimise.test.ts).
 * Source: Nelder & Mead, A simplex method for function minimization, Computer J. 7 (1965) 308–313 (from memory, unverified).
 * @example simplexMinimise(([x]) => (x! - 3) ** 2, [0], 1, 1e-12).x // [3] to 1e-6
 */
export function simplexMinimise(
  value: (x: readonly number[]) => number,
  start: readonly number[],
  size: number,
  tolerance: number,
  mostEvaluations = 10_000,
): SimplexMinimum {
  const n = start.length;
  let evaluations = 0;
  const at = (x: number[]) => {
    evaluations++;
    const found = value(x);
    return { x, value: Number.isNaN(found) ? Infinity : found };
  };
  const corners = [at([...start]), ...start.map((_, i) => at(start.map((each, j) => (i === j ? each + size : each))))];
  for (;;) {
    corners.sort((a, b) => a.value - b.value);
    const best = corners[0]!;
    const worst = corners[n]!;
    const isEven = worst.value - best.value <= tolerance;
    if (isEven || evaluations >= mostEvaluations) return { ...best, evaluations, converged: isEven };

    const centre = start.map((_, i) => corners.slice(0, n).reduce((sum, corner) => sum + corner.x[i]!, 0) / n);
    const along = (factor: number) => at(centre.map((each, i) => each + factor * (each - worst.x[i]!)));
    const reflected = along(1);
    if (reflected.value < best.value) {
      const stretched = along(2);
      corners[n] = stretched.value < reflected.value ? stretched : reflected;
      continue;
    }
    if (reflected.value < corners[n - 1]!.value) {
      corners[n] = reflected;
      continue;
    }
    const drawnIn = along(reflected.value < worst.value ? 0.5 : -0.5);
    if (drawnIn.value < Math.min(worst.value, reflected.value)) {
      corners[n] = drawnIn;
      continue;
    }
    for (let k = 1; k <= n; k++) corners[k] = at(corners[k]!.x.map((each, i) => (each + best.x[i]!) / 2));
  }
}
