/** Fractions spread evenly however many are taken: n times the golden section, its whole part dropped. */
const GOLDEN = (Math.sqrt(5) - 1) / 2;

/**
 * Fewer draws in the place of many: each stands for its neighbourhood.
 *
 * Formula: the draws are put in an order in which neighbours are alike: halved at the median of the coordinate with the widest spread
 * (in units of its standard deviation), each half again, down to `group` draws. Of every `group` draws in that order one is kept, each with
 * a chance in proportion to its weight, by evenly spread fractions; it takes the weight of all of them.
 * @param points one array a dimension
 * @param weights one a draw; their number is a multiple of `group`
 * @param group how many one stands for, 1 or more
 * @returns the draws kept and their weights, the sum of which is unchanged
 * Source: stratified resampling in cells, written here; the fractions: Kronecker sequence, standard.
 */
export function thinnedDraws(
  points: readonly Float64Array[],
  weights: Float64Array,
  group: number,
): { points: Float64Array[]; weights: Float64Array } {
  const order = likeOrder(points, weights, group);
  const count = Math.floor(weights.length / group);
  const kept = points.map(() => new Float64Array(count));
  const together = new Float64Array(count);
  for (let cell = 0; cell < count; cell++) {
    const from = cell * group;
    let sum = 0;
    for (let p = from; p < from + group; p++) sum += weights[order[p]!]!;
    const wanted = (((cell + 0.5) * GOLDEN) % 1) * sum;
    let chosen = order[from]!;
    let reached = 0;
    for (let p = from; p < from + group; p++) {
      const n = order[p]!;
      if (weights[n] === 0) continue;
      chosen = n;
      reached += weights[n]!;
      if (reached > wanted) break;
    }
    for (const [i, column] of points.entries()) kept[i]![cell] = column[chosen]!;
    together[cell] = sum;
  }
  return { points: kept, weights: together };
}

/** Places of the draws, neighbours alike, within a group in any order. */
function likeOrder(points: readonly Float64Array[], weights: Float64Array, group: number): Uint32Array {
  const order = Uint32Array.from(weights.keys());
  const unit = points.map((column) => 1 / spreadOf(column, weights));
  const halve = (from: number, to: number) => {
    if (to - from <= group) return;
    let widest = 0;
    let width = -1;
    for (let i = 0; i < points.length; i++) {
      let low = Number.POSITIVE_INFINITY;
      let high = Number.NEGATIVE_INFINITY;
      for (let p = from; p < to; p++) {
        const value = points[i]![order[p]!]!;
        if (value < low) low = value;
        if (value > high) high = value;
      }
      if ((high - low) * unit[i]! > width) {
        width = (high - low) * unit[i]!;
        widest = i;
      }
    }
    const middle = (from + to) >>> 1;
    medianSplit(order, points[widest]!, from, to - 1, middle);
    halve(from, middle);
    halve(middle, to);
  };
  halve(0, order.length);
  return order;
}

function spreadOf(column: Float64Array, weights: Float64Array): number {
  let mean = 0;
  for (let n = 0; n < column.length; n++) mean += weights[n]! * column[n]!;
  let squares = 0;
  for (let n = 0; n < column.length; n++) squares += weights[n]! * (column[n]! - mean) ** 2;
  return Math.sqrt(squares) || 1;
}

/** Hoare's selection: afterwards everything before `middle` is no larger than everything from it on. */
function medianSplit(order: Uint32Array, column: Float64Array, from: number, to: number, middle: number): void {
  let low = from;
  let high = to;
  while (low < high) {
    const pivot = column[order[(low + high) >>> 1]!]!;
    let i = low;
    let j = high;
    while (i <= j) {
      while (column[order[i]!]! < pivot) i++;
      while (column[order[j]!]! > pivot) j--;
      if (i <= j) {
        const swap = order[i]!;
        order[i] = order[j]!;
        order[j] = swap;
        i++;
        j--;
      }
    }
    if (middle <= j) high = j;
    else if (middle >= i) low = i;
    else return;
  }
}
