import type { SweepState } from "./sweepBody.ts";

/** Sub-steps of the columns; their points are multiples of 1/24 of the step. */
const SUBSTEPS = [2, 4, 6, 8] as const;
const PARTS = 24;
const LAST = SUBSTEPS.length - 1;
/** A depot with less than this part of everything is taken for empty within a step. */
const EMPTY_BELOW = 1e-17;

/**
 * One step of a body whose elimination saturates, with the derivatives by every parameter.
 *
 * Formula: the total A of gut and body, A′ = rate − vmax·b/(half + b), b = A − gut, the gut known exactly: A changes no faster than
 * elimination, however fast the absorption. Each derivative obeys the same equation derived by its parameter. The explicit midpoint
 * rule with 2, 4, 6 and 8 sub-steps, extrapolated in the square of the sub-step (order 8); error: the difference to order 6.
 * Source: extrapolation of the midpoint rule (Gragg 1965; Bulirsch & Stoer 1966; from memory, unverified), order checked in
 * tests/core/kinetics/model/modelSensitivity.test.ts by the levels themselves.
 */
export class SaturableStep {
  /** mg in the body by row, at the last event. */
  readonly body: Float64Array;
  /** The total by row after the last step taken. */
  readonly result: Float64Array;
  readonly #state: SweepState;
  /** The depots' content by point and row. */
  readonly #waiting: Float64Array;
  readonly #ends = new Float64Array(SUBSTEPS.length);
  readonly #powers = new Float64Array(PARTS + 1);
  readonly #columns: readonly Float64Array[];
  readonly #start: Float64Array;
  readonly #slope: Float64Array;
  #before: Float64Array;
  #at: Float64Array;
  /** Derivative of the elimination by each row's parameter as a multiple of itself, and of b·(its slope by b). */
  readonly #ofElimination: Float64Array;
  readonly #ofSlope: Float64Array;
  #vmax = 1;
  #half = 1;

