import type { KineticsParameter } from "./kineticsParameter.ts";

/**
 * What a sweep carries from event to event, besides the body: the depots and the constant input, each with its derivatives by the
 * logarithm of every parameter. Row 0 is the amount itself, row q + 1 its derivative by `names[q]`. Amounts mg, times h.
 */
export class SweepState {
  readonly names: readonly KineticsParameter[];
  /** 1 + the number of names. */
  readonly rows: number;
  /** Number of first-order depots. */
  readonly depots: number;
  /** Whether there are inputs at a constant rate at all. */
  readonly hasRate: boolean;
  /** Row of ka; 0 when it is not among the names. */
  readonly kaRow: number;
  /** Row of the bioavailability; 0 when it is not among the names. */
  readonly bioavailabilityRow: number;
  /** Row of the volume; 0 when it is not among the names. */
  readonly volumeRow: number;
  /** 1/h, by depot. */
  readonly ka: Float64Array;
  /** mg, `gut[row * depots + depot]`. */
  readonly gut: Float64Array;
  /** mg/h. */
  rate = 0;
  /** The derivative of the rate in each row as a part of the rate: it is in proportion to ka and to the bioavailability. */
  readonly rateShare: Float64Array;

  constructor(names: readonly KineticsParameter[], depots: number, hasRate: boolean) {
    const rowOf = (name: KineticsParameter) => names.indexOf(name) + 1;
    this.names = names;
    this.rows = names.length + 1;
    this.depots = depots;
    this.hasRate = hasRate;
    this.kaRow = rowOf("ka");
    this.bioavailabilityRow = rowOf("bioavailability");
    this.volumeRow = rowOf("volume");
    this.ka = new Float64Array(depots);
    this.gut = new Float64Array(this.rows * depots);
    this.rateShare = new Float64Array(this.rows);
    this.rateShare[0] = 1;
    if (this.kaRow > 0) this.rateShare[this.kaRow] = 1;
    if (this.bioavailabilityRow > 0) this.rateShare[this.bioavailabilityRow] = 1;
  }

  empty(): void {
    this.gut.fill(0);
    this.rate = 0;
  }

  /** mg into a depot. */
  give(depot: number, mg: number): void {
    this.gut[depot] = this.gut[depot]! + mg;
    if (this.bioavailabilityRow === 0) return;
    const at = this.bioavailabilityRow * this.depots + depot;
    this.gut[at] = this.gut[at]! + mg;
  }

  /** Goes on over u h, by depot of which `left` is left. */
  gutAdvance(u: number, left: Float64Array): void {
    const { gut, depots, kaRow } = this;
    if (kaRow > 0) {
      for (let i = 0; i < depots; i++) {
        const at = kaRow * depots + i;
        gut[at] = gut[at]! - this.ka[i]! * u * gut[i]!;
      }
    }
    let at = 0;
    for (let row = 0; row < this.rows; row++) for (let i = 0; i < depots; i++, at++) gut[at] = gut[at]! * left[i]!;
  }
}

/** The body in a sweep: what a kind of disposition does with what its SweepState brings. */
export interface SweepBody<D> {
  /** Empties it. */
  empty(): void;
  /** The disposition in force from now on, and the depots' rates, both already those of the patient. */
  disposition(disposition: D): void;
  /** Writes the level u h on, mg/L, and its derivatives, one a row. Since the last move u only ascends. */
  level(u: number, out: Float64Array): void;
  /** Goes on by u h, depots included. */
  advance(u: number): void;
  /** mg into the central amount of one row. */
  add(row: number, mg: number): void;
}
