/** Room for weightedQuantiles to work in, so that many calls allocate nothing. */
export interface QuantileRoom {
  readonly keys: Float64Array;
  /** The same memory in halves: the low one of each key carries where it came from. */
  readonly halves: Uint32Array;
  readonly order: Uint32Array;
}

/** Which half of a double holds its last bits. */
const LOW_HALF = new Uint8Array(Uint32Array.of(1).buffer)[0] === 1 ? 0 : 1;

/** Room for `count` values. */
export function quantileRoom(count: number): QuantileRoom {
  const keys = new Float64Array(count);
  return { keys, halves: new Uint32Array(keys.buffer), order: new Uint32Array(count) };
}

/**
 * The values below which given parts of a weighted sample lie.
 *
 * Formula: with the values ascending, value i stands at the part pᵢ = (w₁ + … + wᵢ − wᵢ/2)/Σw: the middle of its own weight.
 * Between those parts straight lines; before the first and after the last the first and the last value. Values of weight 0 don't
 * count; equal values stand in the order given. With even weights pᵢ = (i − 1/2)/n, Hazen's rule.
 * @param values finite, at least one, in any order
 * @param weights 0 or more, as many; their sum is above 0, it need not be 1
 * @param probabilities 0 to 1 each, in any order
 * @param into where to write the results; absent: a new array
 * @param room from quantileRoom of as many values; absent: a new one
 * @returns one value a probability, in the order given
 * Outside: throws RangeError for values that are not finite, weights that are negative or add up to 0 or to no number, sizes that
 * differ, a probability outside 0 to 1.
 * Accuracy: the order is exact; parts to n·1e-16 (tests/core/numerics/weightedQuantiles.test.ts).
 * Source: Hazen's plotting position (i − 1/2)/n, Hyndman & Fan, Sample quantiles in statistical packages, Am. Stat. 50 (1996)
 * 361–365, definition 5 (from memory, unverified), with weights in the place of counts.
 * @example weightedQuantiles([3, 1, 2], [1, 1, 2], [0.5]) // [2]: 1, 2, 3 stand at 1/8, 1/2, 7/8
 */
export function weightedQuantiles(
  values: ArrayLike<number>,
  weights: ArrayLike<number>,
  probabilities: readonly number[],
  into: Float64Array = new Float64Array(probabilities.length),
  room: QuantileRoom = quantileRoom(values.length),
): Float64Array {
  const total = checkedSum(values, weights, room);
  sortInto(room, values);
  for (const [at, probability] of probabilities.entries()) {
    if (!(probability >= 0 && probability <= 1)) {
      throw new RangeError(`probabilities[${at}]: ${probability}; must be 0 to 1`);
    }
    into[at] = quantileAt(values, weights, room.order, probability * total);
  }
  return into;
}

function checkedSum(values: ArrayLike<number>, weights: ArrayLike<number>, room: QuantileRoom): number {
  const n = values.length;
  if (n === 0) throw new RangeError("values: at least one is needed");
  if (weights.length !== n) throw new RangeError(`weights: ${weights.length} for ${n} values`);
  if (room.order.length !== n) throw new RangeError(`room: for ${room.order.length} values, not ${n}`);
  let total = 0;
  for (let i = 0; i < n; i++) {
    if (!Number.isFinite(values[i]!)) throw new RangeError(`values[${i}]: ${values[i]}; must be finite`);
    if (!(weights[i]! >= 0)) throw new RangeError(`weights[${i}]: ${weights[i]}; must be 0 or more`);
    total += weights[i]!;
  }
  if (!(total > 0 && total < Infinity))
    throw new RangeError(`weights: their sum is ${total}; must be above 0 and finite`);
  return total;
}

/**
 * `order` becomes the places of the values, ascending. Sorting places by a comparison is slow; sorting bare numbers is not. So each
 * number's last bits (12 for 4,000 values: 1e-12 of it) give way to its place, the bare numbers are sorted, and what that put out of
 * order among near equals is mended.
 */
function sortInto({ keys, halves, order }: QuantileRoom, values: ArrayLike<number>): void {
  const n = values.length;
  const places = 2 ** (32 - Math.clz32(n - 1)) - 1;
  for (let i = 0; i < n; i++) {
    // + 0 turns −0 into 0.
    keys[i] = values[i]! + 0;
    const low = 2 * i + LOW_HALF;
    // Of two negative numbers the one with the larger last bits comes first: equal ones keep their order all the same.
    const place = keys[i]! < 0 ? places ^ i : i;
    halves[low] = (halves[low]! & ~places) | place;
  }
  keys.sort();
  for (let i = 0; i < n; i++) {
    const tagged = halves[2 * i + LOW_HALF]! & places;
    const place = keys[i]! < 0 ? places ^ tagged : tagged;
    const value = values[place]!;
    let j = i - 1;
    while (j >= 0 && values[order[j]!]! > value) {
      order[j + 1] = order[j]!;
      j--;
    }
    order[j + 1] = place;
  }
}

function quantileAt(values: ArrayLike<number>, weights: ArrayLike<number>, order: Uint32Array, wanted: number): number {
  let below = 0;
  let lastPart = 0;
  let lastValue = Number.NaN;
  for (let i = 0; i < order.length; i++) {
    const weight = weights[order[i]!]!;
    if (weight === 0) continue;
    const value = values[order[i]!]!;
    const part = below + weight / 2;
    if (part >= wanted) {
      if (Number.isNaN(lastValue) || part === lastPart) return value;
      return lastValue + (value - lastValue) * ((wanted - lastPart) / (part - lastPart));
    }
    below += weight;
    lastPart = part;
    lastValue = value;
  }
  return lastValue;
}