  constructor(state: SweepState) {
    const { rows } = state;
    const zeros = () => new Float64Array(rows);
    this.#state = state;
    this.body = zeros();
    this.result = zeros();
    this.#waiting = new Float64Array(rows * (PARTS + 1));
    this.#columns = SUBSTEPS.map(zeros);
    this.#start = zeros();
    this.#slope = zeros();
    this.#before = zeros();
    this.#at = zeros();
    this.#ofElimination = Float64Array.from({ length: rows }, (_, row) => (state.names[row - 1] === "vmax" ? 1 : 0));
    this.#ofSlope = Float64Array.from({ length: rows }, (_, row) => {
      const name = state.names[row - 1];
      return name === "km" || name === "volume" ? 1 : 0;
    });
  }

  saturation(vmax: number, half: number): void {
    this.#vmax = vmax;
    this.#half = half;
  }

  /** A step of h from `total`, `from` h after the last event, into `result`; gives the error as a part of everything there is. */
  take(total: Float64Array, from: number, h: number): number {
    const { rows } = this.#state;
    this.#waitingSet(total[0]!, from, h);
    if (rows === 1) return this.#takeAlone(total[0]!, h);
    this.#slopeAt(total, 0, this.#start);
    for (let j = 0; j <= LAST; j++) this.#midpoint(total, SUBSTEPS[j]!, h, this.#columns[j]!);
    const scale = total[0]! + this.#state.rate * h;
    let worst = 0;
    for (let row = 0; row < rows; row++) {
      let error = 0;
      for (let k = 1; k <= LAST; k++) {
        for (let j = LAST; j >= k; j--) {
          const column = this.#columns[j]!;
          const ratio = SUBSTEPS[j]! / SUBSTEPS[j - k]!;
          const change = (column[row]! - this.#columns[j - 1]![row]!) / (ratio * ratio - 1);
          column[row] = column[row]! + change;
          if (k === LAST) error = Math.abs(change);
        }
      }
      this.result[row] = this.#columns[LAST]![row]!;
      if (!(error <= worst)) worst = error;
    }
    return worst / scale;
  }

  /** The same without derivatives, in plain numbers: bands are made of this. */
  #takeAlone(total: number, h: number): number {
    const { rate } = this.#state;
    const waiting = this.#waiting;
    const vmax = this.#vmax;
    const half = this.#half;
    const ends = this.#ends;
    const body = Math.max(0, total - waiting[0]!);
    const start = rate - (vmax * body) / (half + body);
    for (let j = 0; j <= LAST; j++) {
      const count = SUBSTEPS[j]!;
      const part = h / count;
      const points = PARTS / count;
      let before = total;
      let at = total + part * start;
      for (let m = 1, point = points; m < count; m++, point += points) {
        const now = Math.max(0, at - waiting[point]!);
        const next = before + 2 * part * (rate - (vmax * now) / (half + now));
        before = at;
        at = next;
      }
      ends[j] = at;
    }
    let error = 0;
    for (let k = 1; k <= LAST; k++) {
      for (let j = LAST; j >= k; j--) {
        const ratio = SUBSTEPS[j]! / SUBSTEPS[j - k]!;
        const change = (ends[j]! - ends[j - 1]!) / (ratio * ratio - 1);
        ends[j] = ends[j]! + change;
        if (j === LAST) error = Math.abs(change);
      }
    }
    this.result[0] = ends[LAST]!;
    return error / (total + rate * h);
  }

  #midpoint(total: Float64Array, count: number, h: number, column: Float64Array): void {
    const { rows } = this.#state;
    const part = h / count;
    const points = PARTS / count;
    let before = this.#before;
    let at = this.#at;
    for (let row = 0; row < rows; row++) {
      before[row] = total[row]!;
      at[row] = total[row]! + part * this.#start[row]!;
    }
    for (let m = 1; m < count; m++) {
      this.#slopeAt(at, m * points, this.#slope);
      for (let row = 0; row < rows; row++) before[row] = before[row]! + 2 * part * this.#slope[row]!;
      const swap = before;
      before = at;
      at = swap;
    }
    this.#before = before;
    this.#at = at;
    column.set(at);
  }

  /** A′ and its derivatives at a point of the step. */
  #slopeAt(total: Float64Array, point: number, slope: Float64Array): void {
    const { rows, rate, rateShare } = this.#state;
    const waiting = this.#waiting;
    const vmax = this.#vmax;
    const half = this.#half;
    const first = point * rows;
    const body = Math.max(0, total[0]! - waiting[first]!);
    const free = 1 / (half + body);
    const eliminated = vmax * body * free;
    slope[0] = rate - eliminated;
    if (rows === 1) return;
    const steepness = vmax * half * free * free;
    for (let row = 1; row < rows; row++) {
      slope[row] =
        rate * rateShare[row]! -
        steepness * (total[row]! - waiting[first + row]! - this.#ofSlope[row]! * body) -
        this.#ofElimination[row]! * eliminated;
    }
  }

  #waitingSet(total: number, from: number, h: number): void {
    const { ka, gut, depots, rows, kaRow } = this.#state;
    const waiting = this.#waiting;
    waiting.fill(0);
    for (let i = 0; i < depots; i++) {
      const k = ka[i]!;
      const now = gut[i]! * Math.exp(-k * from);
      if (!(now > EMPTY_BELOW * total)) continue;
      const left = now / gut[i]!;
      this.#powersSet(Math.exp((-k * h) / PARTS));
      for (const point of POINTS) {
        const decay = left * this.#powers[point]!;
        for (let row = 0; row < rows; row++) {
          waiting[point * rows + row] = waiting[point * rows + row]! + gut[row * depots + i]! * decay;
        }
        if (kaRow > 0) {
          const at = point * rows + kaRow;
          waiting[at] = waiting[at]! - k * (from + (h * point) / PARTS) * gut[i]! * decay;
        }
      }
    }
  }

  /** The powers of x that the points need. */
  #powersSet(x: number): void {
    const p = this.#powers;
    const x2 = x * x;
    const x3 = x2 * x;
    const x4 = x2 * x2;
    const x6 = x3 * x3;
    const x8 = x4 * x4;
    const x9 = x8 * x;
    const x12 = x6 * x6;
    const x16 = x8 * x8;
    const x18 = x9 * x9;
    p[0] = 1;
    p[3] = x3;
    p[4] = x4;
    p[6] = x6;
    p[8] = x8;
    p[9] = x9;
    p[12] = x12;
    p[15] = x12 * x3;
    p[16] = x16;
    p[18] = x18;
    p[20] = x16 * x4;
    p[21] = x18 * x3;
  }
}

/** Where the sub-steps look, in parts of the step. */
const POINTS = [0, 3, 4, 6, 8, 9, 12, 15, 16, 18, 20, 21] as const;
