import { decayChain, signChanges } from "../../numerics/index.ts";
import { decayDifferenceOf, linearResponseAt } from "./linearResponse.ts";
import { type Inflow, stretchReach } from "./stretch.ts";
import type { TwoCompartmentConstants } from "./twoCompartmentConstants.ts";

/** b′, p′ and inflow′ at the start of a stretch: mg/h, mg/h, mg/h². */
export interface StartSlopes {
  readonly central: number;
  readonly peripheral: number;
  readonly inflow: number;
}

/**
 * Where the central level turns within a stretch: at most three times.
 *
 * Formula, b the central amount, r the inflow, D the derivative by time: (D + α)(D + β) b′ = (D + k21) r′ = q, a sum of decays whose
 * coefficients change sign at most once (at ka = k21), so q has at most one zero. Between zeros of q, e^(α·u)·m with m = (D + β)b′ only
 * rises or only falls, so m has at most one zero in each; between those, e^(β·u)·b′ likewise. Every turn is thus bracketed.
 * m and b′ are computed from their starting values by the same chain, m as the response to q, b′ as the response to m: computed from
 * the amounts, the sign of m would drown in rounding once the fast decay is over, and turns be missed.
 * @param start the slopes at the start
 * @param length h
 * @returns h from the start of the stretch, strictly inside, ascending
 * Accuracy: 4.4e-16·length, as far as rounding leaves the slope a sign.
 * Source: Rolle's theorem, derived in docs/methods/two-compartment-oral.md.
 */
export function twoCompartmentTurns(
  constants: TwoCompartmentConstants,
  start: StartSlopes,
  inflow: Inflow,
  length: number,
): readonly number[] {
  const { alpha, beta, k21, alphaOverBack } = constants;
  const { ka, gut } = inflow;
  const far = stretchReach(length, Math.min(beta, ...ka));
  const ends = (inner: readonly number[]) => [0, ...inner, far];

  const weights = ka.map((k, i) => gut[i]! * k * (k * (k - k21)));
  const q = (u: number) => {
    let sum = 0;
    for (const [i, k] of ka.entries()) sum += weights[i]! * Math.exp(-k * u);
    return sum;
  };
  // β − k10 − k12 = −(α − k21).
  const middleStart = k21 * start.peripheral - alphaOverBack * start.central + start.inflow;
  const source: Inflow = { ka, gut: ka.map((k, i) => weights[i]! / k), rate: 0 };
  const middle = (u: number) => linearResponseAt(alpha, middleStart, source, u);
  const slope = (u: number) => {
    const leftBeta = Math.exp(-beta * u);
    let sum = start.central * leftBeta;
    sum += middleStart * decayDifferenceOf(alpha, beta, u, Math.exp(-alpha * u), leftBeta);
    for (const [i, k] of ka.entries()) sum += weights[i]! * decayChain([alpha, beta, k], u);
    return sum;
  };
  const hasOneSign = ka.every((k) => k >= k21) || ka.every((k) => k <= k21);
  const ofQ = hasOneSign ? [] : signChanges(q, () => Number.NaN, ends([]));
  const ofMiddle = signChanges(middle, (u) => q(u) - alpha * middle(u), ends(ofQ));
  const turns = signChanges(slope, (u) => middle(u) - beta * slope(u), ends(ofMiddle));
  return turns.filter((turn) => turn < length);
}
