import { decayChain, decayIntegral } from "../../numerics/index.ts";
import { decayRepeated } from "./decayRepeated.ts";
import { decayDifferenceOf } from "./linearResponse.ts";
import type { SweepCoefficients } from "./linearSweepBody.ts";
import type { SweepState } from "./sweepBody.ts";
import {
  type TwoCompartmentConstants,
  type TwoCompartmentDisposition,
  twoCompartmentConstants,
} from "./twoCompartmentConstants.ts";
import { chainOfThree } from "./twoCompartmentResponse.ts";

/** Derivatives of the constants by the logarithm of one parameter. */
interface ConstantSlopes {
  readonly k12: number;
  readonly k21: number;
  readonly alpha: number;
  readonly beta: number;
  readonly out: number;
  readonly back: number;
}

const NONE: ConstantSlopes = { k12: 0, k21: 0, alpha: 0, beta: 0, out: 0, back: 0 };

/**
 * From dk10, dk12, dk21: gap·dgap = s·ds + 2·d(k12·k21); of the two differences out = (gap − s)/2 and back = (gap + s)/2 the larger is
 * derived as written, the smaller as k12·k21/larger, and beta as k10·k21/alpha, as in twoCompartmentConstants.
 */
function slopesOf(c: TwoCompartmentConstants, byK10: number, byK12: number, byK21: number): ConstantSlopes {
  const dk10 = byK10 * c.k10;
  const dk12 = byK12 * c.k12;
  const dk21 = byK21 * c.k21;
  const s = c.k10 + c.k12 - c.k21;
  const ds = dk10 + dk12 - dk21;
  const exchange = byK12 + byK21;
  const dgap = (s / c.gap) * ds + ((2 * c.k12) / c.gap) * c.k21 * exchange;
  const alpha = (dk10 + dk12 + dk21 + dgap) / 2;
  const larger = (dgap + (s >= 0 ? ds : -ds)) / 2;
  const size = s >= 0 ? c.alphaOverBack : c.alphaOverOut;
  const smaller = (s >= 0 ? c.alphaOverOut : c.alphaOverBack) * (exchange - larger / size);
  return {
    k12: dk12,
    k21: dk21,
    alpha,
    beta: c.beta * (byK10 + byK21 - alpha / c.alpha),
    out: s >= 0 ? smaller : larger,
    back: s >= 0 ? larger : smaller,
  };
}

/**
 * Coefficients of two compartments and their derivatives.
 *
 * Formula: those of TwoCompartmentResponse; a derivative by a rate repeats it in the chain of decays, ∂E(…r…)/∂r = −E(…r, r…), and the
 * constants are derived by the micro constants.
 * Accuracy: relative 1e-13 of the largest coefficient.
 * Source: derived in docs/methods/levels-to-this-patient.md.
 */
export class TwoCompartmentSweep implements SweepCoefficients<TwoCompartmentDisposition> {
  readonly #state: SweepState;
  #constants: TwoCompartmentConstants | undefined;
  /** One a name. */
  #by: readonly ConstantSlopes[] = [];

  constructor(state: SweepState) {
    this.#state = state;
  }

  disposition(disposition: TwoCompartmentDisposition): void {
    const c = twoCompartmentConstants(disposition);
    this.#constants = c;
    this.#by = this.#state.names.map((name) => {
      if (name === "clearance") return slopesOf(c, 1, 0, 0);
      if (name === "volume") return slopesOf(c, -1, -1, 0);
      if (name === "exchange") return slopesOf(c, 0, 1, 1);
      return name === "peripheralVolume" ? slopesOf(c, 0, 0, -1) : NONE;
    });
  }

  write(u: number, values: Float64Array, slopes: Float64Array): void {
    const { ka, depots, rows, hasRate } = this.#state;
    const { alpha, beta, alphaOverOut, alphaOverBack, k12, k21 } = this.#constants!;
    const leftAlpha = Math.exp(-alpha * u);
    const leftBeta = Math.exp(-beta * u);
    const difference = decayDifferenceOf(alpha, beta, u, leftAlpha, leftBeta);
    const second = depots + 3;
    values[0] = leftAlpha + alphaOverOut * difference;
    values[1] = k21 * difference;
    values[second] = k12 * difference;
    values[second + 1] = leftAlpha + alphaOverBack * difference;
    for (let i = 0; i < depots; i++) {
      const k = ka[i]!;
      const leftK = Math.exp(-k * u);
      const first = decayDifferenceOf(alpha, k, u, leftAlpha, leftK);
      const chain = chainOfThree(alpha, beta, k, u, leftAlpha, leftBeta, leftK, difference);
      values[2 + i] = k * (first + alphaOverOut * chain);
      values[second + 2 + i] = k * (k12 * chain);
    }
    if (hasRate) {
      const chain = chainOfThree(alpha, beta, 0, u, leftAlpha, leftBeta, 1, difference);
      values[2 + depots] = decayIntegral(alpha, u) + alphaOverOut * chain;
      values[second + 2 + depots] = k12 * chain;
    }
    if (rows > 1) this.#slopes(u, leftAlpha, difference, slopes);
  }

  #slopes(u: number, leftAlpha: number, difference: number, slopes: Float64Array): void {
    const { ka, depots, kaRow, hasRate } = this.#state;
    const { alpha, beta, alphaOverOut, alphaOverBack, k12, k21 } = this.#constants!;
    const second = depots + 3;
    const leftBeta = Math.exp(-beta * u);
    const aab = decayRepeated(alpha, beta, u, leftAlpha, leftBeta);
    const abb = decayRepeated(beta, alpha, u, leftBeta, leftAlpha);
    for (const [q, by] of this.#by.entries()) {
      const at = q * 2 * second;
      const own = -by.alpha * u * leftAlpha;
      const change = -by.alpha * aab - by.beta * abb;
      slopes[at] = own + by.out * difference + alphaOverOut * change;
      slopes[at + 1] = by.k21 * difference + k21 * change;
      slopes[at + second] = by.k12 * difference + k12 * change;
      slopes[at + second + 1] = own + by.back * difference + alphaOverBack * change;
    }
    // The depots, and after them the constant rate: a depot of rate 0 without its factor.
    for (let i = 0; i < depots + (hasRate ? 1 : 0); i++) {
      const isRate = i === depots;
      const k = isRate ? 0 : ka[i]!;
      const factor = isRate ? 1 : k;
      const chain = decayChain([alpha, beta, k], u);
      const leftK = Math.exp(-k * u);
      const ofFirst = decayRepeated(alpha, k, u, leftAlpha, leftK);
      const ofAlpha = decayChain([alpha, alpha, beta, k], u);
      const ofBeta = decayChain([alpha, beta, beta, k], u);
      for (const [q, by] of this.#by.entries()) {
        const change = -by.alpha * ofAlpha - by.beta * ofBeta;
        const at = q * 2 * second + 2 + i;
        slopes[at] = factor * (-by.alpha * ofFirst + by.out * chain + alphaOverOut * change);
        slopes[at + second] = factor * (by.k12 * chain + k12 * change);
      }
      if (kaRow === 0 || isRate) continue;
      const ofK = decayChain([alpha, beta, k, k], u);
      const first = decayDifferenceOf(alpha, k, u, leftAlpha, leftK) - k * decayRepeated(k, alpha, u, leftK, leftAlpha);
      const at = (kaRow - 1) * 2 * second + 2 + i;
      slopes[at] = k * (first + alphaOverOut * (chain - k * ofK));
      slopes[at + second] = k * k12 * (chain - k * ofK);
    }
  }
}
