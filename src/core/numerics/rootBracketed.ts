export interface Root {
  readonly root: number;
  /** Value of the function at `root`. */
  readonly residual: number;
  readonly steps: number;
  readonly converged: boolean;
}

/** Bisection alone reaches any double from any bracket in about 2,100 halvings. */
const MOST_STEPS = 2_200;
/** Two units in the last place of 1: the spacing to which a root is located. */
const SPACING = 2 ** -51;

/**
 * The root of a function between two points where it has opposite signs, by Newton steps kept inside the bracket.
 *
 * Formula: x ← x − f(x)/f′(x); where that leaves the bracket, is not finite, or does not halve the step before last, the
 * bracket is halved instead.
 * @param value the function; Infinity allowed, NaN is not
 * @param slope its derivative; may be anything where it is not known (then the bracket is halved)
 * @param low one end of the bracket
 * @param high the other end, at or above `low`
 * @param start where to begin, within the bracket
 * @param tolerance the step below which to stop, in the unit of x, 0 or more; never finer than two units in the last place
 * @returns the root with its residual, the steps taken and whether it converged
 * Outside: `converged` false with the better end when both ends have the same sign.
 * Accuracy: the larger of `tolerance` and 4.4e-16·|root|, as far as the signs of `value` can be trusted.
 * Source: standard method (Newton with bisection as safeguard), written here.
 * @example rootBracketed((x) => x * x - 2, (x) => 2 * x, 0, 2, 1, 0).root // 1.4142135623730951
 */
export function rootBracketed(
  value: (x: number) => number,
  slope: (x: number) => number,
  low: number,
  high: number,
  start: number,
  tolerance: number,
): Root {
  const atLow = value(low);
  if (atLow === 0) return { root: low, residual: 0, steps: 0, converged: true };
  const atHigh = value(high);
  if (atHigh === 0) return { root: high, residual: 0, steps: 0, converged: true };
  if (atLow > 0 === atHigh > 0) {
    const isLowBetter = Math.abs(atLow) <= Math.abs(atHigh);
    return { root: isLowBetter ? low : high, residual: isLowBetter ? atLow : atHigh, steps: 0, converged: false };
  }

  const isRising = atHigh > 0;
  let x = start;
  let residual = value(x);
  let step = high - low;
  let stepBefore = step;
  for (let steps = 1; steps <= MOST_STEPS; steps++) {
    if (residual === 0) return { root: x, residual, steps, converged: true };
    if (residual > 0 === isRising) high = x;
    else low = x;

    const newton = -residual / slope(x);
    const next = x + newton;
    const isNewtonGood = next > low && next < high && Math.abs(newton) * 2 <= Math.abs(stepBefore);
    // A Newton step too small to leave x is the end of the road: x is the root to the last place.
    const hasArrived = Math.abs(newton) <= Math.max(tolerance, SPACING * Math.abs(x));
    if (hasArrived) {
      const root = Math.min(Math.max(next, low), high);
      return { root, residual: value(root), steps, converged: true };
    }
    stepBefore = step;
    if (isNewtonGood) {
      step = newton;
      x = next;
    } else {
      step = (high - low) / 2;
      x = low + step;
      if (x === low || x === high || step <= Math.max(tolerance, SPACING * Math.abs(x))) {
        return { root: x, residual: value(x), steps, converged: true };
      }
    }
    residual = value(x);
  }
  return { root: x, residual, steps: MOST_STEPS, converged: false };
}
