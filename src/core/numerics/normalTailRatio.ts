/** Chebyshev coefficients of (x + 1)·R(x) over y = (x − 5)/(x + 5) in [−1, 1]: worked out in 60 digits with mpmath 1.3.0. */
const COEFFICIENTS = [
  1.1579976221305188, -0.1633449388451398, -0.013683136055781576, 0.03082200019810004, -0.016220073012046806,
  0.005616691016460094, -0.0014133933783549216, 0.0002502625460725661, -2.468907239728387e-5, -1.0107964061837592e-6,
  7.495419179740573e-7, -7.600274268728337e-8, -1.1574771441328644e-8, 3.333386472599843e-9, 7.538039628171347e-11,
  -1.1104247263727494e-10, 3.509243776551059e-12, 3.6894953861750955e-12, -2.3376697776383095e-13,
  -1.3271797523541405e-13, 9.921706995888276e-15, 5.276004995455379e-15, -3.373097694187922e-16,
  -2.2804338776379946e-16, 7.496330565808626e-18, 1.0328041877290668e-17,
];
const CENTRE = 5;

/**
 * How much of the normal distribution lies beyond a point, over its density there: Mills' ratio.
 *
 * Formula: R(x) = (1 − Φ(x))/φ(x) = e^(x²/2)·∫ₓ^∞ e^(−s²/2) ds. Computed as a Chebyshev series of (x + 1)·R(x), which runs from
 * 1.2533 at 0 to 1 at Infinity.
 * @param x 0 or more; Infinity allowed
 * @returns 1.2533… at 0, falling as 1/x
 * Outside: not checked; meant for x >= 0 only.
 * Accuracy: relative 5e-16 (tests/core/numerics/normal.test.ts).
 * Source: the substitution after Schonfelder, Chebyshev expansions for the error and related functions, Math. Comp. 32 (1978)
 * 1232–1240 (from memory, unverified); coefficients worked out here.
 * @example normalTailRatio(0) // 1.2533141373155001 = √(π/2)
 */
export function normalTailRatio(x: number): number {
  // Written so that Infinity gives 1.
  const y = 1 - (2 * CENTRE) / (x + CENTRE);
  let before = 0;
  let last = 0;
  for (let k = COEFFICIENTS.length - 1; k > 0; k--) {
    const next = 2 * y * last - before + COEFFICIENTS[k]!;
    before = last;
    last = next;
  }
  return (y * last - before + COEFFICIENTS[0]!) / (x + 1);
}
