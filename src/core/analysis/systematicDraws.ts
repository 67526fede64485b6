/**
 * Indices of `count` draws taken by weight, in order: each draw comes as often as its share says, rounded up or down.
 * The jth is where the running sum of the weights passes (j + 1/2)/count: no randomness is added to that of the draws.
 * Example: weights 0.5, 0.25, 0.25 and a count of 4 give 0, 0, 1, 2.
 * Source: systematic resampling (Kitagawa G. Monte Carlo filter and smoother for non-Gaussian nonlinear state space models.
 * J Comput Graph Stat 1996;5:1-25; from memory, unverified), at a fixed offset.
 */
export function systematicDraws(weights: Float64Array, count: number): Int32Array {
  const chosen = new Int32Array(count);
  let total = 0;
  for (const weight of weights) total += weight;
  let running = 0;
  let next = 0;
  for (let i = 0; i < weights.length; i++) {
    running += weights[i]! / total;
    while (next < count && (next + 0.5) / count <= running) chosen[next++] = i;
  }
  // Rounding may leave the last sum a shade below 1.
  while (next < count) chosen[next++] = weights.length - 1;
  return chosen;
}
