import { decayIntegral } from "../../numerics/index.ts";
import { decayRepeated } from "./decayRepeated.ts";
import { decayDifferenceOf } from "./linearResponse.ts";
import type { SweepCoefficients } from "./linearSweepBody.ts";
import type { SweepState } from "./sweepBody.ts";

/**
 * Coefficients of one compartment and their derivatives.
 *
 * Formula: body e^(−ke·u), depot ka·φ(ke, ka), rate ∫e^(−ke·s)ds; a derivative by a rate repeats it in the chain of decays:
 * ∂φ(ke, ka)/∂ke = −E(ke, ke, ka), ∂/∂ka = −E(ke, ka, ka), ∂∫/∂ke = −E(ke, ke, 0); ke goes with clearance and against volume.
 * Accuracy: relative 1e-14 of the largest coefficient.
 * Source: derived in docs/methods/levels-to-this-patient.md.
 */
export class OneCompartmentSweep implements SweepCoefficients<{ readonly clearance: number; readonly volume: number }> {
  readonly #state: SweepState;
  /** d ln ke by each name: 1, −1 or 0. */
  readonly #sign: readonly number[];
  #ke = 1;

  constructor(state: SweepState) {
    this.#state = state;
    this.#sign = state.names.map((name) => (name === "clearance" ? 1 : name === "volume" ? -1 : 0));
  }

  disposition({ clearance, volume }: { readonly clearance: number; readonly volume: number }): void {
    this.#ke = clearance / volume;
  }

  write(u: number, values: Float64Array, slopes: Float64Array): void {
    const { ka, depots, rows, kaRow, hasRate } = this.#state;
    const ke = this.#ke;
    const left = Math.exp(-ke * u);
    values[0] = left;
    for (let i = 0; i < depots; i++) {
      values[1 + i] = ka[i]! * decayDifferenceOf(ke, ka[i]!, u, left, Math.exp(-ka[i]! * u));
    }
    if (hasRate) values[1 + depots] = decayIntegral(ke, u);
    if (rows === 1) return;
    const columns = depots + 2;
    slopes.fill(0);
    const sign = this.#sign;
    const byKe = (column: number, slope: number) => {
      for (let q = 0; q < sign.length; q++) slopes[q * columns + column] = sign[q]! * slope;
    };
    byKe(0, -ke * u * left);
    for (let i = 0; i < depots; i++) {
      const k = ka[i]!;
      const leftK = Math.exp(-k * u);
      byKe(1 + i, -ke * k * decayRepeated(ke, k, u, left, leftK));
      if (kaRow > 0) {
        slopes[(kaRow - 1) * columns + 1 + i] = values[1 + i]! - k * k * decayRepeated(k, ke, u, leftK, left);
      }
    }
    if (hasRate) byKe(1 + depots, -ke * decayRepeated(ke, 0, u, left, 1));
  }
}
