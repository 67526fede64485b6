/** Bins of the ranks: 105 ranks in bins of 5; the degrees, 20, are even, which the tail below needs. */
export const RANK_BINS = 21;

/** How often each rank came, in bins of as many ranks. */
export function rankBins(counts: readonly number[]): number[] {
  const wide = counts.length / RANK_BINS;
  if (!Number.isInteger(wide))
    throw new RangeError(`counts.length: ${counts.length}; must be a multiple of ${RANK_BINS}`);
  return Array.from({ length: RANK_BINS }, (_, bin) =>
    counts.slice(bin * wide, (bin + 1) * wide).reduce((sum, each) => sum + each, 0),
  );
}

/**
 * Whether ranks are even: Pearson's chi-square over the bins, and the chance of as much or more if they are.
 * Source: Talts, Betancourt, Simpson, Vehtari & Gelman, Validating Bayesian inference algorithms with simulation-based calibration,
 * 2018, arXiv 1804.06788 (from memory, unverified).
 */
export function rankUniformity(counts: readonly number[]): { chiSquare: number; p: number } {
  const bins = rankBins(counts);
  const expected = bins.reduce((sum, each) => sum + each, 0) / bins.length;
  const chiSquare = bins.reduce((sum, each) => sum + (each - expected) ** 2 / expected, 0);
  return { chiSquare, p: chiSquareTail(chiSquare, bins.length - 1) };
}

/** Chance of more than x: e^(−y)·Σ_{k<n} y^k/k!, y = x/2, n = degrees/2, degrees even. */
export function chiSquareTail(x: number, degrees: number): number {
  if (degrees % 2 !== 0) throw new RangeError(`degrees: ${degrees}; must be even`);
  const y = x / 2;
  let term = 1;
  let sum = 1;
  for (let k = 1; k < degrees / 2; k++) {
    term *= y / k;
    sum += term;
  }
  return Math.exp(Math.log(sum) - y);
}

/** How far a share of n may lie from p by chance, 95 %: 1.96·√(p·(1 − p)/n). */
export function shareRange(p: number, n: number): number {
  return 1.96 * Math.sqrt((p * (1 - p)) / n);
}
