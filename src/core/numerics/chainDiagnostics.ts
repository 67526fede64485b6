import { rankNormalised } from "./rankNormalised.ts";

export interface ChainDiagnostics {
  /** How much wider all chains together are than each alone: 1 when they agree. */
  readonly rHat: number;
  /** How many independent draws would say as much about the middle of the distribution. */
  readonly effectiveSize: number;
}

/**
 * Whether several chains have found the same distribution, and how much their draws are worth.
 *
 * Formula: every chain is cut in half, values rank-normalised. R̂ = √(((n − 1)/n·W + B/n)/W) with W the mean variance within the 2M halves
 * of n values and B/n the variance of their means; the larger of that of x and that of |x − median|. Effective size: 2M·n/τ,
 * τ = −1 + 2·Σ Pₖ, Pₖ = ρ₂ₖ + ρ₂ₖ₊₁ over Geyer's initial monotone positive sequence, ρₜ = 1 − (W − mean autocovariance at t)/var⁺;
 * τ at least 1/log₁₀(2M·n).
 * @param chains two or more, of the same even length, 8 or more, finite
 * @returns see ChainDiagnostics. Chains that never move: rHat Infinity, effectiveSize 0
 * Outside: RangeError for fewer or shorter chains or unequal lengths.
 * Accuracy: of its own formula 1e-10 (tests/core/numerics/chainDiagnostics.test.ts).
 * Source: Vehtari et al. 2021 (see rankNormalised); Geyer, Practical Markov chain Monte Carlo, Stat. Sci. 7 (1992) 473–483 (from
 * memory, unverified).
 * @example Four chains of 500 independent normal draws: rHat about 1.00, effectiveSize about 2,000
 */
export function chainDiagnostics(chains: readonly Float64Array[]): ChainDiagnostics {
  const length = chains[0]?.length ?? 0;
  if (chains.length < 2) throw new RangeError(`chains: ${chains.length}; at least 2 are needed`);
  if (length < 8 || length % 2 !== 0 || chains.some((chain) => chain.length !== length)) {
    throw new RangeError(
      `chains: of ${chains.map((chain) => chain.length)} values; all must have the same even number, 8 or more`,
    );
  }
  const halves = chains.flatMap((chain) => [chain.subarray(0, length / 2), chain.subarray(length / 2)]);
  const sorted = Float64Array.from(chains.flatMap((chain) => [...chain])).sort();
  const median = (sorted[sorted.length / 2 - 1]! + sorted[sorted.length / 2]!) / 2;
  const bulk = rankNormalised(halves);
  const folded = rankNormalised(halves.map((half) => half.map((each) => Math.abs(each - median))));
  const inBulk = spreads(bulk);
  const inFolded = spreads(folded);
  if (!(inBulk.within > 0 && inFolded.within > 0)) return { rHat: Infinity, effectiveSize: 0 };
  return {
    rHat: Math.sqrt(Math.max(inBulk.pooled / inBulk.within, inFolded.pooled / inFolded.within)),
    effectiveSize: effectiveSize(bulk, inBulk),
  };
}

interface Spreads {
  readonly means: readonly number[];
  /** W */
  readonly within: number;
  /** var⁺ */
  readonly pooled: number;
}

function spreads(halves: readonly Float64Array[]): Spreads {
  const n = halves[0]!.length;
  const means = halves.map((half) => half.reduce((sum, each) => sum + each, 0) / n);
  const within =
    halves.reduce((sum, half, m) => sum + half.reduce((s, each) => s + (each - means[m]!) ** 2, 0) / (n - 1), 0) /
    halves.length;
  const mean = means.reduce((sum, each) => sum + each, 0) / means.length;
  const between = means.reduce((sum, each) => sum + (each - mean) ** 2, 0) / (means.length - 1);
  return { means, within, pooled: ((n - 1) / n) * within + between };
}

function effectiveSize(halves: readonly Float64Array[], { means, within, pooled }: Spreads): number {
  const n = halves[0]!.length;
  const total = halves.length * n;
  const correlation = (lag: number) => {
    let sum = 0;
    for (const [m, half] of halves.entries()) {
      for (let i = lag; i < n; i++) sum += (half[i]! - means[m]!) * (half[i - lag]! - means[m]!);
    }
    return 1 - (within - sum / total) / pooled;
  };
  let time = -1;
  let before = Infinity;
  for (let lag = 0; lag + 1 < n; lag += 2) {
    const pair = (lag === 0 ? 1 : correlation(lag)) + correlation(lag + 1);
    if (!(pair > 0)) break;
    before = Math.min(before, pair);
    time += 2 * before;
  }
  return total / Math.max(time, 1 / Math.log10(total));
}
