/** From the middle: |p − 1/2| at most this takes the first formula. */
const CENTRE = 0.425;
/** √(−ln p) at most this takes the second, above it the third. */
const FAR = 5;
/** Coefficients, highest power first. */
const CENTRE_TOP = [
  2509.0809287301227, 33430.57558358813, 67265.7709270087, 45921.95393154987, 13731.69376550946, 1971.5909503065513,
  133.14166789178438, 3.3871328727963665,
];
const CENTRE_BOTTOM = [
  5226.495278852854, 28729.085735721943, 39307.89580009271, 21213.794301586597, 5394.196021424751, 687.1870074920579,
  42.31333070160091, 1,
];
const MIDDLE_TOP = [
  0.0007745450142783414, 0.022723844989269184, 0.2417807251774506, 1.2704582524523684, 3.6478483247632045,
  5.769497221460691, 4.630337846156546, 1.4234371107496835,
];
const MIDDLE_BOTTOM = [
  1.0507500716444169e-9, 0.0005475938084995345, 0.015198666563616457, 0.14810397642748008, 0.6897673349851,
  1.6763848301838038, 2.053191626637759, 1,
];
const FAR_TOP = [
  2.0103343992922881e-7, 2.7115555687434876e-5, 0.0012426609473880784, 0.026532189526576124, 0.29656057182850487,
  1.7848265399172913, 5.463784911164114, 6.657904643501103,
];
const FAR_BOTTOM = [
  2.0442631033899397e-15, 1.421511758316446e-7, 1.8463183175100548e-5, 0.0007868691311456133, 0.014875361290850615,
  0.1369298809227358, 0.599832206555888, 1,
];

/**
 * The point below which a given part of the standard normal distribution lies.
 *
 * Formula: Φ⁻¹(p), by rational functions of p − 1/2 in the middle and of √(−ln min(p, 1 − p)) in the tails.
 * @param probability p, 0 to 1
 * @returns −Infinity at 0, Infinity at 1
 * Outside: RangeError.
 * Accuracy: 1e-15 relative, at least 1e-16 absolute near p = 1/2 (tests/core/numerics/normal.test.ts). Near p = 1 the spacing of
 * the doubles there limits the result; use −normalQuantile(1 − p) where 1 − p is known.
 * Source: Wichura, Algorithm AS 241: The percentage points of the normal distribution, Applied Statistics 37 (1988) 477–484,
 * 10.2307/2347330, routine of 16 figures (coefficients compared with those in the Python 3.11 standard library).
 * @example normalQuantile(0.975) // 1.959963984540054
 */
export function normalQuantile(probability: number): number {
  if (!(probability >= 0 && probability <= 1)) throw new RangeError(`probability: ${probability}; must be 0 to 1`);
  const q = probability - 0.5;
  if (Math.abs(q) <= CENTRE) {
    const r = CENTRE * CENTRE - q * q;
    return (q * polynomial(CENTRE_TOP, r)) / polynomial(CENTRE_BOTTOM, r);
  }
  const tail = q < 0 ? probability : 1 - probability;
  if (tail === 0) return q < 0 ? -Infinity : Infinity;
  const r = Math.sqrt(-Math.log(tail));
  const size =
    r <= FAR
      ? polynomial(MIDDLE_TOP, r - 1.6) / polynomial(MIDDLE_BOTTOM, r - 1.6)
      : polynomial(FAR_TOP, r - FAR) / polynomial(FAR_BOTTOM, r - FAR);
  return q < 0 ? -size : size;
}

function polynomial(coefficients: readonly number[], x: number): number {
  let sum = 0;
  for (const each of coefficients) sum = sum * x + each;
  return sum;
}
