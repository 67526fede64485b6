import { drawMoments } from "./drawSummary.ts";

/** Fractions spread evenly however many are taken: n times the golden section, its whole part dropped. */
const GOLDEN = (Math.sqrt(5) - 1) / 2;

/**
 * Fewer draws in the place of many: each stands for its neighbourhood.
 *
 * Formula: the space is cut in two where the draws are widest spread, each part again, down to `count` cells that hold about equal sums of
 * wₙ·(1 + |zₙ|²), z the distance from the mean in standard deviations: far out, where few draws carry standard deviations and
 * percentiles, the cells hold less weight. Of every cell one draw is kept, each with a chance in proportion to its weight, by
 * evenly spread fractions; it takes the weight of all of them.
 * @param points one array a dimension
 * @param weights one a draw, adding up to 1
 * @param count how many to keep, 1 to the number of draws
 * @returns the draws kept and their weights, the sum of which is unchanged
 * Outside: not checked.
 * Accuracy: tests/core/estimation/thinnedDraws.test.ts.
 * Source: stratified resampling in cells, written here; the fractions: Kronecker sequence, standard.
 */
export function thinnedDraws(
  points: readonly Float64Array[],
  weights: Float64Array,
  count: number,
): { points: Float64Array[]; weights: Float64Array } {
  const order = Uint32Array.from(weights.keys());
  const unit = points.map((column) => 1 / (drawMoments(column, weights).sd || 1));
  const measure = measureOf(points, weights, unit);
  const kept = points.map(() => new Float64Array(count));
  const together = new Float64Array(count);
  let cell = 0;
  const keepOne = (from: number, to: number) => {
    let sum = 0;
    for (let p = from; p < to; p++) sum += weights[order[p]!]!;
    const wanted = (((cell + 0.5) * GOLDEN) % 1) * sum;
    let chosen = order[from]!;
    let reached = 0;
    for (let p = from; p < to; p++) {
      const n = order[p]!;
      if (weights[n] === 0) continue;
      chosen = n;
      reached += weights[n]!;
      if (reached > wanted) break;
    }
    for (let i = 0; i < points.length; i++) kept[i]![cell] = points[i]![chosen]!;
    together[cell++] = sum;
  };
  const cut = (from: number, to: number, cells: number) => {
    if (cells === 1) {
      keepOne(from, to);
      return;
    }
    const lower = cells >>> 1;
    const column = points[widest(points, measure, unit, order, from, to)]!;
    const share = lower / cells;
    const at = measureSplit(order, column, measure, from, to, share);
    // Never fewer draws than cells.
    const middle = Math.max(from + lower, Math.min(to - (cells - lower), at));
    cut(from, middle, lower);
    cut(middle, to, cells - lower);
  };
  cut(0, order.length, count);
  return { points: kept, weights: together };
}

function measureOf(points: readonly Float64Array[], weights: Float64Array, unit: readonly number[]): Float64Array {
  const mean = points.map((column) => drawMoments(column, weights).mean);
  return weights.map((weight, n) => {
    let squared = 0;
    for (let i = 0; i < points.length; i++) squared += ((points[i]![n]! - mean[i]!) * unit[i]!) ** 2;
    return weight * (1 + squared);
  });
}

/** The dimension in which the draws from `from` up to `to` vary most. */
function widest(
  points: readonly Float64Array[],
  measure: Float64Array,
  unit: readonly number[],
  order: Uint32Array,
  from: number,
  to: number,
): number {
  let best = 0;
  let most = -1;
  for (let i = 0; i < points.length; i++) {
    const column = points[i]!;
    const origin = column[order[from]!]!;
    let total = 0;
    let sum = 0;
    let squares = 0;
    for (let p = from; p < to; p++) {
      const n = order[p]!;
      const off = column[n]! - origin;
      total += measure[n]!;
      sum += measure[n]! * off;
      squares += measure[n]! * off * off;
    }
    const spread = total > 0 ? (squares / total - (sum / total) ** 2) * unit[i]! ** 2 : 0;
    if (spread > most) {
      most = spread;
      best = i;
    }
  }
  return best;
}

/** Hoare's selection: afterwards everything before the place returned is no larger than the rest, and has that share of the measure. */
function measureSplit(
  order: Uint32Array,
  column: Float64Array,
  measure: Float64Array,
  from: number,
  to: number,
  share: number,
): number {
  let wanted = 0;
  for (let p = from; p < to; p++) wanted += measure[order[p]!]!;
  wanted *= share;
  let low = from;
  let high = to - 1;
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
    let left = 0;
    for (let p = low; p <= j; p++) left += measure[order[p]!]!;
    if (wanted < left) {
      high = j;
      continue;
    }
    for (let p = j + 1; p < i; p++) left += measure[order[p]!]!;
    if (wanted <= left) return i;
    wanted -= left;
    low = i;
  }
  return wanted > measure[order[low]!]! / 2 ? low + 1 : low;
}
