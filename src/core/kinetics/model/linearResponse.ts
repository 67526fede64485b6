import { decayChain, decayIntegral } from "../../numerics/index.ts";
import type { Inflow } from "./stretch.ts";

/** Where φ changes form: within ±1 by expm1, beyond as a difference that loses less than a factor 2.2. */
const DIFFERENCE_ABOVE = 1;

/** (e^(−a·u) − e^(−b·u))/(b − a), both decays given. */
export function decayDifferenceOf(a: number, b: number, u: number, leftA: number, leftB: number): number {
  const gap = b - a;
  const x = gap * u;
  if (x > DIFFERENCE_ABOVE || x < -DIFFERENCE_ABOVE) return (leftA - leftB) / gap;
  return x === 0 ? leftA * u : (leftA * -Math.expm1(-x)) / gap;
}

/**
 * What is in one compartment that loses at the rate `k`, u h after it held `amount`.
 *
 * Formula: amount·e^(−k·u) + Σ gutᵢ·kaᵢ·φ(k, kaᵢ; u) + rate·(1 − e^(−k·u))/k.
 * @param k 1/h, above 0
 * @param amount mg
 * @param inflow see Inflow; `gut` and `rate` may be negative (the derivative of a response is one of these)
 * @param u h, 0 or more
 * @returns mg
 * Accuracy: relative 1e-15 of the largest term.
 * @example linearResponseAt(0.2, 100, { ka: [1], gut: [50], rate: 0 }, 3) // 86.07…
 */
export function linearResponseAt(k: number, amount: number, inflow: Inflow, u: number): number {
  const left = Math.exp(-k * u);
  let body = amount * left;
  const { ka, gut, rate } = inflow;
  for (let i = 0; i < ka.length; i++) {
    body += gut[i]! * (ka[i]! * decayDifferenceOf(k, ka[i]!, u, left, Math.exp(-ka[i]! * u)));
  }
  return rate === 0 ? body : body + rate * decayIntegral(k, u);
}

/** Below it a decay is carried as a small loss (expm1), above it as a factor: rounding does not build up, nor swallow a tail. */
export const CARRY_AS_LOSS_BELOW = 0.5;

/** amount·e^(−k·u), for carrying from one stretch to the next. */
export function decayCarried(k: number, amount: number, u: number): number {
  const x = k * u;
  return x < CARRY_AS_LOSS_BELOW ? amount + amount * Math.expm1(-x) : amount * Math.exp(-x);
}

/** The same as linearResponseAt, for carrying from one stretch to the next. */
export function linearResponseCarried(k: number, amount: number, inflow: Inflow, u: number): number {
  const x = k * u;
  if (x >= CARRY_AS_LOSS_BELOW) return linearResponseAt(k, amount, inflow, u);
  return amount + (amount * Math.expm1(-x) + linearResponseAt(k, 0, inflow, u));
}

/** mg·h under that over the first u h. */
export function linearResponseArea(k: number, amount: number, inflow: Inflow, u: number): number {
  let area = amount * decayIntegral(k, u);
  const { ka, gut, rate } = inflow;
  for (let i = 0; i < ka.length; i++) area += gut[i]! * (ka[i]! * decayChain([k, ka[i]!, 0], u));
  return rate === 0 ? area : area + rate * decayChain([k, 0, 0], u);
}

/** The inflow whose response is the derivative of the response to `inflow`. */
export function inflowDerivative({ ka, gut }: Inflow): Inflow {
  return { ka, gut: gut.map((amount, i) => -amount * ka[i]!), rate: 0 };
}
