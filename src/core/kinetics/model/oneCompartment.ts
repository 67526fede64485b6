import { signChanges } from "../../numerics/index.ts";
import { type BothReadings, bothReadings } from "../bothReadings.ts";
import type { Absorption } from "./absorption.ts";
import { inflowDerivative, linearResponseArea, linearResponseAt, linearResponseCarried } from "./linearResponse.ts";
import { LinearSweepBody } from "./linearSweepBody.ts";
import { modelPositive } from "./modelArgument.ts";
import type { ModelKind, PeriodRun } from "./modelKind.ts";
import { OneCompartmentSweep } from "./oneCompartmentSweep.ts";
import { type Inflow, inflowAt, type Stretch, stretchReach } from "./stretch.ts";

/** One compartment, elimination in proportion to the level. */
export interface OneCompartmentDisposition {
  readonly kind: "one-compartment";
  /** L/h, above 0. */
  readonly clearance: number;
  /** L, above 0. */
  readonly volume: number;
}

class OneCompartmentStretch implements Stretch {
  readonly #ke: number;
  readonly #volume: number;
  readonly #body: number;
  readonly #inflow: Inflow;
  readonly #bodySlope: number;
  readonly #inflowSlope: Inflow;

  constructor(ke: number, volume: number, body: number, inflow: Inflow) {
    this.#ke = ke;
    this.#volume = volume;
    this.#body = body;
    this.#inflow = inflow;
    this.#bodySlope = inflowAt(inflow, 0) - ke * body;
    this.#inflowSlope = inflowDerivative(inflow);
  }

  levelAt(u: number): number {
    return linearResponseAt(this.#ke, this.#body, this.#inflow, u) / this.#volume;
  }

  slopeAt(u: number): number {
    return linearResponseAt(this.#ke, this.#bodySlope, this.#inflowSlope, u) / this.#volume;
  }

  /**
   * (D + ke)·b′ = inflow′ and the inflow only falls, so e^(ke·u)·b′ only falls: b′ changes sign at most once, from rising to falling.
   * The slope is computed as a response of its own, without the constant input, so that its sign holds out on a plateau.
   */
  turns(length: number): readonly number[] {
    if (!(this.#bodySlope > 0)) return [];
    const ke = this.#ke;
    const slope = (u: number) => linearResponseAt(ke, this.#bodySlope, this.#inflowSlope, u);
    const bend = (u: number) => inflowAt(this.#inflowSlope, u) - ke * slope(u);
    const far = stretchReach(length, Math.min(ke, ...this.#inflow.ka));
    return signChanges(slope, bend, [0, far]).filter((turn) => turn < length);
  }

  areaTo(u: number): number {
    return linearResponseArea(this.#ke, this.#body, this.#inflow, u) / this.#volume;
  }

  bodyAt(u: number): Float64Array {
    return Float64Array.of(linearResponseCarried(this.#ke, this.#body, this.#inflow, u));
  }

  eliminatedTo(u: number): number {
    return this.#ke * linearResponseArea(this.#ke, this.#body, this.#inflow, u);
  }
}

const rateOf = ({ clearance, volume }: OneCompartmentDisposition) => clearance / volume;

function steadyBody(disposition: OneCompartmentDisposition, period: number, run: PeriodRun): Float64Array {
  const stretches = run(new Float64Array(1));
  const last = stretches[stretches.length - 1]!;
  return last.stretch.bodyAt(last.length).map((amount) => amount / -Math.expm1(-rateOf(disposition) * period));
}

function bothReadingsOf(
  disposition: OneCompartmentDisposition,
  absorption: Absorption,
  bioavailability: number,
  lag: number,
): BothReadings | null {
  if (absorption.kind !== "first-order") return null;
  const { ka } = absorption;
  return bothReadings({ ka, ke: rateOf(disposition), volume: disposition.volume, bioavailability, lag });
}

export const oneCompartment = {
  kind: "one-compartment",
  superposes: true,
  compartments: 1,
  figures: ["clearance", "volume"],
  sweepBody: (state) => new LinearSweepBody(state, 1, new OneCompartmentSweep(state)),
  check: (name, disposition) => {
    modelPositive(`${name}.clearance`, disposition.clearance, "L/h");
    modelPositive(`${name}.volume`, disposition.volume, "L");
    modelPositive(`${name}.clearance / volume`, rateOf(disposition), "/h");
  },
  stretch: (disposition, body, inflow) =>
    new OneCompartmentStretch(rateOf(disposition), disposition.volume, body[0]!, inflow),
  equations: ({ clearance, volume }, input, x, change, at) => {
    change[at] = input - clearance * (x[at]! / volume);
  },
  capacity: () => Infinity,
  steadyBody: (disposition, period, _doseRate, run) => steadyBody(disposition, period, run),
  hoursToSteady: (disposition, _doseRate, fraction) => -Math.log1p(-fraction) / rateOf(disposition),
  halfLife: (disposition) => Math.LN2 / rateOf(disposition),
  bothReadings: bothReadingsOf,
  distributionEnd: () => 0,
} as const satisfies ModelKind<OneCompartmentDisposition>;
