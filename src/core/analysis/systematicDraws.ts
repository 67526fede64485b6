/**
 * Indices of `count` draws taken by weight: each draw comes as often as its share says, rounded up or down.
 *
 * The draws are first put in order of `along`. Taken as they come they must not be: quasi-random points have a structure of their own in
 * their order, and every second of them can lie in one half of a figure's range. The jth taken is where the running sum of the weights
 * passes (j + 1/2)/count, so that the picks also lie evenly along that figure.
 * Example: weights 0.5, 0.25, 0.25 along 1, 2, 3 and a count of 4 give 0, 0, 1, 2.
 * Source: systematic resampling (Kitagawa G. Monte Carlo filter and smoother for non-Gaussian nonlinear state space models.
 * J Comput Graph Stat 1996;5:1-25; from memory, unverified), at a fixed offset.
 */
export function systematicDraws(weights: Float64Array, along: Float64Array, count: number): Int32Array {
  const order = Int32Array.from(weights, (_, i) => i).sort((a, b) => along[a]! - along[b]!);
  const chosen = new Int32Array(count);
  let total = 0;
  for (const weight of weights) total += weight;
  let running = 0;
  let next = 0;
  for (const i of order) {
    running += weights[i]! / total;
    while (next < count && (next + 0.5) / count <= running) chosen[next++] = i;
  }
  // Rounding may leave the last sum a shade below 1.
  while (next < count) chosen[next++] = order[order.length - 1]!;
  return chosen;
}
