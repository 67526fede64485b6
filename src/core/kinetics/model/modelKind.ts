import type { BothReadings } from "../bothReadings.ts";
import type { Absorption } from "./absorption.ts";
import type { KineticsParameter } from "./kineticsParameter.ts";
import type { Inflow, Stretch } from "./stretch.ts";
import type { SweepBody, SweepState } from "./sweepBody.ts";

/** One period of a repeating pattern, run from given amounts in the body. */
export type PeriodRun = (body: Float64Array) => readonly { readonly stretch: Stretch; readonly length: number }[];

/** Everything the rest of the folder needs to know about one kind of disposition. A kind is one object in one file. */
export interface ModelKind<D extends { readonly kind: string }> {
  readonly kind: D["kind"];
  /** Doses add up: the level from two doses is the sum of the levels from each. */
  readonly superposes: boolean;
  readonly compartments: 1 | 2;
  /** What of a disposition differs between patients, named as in the disposition. */
  readonly figures: readonly KineticsParameter[];
  /** Throws a RangeError naming the figure out of range. */
  check(name: string, disposition: D): void;
  /** From given amounts, over at most `length` h. */
  stretch(disposition: D, body: Float64Array, inflow: Inflow, length: number): Stretch;
  /**
   * The kind as plain differential equations, for the cross-check: writes dx/dt of the compartments in mg/h, given x in mg from index
   * `at` on and what flows into the first of them. Written from the definition, not from the closed forms.
   */
  equations(disposition: D, input: number, x: Float64Array, change: Float64Array, at: number): void;
  /** The body of a sweep over many patients: fast, with the derivatives by each parameter, as accurate as a fit needs. */
  sweepBody(state: SweepState): SweepBody<D>;
  /** The most that can be eliminated, mg/h: at this dose rate or above there is no steady state. Infinity where there is no limit. */
  capacity(disposition: D): number;
  /** mg in each compartment at the start of a period at steady state. `doseRate` mg/h, below the capacity. */
  steadyBody(disposition: D, period: number, doseRate: number, run: PeriodRun): Float64Array;
  /** h until elimination alone has come the given part of the way to steady state. */
  hoursToSteady(disposition: D, doseRate: number, fraction: number): number;
  /** Terminal, h; null where there is no one half-life. */
  halfLife(disposition: D): number | null;
  bothReadings(disposition: D, absorption: Absorption, bioavailability: number, lag: number): BothReadings | null;
  /** h after the start of absorption until the distribution phase is over. */
  distributionEnd(disposition: D, absorption: Absorption): number;
}
