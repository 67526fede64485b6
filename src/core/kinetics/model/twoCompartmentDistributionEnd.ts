import { decayIntegral, signChanges } from "../../numerics/index.ts";
import { type Absorption, type AbsorptionPart, absorptionParts } from "./absorption.ts";
import { decayDifferenceOf } from "./linearResponse.ts";
import type { TwoCompartmentConstants } from "./twoCompartmentConstants.ts";

/** The part of a level that may still be distributing when distribution counts as over: defined here. */
const STILL_DISTRIBUTING = 0.1;
/** Points of the search for the last crossing, and how far it goes in slowest time constants (nothing underflows there). */
const POINTS = 400;
const FAR = 300;
/** First point of the search, in fastest time constants. */
const NEAR = 1e-4;

/** What one unit of dose leaves, t h after its absorption began, in a compartment that loses at the rate k. */
function left(k: number, { release, share, lag }: AbsorptionPart, t: number): number {
  const u = t - lag;
  if (!(u > 0)) return 0;
  if (release.kind === "first-order") {
    const { ka } = release;
    return share * ka * decayDifferenceOf(k, ka, u, Math.exp(-k * u), Math.exp(-ka * u));
  }
  const fed = Math.min(u, release.duration);
  return (share / release.duration) * decayIntegral(k, fed) * Math.exp(-k * (u - fed));
}

/**
 * When the distribution phase after one dose is over.
 *
 * Formula: the level is a sum of a part that falls with alpha and one that falls with beta, each fed by the absorption: share(t) =
 * alpha part/(alpha part + beta part). share falls to 0, or with an absorption slower than beta to a constant. Over when it has come
 * within 0.1 of that for the last time: distribution then raises the level by no more than about a tenth.
 * @param constants see TwoCompartmentConstants
 * @param absorption see Absorption, checked
 * @returns h after the start of absorption; 0 when the alpha part never matters so much
 * Outside: not checked.
 * Accuracy: the crossing to 1e-9 h; found among 400 points in geometric steps, so one that is crossed twice between two of them
 * (possible only for a mixed absorption) is missed.
 * Source: defined here, docs/methods/two-compartment-oral.md.
 */
export function twoCompartmentDistributionEnd(constants: TwoCompartmentConstants, absorption: Absorption): number {
  const { alpha, beta, alphaShare, betaShare } = constants;
  const parts = absorptionParts(absorption, 1, 0);
  const rates = parts.flatMap(({ release }) => (release.kind === "first-order" ? [release.ka] : []));
  const slowest = Math.min(beta, ...rates);
  const lasting =
    slowest < beta
      ? (alphaShare * (beta - slowest)) / (alphaShare * (beta - slowest) + betaShare * (alpha - slowest))
      : 0;
  const over = (t: number) => {
    let fast = 0;
    let slow = 0;
    for (const part of parts) {
      fast += alphaShare * left(alpha, part, t);
      slow += betaShare * left(beta, part, t);
    }
    return fast / (fast + slow) - lasting - STILL_DISTRIBUTING;
  };
  const last = Math.max(
    0,
    ...parts.map(({ release, lag }) => lag + (release.kind === "zero-order" ? release.duration : 0)),
  );
  const near = NEAR / Math.max(alpha, ...rates);
  const ratio = (FAR / slowest / near) ** (1 / (POINTS - 1));
  const later = Array.from({ length: POINTS }, (_, i) => last + near * ratio ** i);
  // Before the last input ends the share may already have come down for good.
  const earlier = last > 0 ? Array.from({ length: POINTS }, (_, i) => (last * (i + 1)) / POINTS) : [];
  const crossings = signChanges(over, () => Number.NaN, [...earlier, ...later]);
  return crossings[crossings.length - 1] ?? 0;
}
