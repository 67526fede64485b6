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
  /** How many columns the last step took: its error is of order 2·columns − 1. */
  columns: number = SUBSTEPS.length;
  /** Whether it took fewer than there are. */
  get isEarly(): boolean {
    return this.columns <= LAST;
  }
  readonly #state: SweepState;
  /** The depots' content by point and row. */
  readonly #waiting: Float64Array;
  readonly #ends = new Float64Array(SUBSTEPS.length);
  readonly #powers = new Float64Array(PARTS + 1);
  /** By depot: mg at the start of the step, and what a 24th of it leaves of them. */
  readonly #now: Float64Array;
  readonly #part: Float64Array;
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
    this.#now = new Float64Array(state.depots);
    this.#part = new Float64Array(state.depots);
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
    this.columns = SUBSTEPS.length;
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

  /**
   * The same without derivatives, in plain numbers: bands are made of this. It ends with the first column whose difference to the order
   * below is within what is allowed: most steps are cut short by the times asked for.
   */
  takeAlone(total: number, from: number, h: number, allowed: number): number {
    const { rate } = this.#state;
    const waiting = this.#waiting;
    const vmax = this.#vmax;
    const half = this.#half;
    const ends = this.#ends;
    const scale = total + rate * h;
    const isWaiting = this.#waitingStart(total, from, h);
    const body = Math.max(0, total - waiting[0]!);
    const start = rate - (vmax * body) / (half + body);
    let error = 0;
    for (let j = 0; j <= LAST; j++) {
      const count = SUBSTEPS[j]!;
      const part = h / count;
      const points = PARTS / count;
      if (isWaiting) this.#waitingAdd(j);
      let before = total;
      let at = total + part * start;
      for (let m = 1, point = points; m < count; m++, point += points) {
        const now = Math.max(0, at - waiting[point]!);
        const next = before + 2 * part * (rate - (vmax * now) / (half + now));
        before = at;
        at = next;
      }
      // The next row of the extrapolation, over the one before it.
      for (let k = 1; k <= j; k++) {
        const ratio = count / SUBSTEPS[j - k]!;
        const change = (at - ends[k - 1]!) / (ratio * ratio - 1);
        ends[k - 1] = at;
        at += change;
        error = Math.abs(change) / scale;
      }
      ends[j] = at;
      this.columns = j + 1;
      if (j > 0 && error <= allowed) break;
    }
    this.result[0] = ends[this.columns - 1]!;
    return error;
  }

  /** The depots' content at the points of the columns to come: their share at the start, and how much a 24th of the step leaves. */
  #waitingStart(total: number, from: number, h: number): boolean {
    const { ka, gut, depots } = this.#state;
    const waiting = this.#waiting;
    waiting.fill(0);
    let isWaiting = false;
    for (let i = 0; i < depots; i++) {
      const now = gut[i]! * Math.exp(-ka[i]! * from);
      this.#now[i] = now > EMPTY_BELOW * total ? now : 0;
      if (this.#now[i] === 0) continue;
      isWaiting = true;
      this.#part[i] = Math.exp((-ka[i]! * h) / PARTS);
      waiting[0] = waiting[0]! + now;
    }
    return isWaiting;
  }

  /** Adds the points that this column is the first to look at. */
  #waitingAdd(column: number): void {
    const waiting = this.#waiting;
    for (let i = 0; i < this.#now.length; i++) {
      const now = this.#now[i]!;
      if (now === 0) continue;
      const x = this.#part[i]!;
      const x3 = x * x * x;
      const x6 = x3 * x3;
      const x12 = x6 * x6;
      if (column === 0) waiting[12] = waiting[12]! + now * x12;
      else if (column === 1) {
        waiting[6] = waiting[6]! + now * x6;
        waiting[18] = waiting[18]! + now * x12 * x6;
      } else if (column === 2) {
        const x4 = x3 * x;
        waiting[4] = waiting[4]! + now * x4;
        waiting[8] = waiting[8]! + now * x4 * x4;
        waiting[16] = waiting[16]! + now * x12 * x4;
        waiting[20] = waiting[20]! + now * x12 * x4 * x4;
      } else {
        waiting[3] = waiting[3]! + now * x3;
        waiting[9] = waiting[9]! + now * x6 * x3;
        waiting[15] = waiting[15]! + now * x12 * x3;
        waiting[21] = waiting[21]! + now * x12 * x6 * x3;
      }
    }
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
