import { normalQuantile } from "./normalQuantile.ts";

/**
 * Several series with each value replaced by the normal quantile of its rank among all of them.
 *
 * Formula: z = Φ⁻¹((r − 3/8)/(S + 1/4)), r the rank among all S values, ties sharing the mean of theirs.
 * @param chains finite values
 * @returns series of the same lengths
 * Outside: not checked.
 * Accuracy: that of normalQuantile.
 * Source: Vehtari, Gelman, Simpson, Carpenter & Bürkner, Rank-normalization, folding, and localization, Bayesian Anal. 16 (2021)
 * 667–718, equation 14 (from memory, unverified); the offsets are Blom's.
 * @example rankNormalised([Float64Array.of(1, 3), Float64Array.of(2, 9)])[0] // [-1.0491…, 0.2993…]
 */
export function rankNormalised(chains: readonly Float64Array[]): Float64Array[] {
  const length = chains.reduce((sum, chain) => sum + chain.length, 0);
  const all = new Float64Array(length);
  let at = 0;
  for (const chain of chains) {
    all.set(chain, at);
    at += chain.length;
  }
  const order = Uint32Array.from(all.keys()).sort((a, b) => all[a]! - all[b]!);
  const scores = new Float64Array(length);
  for (let first = 0; first < length; ) {
    let last = first;
    while (last + 1 < length && all[order[last + 1]!] === all[order[first]!]) last++;
    const score = normalQuantile(((first + last) / 2 + 1 - 3 / 8) / (length + 1 / 4));
    for (let i = first; i <= last; i++) scores[order[i]!] = score;
    first = last + 1;
  }
  at = 0;
  return chains.map((chain) => {
    at += chain.length;
    return scores.slice(at - chain.length, at);
  });
}
