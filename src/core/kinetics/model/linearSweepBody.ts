import type { SweepBody, SweepState } from "./sweepBody.ts";

/**
 * The amounts in the compartments after a while as multiples of what there was: row by row of the compartments, a column for each
 * compartment, each depot and the constant rate. `slopes` holds the derivatives of all of them, one such table a parameter.
 */
export interface SweepCoefficients<D> {
  /** The depots' rates are those of the sweep's state. */
  disposition(disposition: D): void;
  write(u: number, values: Float64Array, slopes: Float64Array): void;
}

/** Regular dosing meets the same few gaps again and again. */
const GAPS_KEPT = 4;

interface Gap {
  u: number;
  readonly values: Float64Array;
  readonly slopes: Float64Array;
  readonly left: Float64Array;
}

/** A body in which everything is in proportion to the amounts. */
export class LinearSweepBody<D extends { readonly volume: number }> implements SweepBody<D> {
  readonly #state: SweepState;
  readonly #compartments: number;
  readonly #coefficients: SweepCoefficients<D>;
  readonly #columns: number;
  #body: Float64Array;
  #next: Float64Array;
  readonly #gaps: readonly Gap[];
  readonly #values: Float64Array;
  readonly #slopes: Float64Array;
  #oldest = 0;
  #volume = 1;

  constructor(state: SweepState, compartments: number, coefficients: SweepCoefficients<D>) {
    this.#state = state;
    this.#compartments = compartments;
    this.#coefficients = coefficients;
    this.#columns = compartments + state.depots + 1;
    this.#body = new Float64Array(state.rows * compartments);
    this.#next = new Float64Array(state.rows * compartments);
    const size = compartments * this.#columns;
    const slopes = size * (state.rows - 1);
    this.#gaps = Array.from({ length: GAPS_KEPT }, () => ({
      u: Number.NaN,
      values: new Float64Array(size),
      slopes: new Float64Array(slopes),
      left: new Float64Array(state.depots),
    }));
    this.#values = new Float64Array(size);
    this.#slopes = new Float64Array(slopes);
  }

  empty(): void {
    this.#body.fill(0);
  }

  disposition(disposition: D): void {
    this.#volume = disposition.volume;
    this.#coefficients.disposition(disposition);
    for (const gap of this.#gaps) gap.u = Number.NaN;
  }

  add(row: number, mg: number): void {
    const at = row * this.#compartments;
    this.#body[at] = this.#body[at]! + mg;
  }

  level(u: number, out: Float64Array): void {
    const { rows, volumeRow } = this.#state;
    this.#coefficients.write(u, this.#values, this.#slopes);
    this.#amounts(this.#values, this.#slopes, 1, out);
    for (let row = 0; row < rows; row++) out[row] = out[row]! / this.#volume;
    if (volumeRow > 0) out[volumeRow] = out[volumeRow]! - out[0]!;
  }

  advance(u: number): void {
    const { values, slopes, left } = this.#gap(u);
    this.#amounts(values, slopes, this.#compartments, this.#next);
    const before = this.#body;
    this.#body = this.#next;
    this.#next = before;
    this.#state.gutAdvance(u, left);
  }

  #gap(u: number): Gap {
    for (let i = 0; i < GAPS_KEPT; i++) if (this.#gaps[i]!.u === u) return this.#gaps[i]!;
    const gap = this.#gaps[this.#oldest]!;
    this.#oldest = (this.#oldest + 1) % GAPS_KEPT;
    this.#coefficients.write(u, gap.values, gap.slopes);
    for (let i = 0; i < gap.left.length; i++) gap.left[i] = Math.exp(-this.#state.ka[i]! * u);
    gap.u = u;
    return gap;
  }

  /**
   * mg in the first `wanted` compartments, by row: the coefficients on that row's amounts, and in a row of derivatives also their own
   * derivatives on the amounts themselves. One loop without calls: everything a sweep does passes here.
   */
  #amounts(values: Float64Array, slopes: Float64Array, wanted: number, out: Float64Array): void {
    const { gut, depots, rate, rateShare, rows } = this.#state;
    const body = this.#body;
    const compartments = this.#compartments;
    const columns = this.#columns;
    let to = 0;
    for (let row = 0; row < rows; row++) {
      const ofBody = row * compartments;
      const ofGut = row * depots;
      for (let compartment = 0; compartment < wanted; compartment++, to++) {
        let j = compartment * columns;
        let sum = 0;
        for (let c = 0; c < compartments; c++, j++) sum += values[j]! * body[ofBody + c]!;
        for (let i = 0; i < depots; i++, j++) sum += values[j]! * gut[ofGut + i]!;
        if (rate !== 0) sum += values[j]! * (rate * rateShare[row]!);
        if (row > 0) {
          j = (ofBody - compartments + compartment) * columns;
          for (let c = 0; c < compartments; c++, j++) sum += slopes[j]! * body[c]!;
          for (let i = 0; i < depots; i++, j++) sum += slopes[j]! * gut[i]!;
          if (rate !== 0) sum += slopes[j]! * rate;
        }
        out[to] = sum;
      }
    }
  }
}
