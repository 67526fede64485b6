import { argumentRefuse } from "../argumentCheck.ts";
import { SaturableStep } from "./saturableStep.ts";
import type { SweepBody, SweepState } from "./sweepBody.ts";

/** Error allowed in one step, as a part of everything in gut and body: with derivatives, which are differenced again, and without. */
const ALLOWED = 1e-9;
const ALLOWED_ALONE = 2e-7;
/** Step control, as usual: the error of n columns goes with the power 2n − 1 of the step. */
const SAFETY = 0.85;
const LEAST_CHANGE = 0.2;
const MOST_CHANGE = 3;
const EARLY_CHANGE = 2;
const MOST_STEPS = 5_000;

/** A body whose elimination saturates, carried by steps with error control from one event or level to the next. */
export class SaturableSweepBody
  implements SweepBody<{ readonly vmax: number; readonly km: number; readonly volume: number }>
{
  readonly #state: SweepState;
  readonly #step: SaturableStep;
  readonly #allowed: number;
  /** mg in gut and body together, by row, at the cursor. */
  readonly #total: Float64Array;
  readonly #waiting: Float64Array;
  readonly #left: Float64Array;
  /** h since the last event at which the cursor stands. */
  #cursor = 0;
  /** Next step, and the first one after the last event. */
  #h = Number.NaN;
  #firstH = Number.NaN;
  #isFirst = true;
  #volume = 1;
  #linearRate = 1;

  constructor(state: SweepState) {
    this.#state = state;
    this.#step = new SaturableStep(state);
    this.#allowed = state.rows === 1 ? ALLOWED_ALONE : ALLOWED;
    this.#total = new Float64Array(state.rows);
    this.#waiting = new Float64Array(state.rows);
    this.#left = new Float64Array(state.depots);
  }

  empty(): void {
    this.#step.body.fill(0);
    this.#cursor = 0;
    this.#isFirst = true;
    this.#firstH = Number.NaN;
  }

  disposition({ vmax, km, volume }: { readonly vmax: number; readonly km: number; readonly volume: number }): void {
    this.#volume = volume;
    this.#linearRate = vmax / (km * volume);
    this.#step.saturation(vmax, km * volume);
  }

  add(row: number, mg: number): void {
    const { body } = this.#step;
    body[row] = body[row]! + mg;
  }

  level(u: number, out: Float64Array): void {
    const { rows, volumeRow } = this.#state;
    this.#goTo(u);
    this.#waitingAt(u);
    for (let row = 0; row < rows; row++) out[row] = (this.#total[row]! - this.#waiting[row]!) / this.#volume;
    // What rounding leaves below 0 is seen only where all but nothing is there.
    out[0] = Math.max(0, out[0]!);
    if (volumeRow > 0) out[volumeRow] = out[volumeRow]! - out[0]!;
  }

  advance(u: number): void {
    this.#goTo(u);
    this.#waitingAt(u);
    const { body } = this.#step;
    for (let row = 0; row < body.length; row++) body[row] = this.#total[row]! - this.#waiting[row]!;
    body[0] = Math.max(0, body[0]!);
    for (let i = 0; i < this.#left.length; i++) this.#left[i] = Math.exp(-this.#state.ka[i]! * u);
    this.#state.gutAdvance(u, this.#left);
    this.#cursor = 0;
    this.#isFirst = true;
  }

  /** mg in the depots u h after the last event, by row. */
  #waitingAt(u: number): void {
    const { ka, gut, depots, rows, kaRow } = this.#state;
    const waiting = this.#waiting;
    waiting.fill(0);
    for (let i = 0; i < depots; i++) {
      const left = Math.exp(-ka[i]! * u);
      for (let row = 0; row < rows; row++) waiting[row] = waiting[row]! + gut[row * depots + i]! * left;
      if (kaRow > 0) waiting[kaRow] = waiting[kaRow]! - ka[i]! * u * gut[i]! * left;
    }
  }

  #goTo(u: number): void {
    const total = this.#total;
    const step = this.#step;
    const isAlone = total.length === 1;
    if (this.#isFirst) {
      const { body } = this.#step;
      this.#waitingAt(0);
      for (let row = 0; row < body.length; row++) total[row] = body[row]! + this.#waiting[row]!;
      this.#h = Number.isNaN(this.#firstH) ? 1 / Math.max(this.#linearRate, ...this.#state.ka) : this.#firstH;
    }
    let steps = 0;
    while (this.#cursor < u) {
      const remaining = u - this.#cursor;
      if (total[0] === 0 && this.#state.rate === 0) {
        this.#cursor = u;
        return;
      }
      if (++steps > MOST_STEPS || !(this.#h > 0)) {
        argumentRefuse("vmax / (km × volume)", this.#linearRate, "/h", `a rate that ${u} h can be followed at`);
      }
      const h = Math.min(this.#h, remaining);
      const found = isAlone
        ? step.takeAlone(total[0]!, this.#cursor, h, this.#allowed)
        : step.take(total, this.#cursor, h);
      const error = found / this.#allowed;
      if (error <= 1 && MOST_CHANGE * h <= this.#h && !this.#isFirst) {
        // Cut short by far: nothing about the next step is learnt.
        total.set(step.result);
        this.#cursor = h === remaining ? u : this.#cursor + h;
        continue;
      }
      let factor = error > 0 ? SAFETY * error ** (-1 / (2 * step.columns - 1)) : MOST_CHANGE;
      // Fewer columns than there are were enough: the next may be longer.
      if (step.isEarly) factor = Math.max(factor, EARLY_CHANGE);
      if (!(error <= 1)) {
        this.#h = h * (factor > LEAST_CHANGE ? Math.min(SAFETY, factor) : LEAST_CHANGE);
        continue;
      }
      total.set(step.result);
      this.#cursor = h === remaining ? u : this.#cursor + h;
      const next = h * Math.min(MOST_CHANGE, Math.max(LEAST_CHANGE, factor));
      if (this.#isFirst) {
        this.#firstH = h < this.#h ? Math.max(this.#h, next) : next;
        this.#isFirst = false;
      }
      // A step cut short says nothing against the longer one.
      this.#h = h < this.#h ? Math.max(this.#h, next) : next;
    }
  }
}
