import { signChanges } from "../../numerics/index.ts";
import { type Inflow, inflowSlopeAt } from "./stretch.ts";
import type { TwoCompartmentConstants } from "./twoCompartmentConstants.ts";
import type { TwoCompartmentResponse } from "./twoCompartmentResponse.ts";

/** At this many times the slowest time constant every decay is below 1e-260: what is left has no turn. */
const NOTHING_LEFT = 600;

/**
 * Where the central level turns within a stretch: at most three times.
 *
 * Formula, b the central amount, r the inflow, D the derivative by time: (D + α)(D + β) b′ = (D + k21) r′ = q, a sum of decays whose
 * coefficients change sign at most once (at ka = k21), so q has at most one zero. Between zeros of q, e^(α·u)·(D + β)b′ only rises or
 * only falls, so (D + β)b′ has at most one zero in each; between those, e^(β·u)·b′ likewise. Every turn is thus bracketed.
 * @param slope the response that is the derivative of the central amount
 * @param length h
 * @returns h from the start of the stretch, strictly inside, ascending
 * Accuracy: 4.4e-16·length, as far as rounding leaves the slope a sign.
 * Source: Rolle's theorem, derived in docs/methods/two-compartment-oral.md.
 */
export function twoCompartmentTurns(
  constants: TwoCompartmentConstants,
  slope: TwoCompartmentResponse,
  inflow: Inflow,
  length: number,
): readonly number[] {
  const { alpha, beta, k21, alphaOverBack } = constants;
  const { ka, gut } = inflow;
  const far = Math.min(length, NOTHING_LEFT / Math.min(beta, ...ka));
  const ends = (inner: readonly number[]) => [0, ...inner, far];

  const q = (u: number) => {
    let sum = 0;
    for (const [i, k] of ka.entries()) sum += gut[i]! * k * (k * (k - k21)) * Math.exp(-k * u);
    return sum;
  };
  const middle = (u: number) => {
    slope.goTo(u);
    return k21 * slope.peripheral - alphaOverBack * slope.central + inflowSlopeAt(inflow, u);
  };
  const outer = (u: number) => {
    slope.goTo(u);
    return slope.central;
  };
  const hasOneSign = ka.every((k) => k >= k21) || ka.every((k) => k <= k21);
  const ofInner = hasOneSign ? [] : signChanges(q, () => Number.NaN, ends([]));
  const ofMiddle = signChanges(middle, (u) => q(u) - alpha * middle(u), ends(ofInner));
  const turns = signChanges(outer, (u) => middle(u) - beta * outer(u), ends(ofMiddle));
  return turns.filter((turn) => turn < length);
}
