import { decayIntegral, signChanges } from "../../numerics/index.ts";
import { type Absorption, type AbsorptionPart, absorptionParts } from "./absorption.ts";
import { decayDifferenceOf } from "./linearResponse.ts";
import type { TwoCompartmentConstants } from "./twoCompartmentConstants.ts";

/** A level that falls no more than this many times as fast as in its terminal phase counts as done distributing: defined here. */
const STEEP = 1.5;
/** Points of the search for the last crossing, and how far it goes in slowest time constants (nothing underflows there). */
const POINTS = 400;
const FAR = 300;
/** First point of the search, in fastest time constants. */
const NEAR = 1e-4;

/** What one unit of dose leaves, t h after its absorption began, in a compartment that loses at the rate k. */
function leftAt(k: number, { release, share, lag }: AbsorptionPart, t: number): number {
  const u = t - lag;
  if (!(u > 0)) return 0;
  if (release.kind === "first-order") {
    const { ka } = release;
    return share * ka * decayDifferenceOf(k, ka, u, Math.exp(-k * u), Math.exp(-ka * u));
  }
  const fed = Math.min(u, release.duration);
  return (share / release.duration) * decayIntegral(k, fed) * Math.exp(-k * (u - fed));
}

/** What it still brings, 1/h. */
function inputAt({ release, share, lag }: AbsorptionPart, t: number): number {
  const u = t - lag;
  if (!(u > 0)) return 0;
  if (release.kind === "first-order") return share * release.ka * Math.exp(-release.ka * u);
  return u <= release.duration ? share / release.duration : 0;
}

/**
 * When the distribution phase after one dose is over.
 *
 * Formula: the level is a part a(t) that falls with alpha and a part b(t) that falls with beta, each fed by the absorption r(t); it
 * falls at the rate (alpha·a + beta·b − r)/(a + b). Over when that exceeds 1.5 times the terminal rate, the least of beta and every
 * ka, for the last time. With a slow absorption it never does.
 * @param constants see TwoCompartmentConstants
 * @param absorption see Absorption, checked
 * @returns h after the start of absorption; 0 when the level never falls so fast
 * Outside: not checked.
 * Accuracy: the crossing to 1e-9 h; found among 400 points in geometric steps, so what rises and falls again between two of them is
 * missed.
 * Source: defined here, docs/methods/two-compartment-oral.md.
 */
export function twoCompartmentDistributionEnd(constants: TwoCompartmentConstants, absorption: Absorption): number {
  const { alpha, beta, alphaShare, betaShare } = constants;
  const parts = absorptionParts(absorption, 1, 0);
  const rates = parts.flatMap(({ release }) => (release.kind === "first-order" ? [release.ka] : []));
  const terminal = Math.min(beta, ...rates);
  const excess = (t: number) => {
    let sum = 0;
    for (const part of parts) {
      sum += (alpha - STEEP * terminal) * alphaShare * leftAt(alpha, part, t);
      sum += (beta - STEEP * terminal) * betaShare * leftAt(beta, part, t);
      sum -= inputAt(part, t);
    }
    return sum;
  };
  const last = Math.max(
    ...parts.map(({ release, lag }) => lag + (release.kind === "zero-order" ? release.duration : 0)),
  );
  const near = NEAR / Math.max(alpha, ...rates);
  const ratio = (FAR / terminal / near) ** (1 / (POINTS - 1));
  const later = Array.from({ length: POINTS }, (_, i) => last + near * ratio ** i);
  const earlier = last > 0 ? Array.from({ length: POINTS }, (_, i) => (last * (i + 1)) / POINTS) : [];
  const crossings = signChanges(excess, () => Number.NaN, [...earlier, ...later]);
  return crossings[crossings.length - 1] ?? 0;
}
