import { type SeededRandom, seededRandom } from "./seededRandom.ts";

/**
 * From the second dimension on: the primitive polynomial over GF(2) (its coefficients as bits) and the first direction numbers
 * m₁, m₂, …; the first dimension has mₖ = 1 throughout.
 */
const DIRECTIONS: readonly (readonly number[])[] = [
  [3, 1],
  [7, 1, 3],
  [11, 1, 3, 1],
  [13, 1, 1, 1],
  [19, 1, 1, 3, 3],
  [25, 1, 3, 5, 13],
  [37, 1, 1, 5, 5, 17],
  [41, 1, 1, 5, 5, 5],
  [47, 1, 1, 7, 11, 19],
  [55, 1, 1, 5, 1, 1],
  [59, 1, 1, 1, 3, 11],
  [61, 1, 3, 5, 5, 31],
  [67, 1, 3, 3, 9, 7, 49],
  [91, 1, 1, 1, 15, 21, 21],
  [97, 1, 3, 1, 13, 27, 49],
];
const BITS = 32;
const MOST_DIMENSIONS = DIRECTIONS.length + 1;
const MOST_POINTS = 2 ** 31;

/**
 * Points that fill the unit cube more evenly than chance would.
 *
 * Formula: Sobol's sequence in Gray-code order, 32 bits: point n + 1 is point n with direction number c exclusive-ored in each
 * dimension, c the lowest zero bit of n. With a seed each dimension is scrambled: its bits multiplied by a random lower triangular
 * matrix over GF(2) with ones on the diagonal, then a random shift added bit by bit. Both leave a net a net: of the first 2^m points
 * each elementary box that should hold 2^t does, and every point by itself is even over the cube.
 * @param dimension 1 to 16
 * @param count how many points, 1 to 2^31; a power of 2 fills evenly
 * @param seed whole number, 0 to 2^32 − 1, or null for the plain sequence
 * @returns one array a dimension, of `count` numbers: k/2^32 for the plain sequence, its first point 0; (k + 1/2)/2^32 for a
 * scrambled one, so never 0 and never 1
 * Outside: RangeError.
 * Accuracy: exact, the same bits on every machine (tests/core/numerics/sobolPoints.test.ts).
 * Source: Joe & Kuo, Constructing Sobol sequences with better two-dimensional projections, SIAM J. Sci. Comput. 30 (2008)
 * 2635–2654, direction numbers "new-joe-kuo-6" (taken from the table SciPy 1.17.1 carries); scrambling: Matoušek, On the
 * L2-discrepancy for anchored boxes, J. Complexity 14 (1998) 527–556 (from memory, unverified).
 * @example sobolPoints(2, 4, null) // [[0, 0.5, 0.75, 0.25], [0, 0.5, 0.25, 0.75]]
 */
export function sobolPoints(dimension: number, count: number, seed: number | null): Float64Array[] {
  if (!(Number.isInteger(dimension) && dimension >= 1 && dimension <= MOST_DIMENSIONS)) {
    throw new RangeError(`dimension: ${dimension}; must be a whole number, 1 to ${MOST_DIMENSIONS}`);
  }
  if (!(Number.isInteger(count) && count >= 1 && count <= MOST_POINTS)) {
    throw new RangeError(`count: ${count}; must be a whole number, 1 to ${MOST_POINTS}`);
  }
  const random = seed === null ? null : seededRandom(seed);
  const points: Float64Array[] = [];
  for (let d = 0; d < dimension; d++) {
    const plain = directionNumbers(d);
    const directions = random ? scrambled(plain, random) : plain;
    let k = random ? random.bits() : 0;
    const half = random ? 0.5 : 0;
    const made = new Float64Array(count);
    for (let n = 0; n < count; n++) {
      made[n] = ((k >>> 0) + half) / 2 ** BITS;
      // The lowest zero bit of n.
      k ^= directions[31 - Math.clz32(~n & (n + 1))]!;
    }
    points.push(made);
  }
  return points;
}

/** vₖ = mₖ·2^(32 − k) with mₖ = 2a₁·mₖ₋₁ ⊕ 4a₂·mₖ₋₂ ⊕ … ⊕ 2^s·mₖ₋ₛ ⊕ mₖ₋ₛ. */
function directionNumbers(d: number): Uint32Array {
  const numbers = new Uint32Array(BITS);
  const [polynomial, ...first] = d === 0 ? [1, 1] : DIRECTIONS[d - 1]!;
  const degree = d === 0 ? 0 : first.length;
  for (let k = 0; k < BITS; k++) {
    if (d === 0 || k < degree) {
      numbers[k] = (d === 0 ? 1 : first[k]!) << (BITS - 1 - k);
      continue;
    }
    let v = numbers[k - degree]! ^ (numbers[k - degree]! >>> degree);
    for (let i = 1; i < degree; i++) {
      if ((polynomial! >> (degree - i)) & 1) v ^= numbers[k - i]!;
    }
    numbers[k] = v;
  }
  return numbers;
}

/** Each direction number times one random lower triangular bit matrix: bit i of the product depends on bits 0…i only, bit 0 the highest. */
function scrambled(directions: Uint32Array, random: SeededRandom): Uint32Array {
  const rows = new Uint32Array(BITS);
  for (let i = 0; i < BITS; i++) {
    const diagonal = (1 << (BITS - 1 - i)) >>> 0;
    const above = i === 0 ? 0 : (0xffffffff << (BITS - i)) >>> 0;
    rows[i] = (random.bits() & above) | diagonal;
  }
  return directions.map((v) => {
    let product = 0;
    for (let i = 0; i < BITS; i++) product |= parity(rows[i]! & v) << (BITS - 1 - i);
    return product;
  });
}

function parity(bits: number): number {
  let b = bits;
  b ^= b >>> 16;
  b ^= b >>> 8;
  b ^= b >>> 4;
  return (0x6996 >> (b & 15)) & 1;
}
