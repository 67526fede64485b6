import { decayChain, decayIntegral } from "../../numerics/index.ts";
import { CARRY_AS_LOSS_BELOW, decayDifferenceOf, inflowDerivative } from "./linearResponse.ts";
import { type Inflow, inflowAt } from "./stretch.ts";
import type { TwoCompartmentConstants } from "./twoCompartmentConstants.ts";

/**
 * What is in two compartments, u h after they held given amounts.
 *
 * Formula, A the matrix of the transfer rates, D(u) = φ(α, β; u) the divided difference of the two decays:
 * e^(A·u) = e^(−α·u)·I + (A + α·I)·D(u), in which every entry is a sum of positive terms. A depot adds
 * ka·gut·[φ(α, ka) + (α − k10 − k12)·E(α, β, ka)] to the central and ka·gut·k12·E(α, β, ka) to the peripheral compartment, E the chain
 * of three decays; a constant rate the same with ka = 0. No partial fractions, so coinciding rates cost nothing.
 * Amounts mg, times h; gut and rate may be negative (the derivative of a response is one of these).
 * Accuracy: relative 1e-14 of the largest term.
 * Source: standard result, derived in docs/methods/two-compartment-oral.md.
 */
export class TwoCompartmentResponse {
  /** mg, as of the last `goTo`. */
  central = 0;
  peripheral = 0;
  readonly #constants: TwoCompartmentConstants;
  readonly #central: number;
  readonly #peripheral: number;
  readonly #inflow: Inflow;

  constructor(constants: TwoCompartmentConstants, central: number, peripheral: number, inflow: Inflow) {
    this.#constants = constants;
    this.#central = central;
    this.#peripheral = peripheral;
    this.#inflow = inflow;
  }

  /** Sets `central` and `peripheral` to what they are u h on. */
  goTo(u: number): void {
    const { alpha, beta, alphaOverOut, alphaOverBack, k12, k21 } = this.#constants;
    const leftAlpha = Math.exp(-alpha * u);
    const leftBeta = Math.exp(-beta * u);
    const difference = decayDifferenceOf(alpha, beta, u, leftAlpha, leftBeta);
    const isShort = alpha * u < CARRY_AS_LOSS_BELOW;
    // Over a short time the change is added to the amounts: rounding then does not build up from stretch to stretch.
    const own = isShort ? Math.expm1(-alpha * u) : leftAlpha;
    let central = this.#central * (own + alphaOverOut * difference) + this.#peripheral * (k21 * difference);
    let peripheral = this.#central * (k12 * difference) + this.#peripheral * (own + alphaOverBack * difference);
    const { ka, gut, rate } = this.#inflow;
    for (let i = 0; i < ka.length; i++) {
      const k = ka[i]!;
      const amount = gut[i]! * k;
      const leftK = Math.exp(-k * u);
      const first = decayDifferenceOf(alpha, k, u, leftAlpha, leftK);
      const chain = chainOfThree(alpha, beta, k, u, leftAlpha, leftBeta, leftK, difference);
      central += amount * (first + alphaOverOut * chain);
      peripheral += amount * (k12 * chain);
    }
    if (rate !== 0) {
      const chain = chainOfThree(alpha, beta, 0, u, leftAlpha, leftBeta, 1, difference);
      central += rate * (decayIntegral(alpha, u) + alphaOverOut * chain);
      peripheral += rate * (k12 * chain);
    }
    this.central = isShort ? this.#central + central : central;
    this.peripheral = isShort ? this.#peripheral + peripheral : peripheral;
  }

  /** mg·h in the central compartment over the first u h. */
  areaTo(u: number): number {
    const { alpha, beta, alphaOverOut, k21 } = this.#constants;
    const chain = decayChain([alpha, beta, 0], u);
    let area = this.#central * (decayIntegral(alpha, u) + alphaOverOut * chain) + this.#peripheral * (k21 * chain);
    const { ka, gut, rate } = this.#inflow;
    for (let i = 0; i < ka.length; i++) {
      const k = ka[i]!;
      const own = decayChain([alpha, k, 0], u) + alphaOverOut * decayChain([alpha, beta, k, 0], u);
      area += gut[i]! * (k * own);
    }
    if (rate === 0) return area;
    return area + rate * (decayChain([alpha, 0, 0], u) + alphaOverOut * decayChain([alpha, beta, 0, 0], u));
  }

  /** The response that is this one's derivative, mg/h. */
  derivative(): TwoCompartmentResponse {
    const { k10, k12, k21 } = this.#constants;
    const exchange = k12 * this.#central - k21 * this.#peripheral;
    return new TwoCompartmentResponse(
      this.#constants,
      inflowAt(this.#inflow, 0) - k10 * this.#central - exchange,
      exchange,
      inflowDerivative(this.#inflow),
    );
  }
}

/** From this (fastest − slowest)·u on a chain of three is a difference that loses less than a factor 3. */
const DIFFERENCE_FROM = 2;

/** decayChain of alpha > beta and k, their decays and the difference of the first two given: one level after another needs it quick. */
export function chainOfThree(
  alpha: number,
  beta: number,
  k: number,
  u: number,
  leftAlpha: number,
  leftBeta: number,
  leftK: number,
  difference: number,
): number {
  const spread = Math.max(alpha, k) - Math.min(beta, k);
  if (spread * u < DIFFERENCE_FROM) return decayChain([alpha, beta, k], u);
  if (k > alpha) return (difference - decayDifferenceOf(alpha, k, u, leftAlpha, leftK)) / spread;
  const withBeta = decayDifferenceOf(beta, k, u, leftBeta, leftK);
  if (k < beta) return (withBeta - difference) / spread;
  return (withBeta - decayDifferenceOf(alpha, k, u, leftAlpha, leftK)) / spread;
}
