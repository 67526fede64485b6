export interface GeneralisedPareto {
  /** k: above 0 a heavy tail (moments below order 1/k exist), 0 exponential, below 0 bounded. */
  readonly shape: number;
  /** σ, in the unit of the sample. */
  readonly scale: number;
}

const FEWEST_GRID = 30;
/** The prior of the authors on the grid: three times the reciprocal of a quartile. */
const PRIOR = 3;
/** The weak prior on the shape: as if ten more values had said 1/2. */
const PRIOR_COUNT = 10;
const PRIOR_SHAPE = 0.5;

/**
 * The generalised Pareto distribution that fits a sample of excesses, with a weak prior on its shape.
 *
 * Formula: density (1/σ)·(1 + k·x/σ)^(−1/k − 1). With b = −k/σ: k(b) = mean ln(1 − b·x) and the profile log-likelihood
 * ℓ(b) = n·(ln(−b/k) − k − 1). Over the grid b_j = 1/x_max + (1 − √(m/(j − ½)))/(3·x_q), j = 1…m, m = 30 + ⌊√n⌋, x_q the
 * ⌊n/4 + ½⌋-th smallest: b = Σ b_j·w_j, w_j in proportion to e^ℓ(b_j). Then k = k(b), σ = −k/b, and at last k ← (n·k + 10·½)/(n + 10).
 * @param ascending the excesses, 0 or more, ascending, at least 5, the largest above 0
 * @returns shape and scale, the scale before the prior on the shape; null where the quartile x_q is 0: most of the tail at its foot
 * Outside: not checked.
 * Accuracy: of its own formula 1e-12 (tests/core/numerics/paretoSmoothed.test.ts).
 * Source: Zhang & Stephens, A new and efficient estimation method for the generalized Pareto distribution, Technometrics 51 (2009)
 * 316–325; the prior on the shape: Vehtari et al. 2024 (see paretoSmoothed), appendix (both from memory, unverified).
 * @example generalisedParetoFit(Float64Array.of(1, 2, 3, 4, 10))?.shape // 0.36663807449547137
 */
export function generalisedParetoFit(ascending: Float64Array): GeneralisedPareto | null {
  const n = ascending.length;
  const largest = ascending[n - 1]!;
  const quartile = ascending[Math.floor(n / 4 + 0.5) - 1]!;
  if (!(quartile > 0)) return null;
  const grid = FEWEST_GRID + Math.floor(Math.sqrt(n));
  const candidates: number[] = [];
  const logs: number[] = [];
  for (let j = 1; j <= grid; j++) {
    const b = 1 / largest + (1 - Math.sqrt(grid / (j - 0.5))) / (PRIOR * quartile);
    const k = meanLog(b, ascending);
    candidates.push(b);
    // b = 0 is the exponential distribution: −b/k is 1/mean.
    const ratio = b === 0 ? n / ascending.reduce((sum, each) => sum + each, 0) : -b / k;
    logs.push(n * (Math.log(ratio) - k - 1));
  }
  const best = Math.max(...logs);
  let sum = 0;
  let weighted = 0;
  for (const [j, log] of logs.entries()) {
    const weight = Math.exp(log - best);
    sum += weight;
    weighted += weight * candidates[j]!;
  }
  const b = weighted / sum;
  const k = meanLog(b, ascending);
  const scale = b === 0 ? ascending.reduce((total, each) => total + each, 0) / n : -k / b;
  return { shape: (n * k + PRIOR_COUNT * PRIOR_SHAPE) / (n + PRIOR_COUNT), scale };
}

function meanLog(b: number, values: Float64Array): number {
  let sum = 0;
  for (const each of values) sum += Math.log1p(-b * each);
  return sum / values.length;
}
