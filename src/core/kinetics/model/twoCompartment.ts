import { LinearSweepBody } from "./linearSweepBody.ts";
import type { ModelKind, PeriodRun } from "./modelKind.ts";
import { type Inflow, inflowSlopeAt, type Stretch } from "./stretch.ts";
import {
  type TwoCompartmentConstants,
  type TwoCompartmentDisposition,
  twoCompartmentCheck,
  twoCompartmentConstants,
} from "./twoCompartmentConstants.ts";
import { twoCompartmentDistributionEnd } from "./twoCompartmentDistributionEnd.ts";
import { TwoCompartmentResponse } from "./twoCompartmentResponse.ts";
import { TwoCompartmentSweep } from "./twoCompartmentSweep.ts";
import { twoCompartmentTurns } from "./twoCompartmentTurns.ts";

class TwoCompartmentStretch implements Stretch {
  readonly #constants: TwoCompartmentConstants;
  readonly #volume: number;
  readonly #inflow: Inflow;
  readonly #response: TwoCompartmentResponse;
  #derivative: TwoCompartmentResponse | undefined;

  constructor(constants: TwoCompartmentConstants, volume: number, body: Float64Array, inflow: Inflow) {
    this.#constants = constants;
    this.#volume = volume;
    this.#inflow = inflow;
    this.#response = new TwoCompartmentResponse(constants, body[0]!, body[1]!, inflow);
  }

  levelAt(u: number): number {
    this.#response.goTo(u);
    return this.#response.central / this.#volume;
  }

  slopeAt(u: number): number {
    const slope = this.#slope;
    slope.goTo(u);
    return slope.central / this.#volume;
  }

  get #slope(): TwoCompartmentResponse {
    this.#derivative ??= this.#response.derivative();
    return this.#derivative;
  }

  turns(length: number): readonly number[] {
    const slope = this.#slope;
    slope.goTo(0);
    const { central, peripheral } = slope;
    const start = { central, peripheral, inflow: inflowSlopeAt(this.#inflow, 0) };
    return twoCompartmentTurns(this.#constants, start, this.#inflow, length);
  }

  areaTo(u: number): number {
    return this.#response.areaTo(u) / this.#volume;
  }

  bodyAt(u: number): Float64Array {
    this.#response.goTo(u);
    return Float64Array.of(this.#response.central, this.#response.peripheral);
  }

  eliminatedTo(u: number): number {
    return this.#constants.k10 * this.#response.areaTo(u);
  }
}

/**
 * Formula: with x what one period leaves in a body that starts empty, (I − e^(A·P))⁻¹·x = x/(1 − e^(−α·P)) +
 * (A + α·I)·x·D(P)/[(1 − e^(−α·P))·(1 − e^(−β·P))], D as in TwoCompartmentResponse. Every term is positive.
 */
function steadyBody(disposition: TwoCompartmentDisposition, period: number, run: PeriodRun): Float64Array {
  const { alpha, beta, gap, alphaOverOut, alphaOverBack, k12, k21 } = twoCompartmentConstants(disposition);
  const stretches = run(new Float64Array(2));
  const last = stretches[stretches.length - 1]!;
  const left = last.stretch.bodyAt(last.length);
  const central = left[0]!;
  const peripheral = left[1]!;
  const lossAlpha = -Math.expm1(-alpha * period);
  const lossBeta = -Math.expm1(-beta * period);
  const difference = (Math.exp(-beta * period) * -Math.expm1(-gap * period)) / gap / lossAlpha / lossBeta;
  return Float64Array.of(
    central / lossAlpha + (alphaOverOut * central + k21 * peripheral) * difference,
    peripheral / lossAlpha + (k12 * central + alphaOverBack * peripheral) * difference,
  );
}

export const twoCompartment = {
  kind: "two-compartment",
  superposes: true,
  compartments: 2,
  figures: ["clearance", "volume", "exchange", "peripheralVolume"],
  sweepBody: (state) => new LinearSweepBody(state, 2, new TwoCompartmentSweep(state)),
  check: twoCompartmentCheck,
  stretch: (disposition, body, inflow) =>
    new TwoCompartmentStretch(twoCompartmentConstants(disposition), disposition.volume, body, inflow),
  equations: ({ clearance, volume, exchange, peripheralVolume }, input, x, change, at) => {
    const central = x[at]! / volume;
    const toPeripheral = exchange * (central - x[at + 1]! / peripheralVolume);
    change[at] = input - clearance * central - toPeripheral;
    change[at + 1] = toPeripheral;
  },
  capacity: () => Infinity,
  steadyBody: (disposition, period, _doseRate, run) => steadyBody(disposition, period, run),
  hoursToSteady: (disposition, _doseRate, fraction) =>
    -Math.log1p(-fraction) / twoCompartmentConstants(disposition).beta,
  halfLife: (disposition) => twoCompartmentConstants(disposition).betaHalfLife,
  bothReadings: () => null,
  distributionEnd: (disposition, absorption) =>
    twoCompartmentDistributionEnd(twoCompartmentConstants(disposition), absorption),
} as const satisfies ModelKind<TwoCompartmentDisposition>;
