import { DormandPrince } from "../../numerics/index.ts";
import { type CrossCheckScript, crossCheckScriptOf } from "./crossCheckScript.ts";
import { type ModelDisposition, type ModelHistory, modelHistoryCheck } from "./modelHistory.ts";
import type { ModelKind } from "./modelKind.ts";

/** Error allowed in one step: of each amount, and of everything given so far. */
const RELATIVE = 1e-9;
const OF_ALL_GIVEN = 1e-12;
/** No step is longer than this part of the time between two events. */
const LONGEST_STEP = 1 / 16;
/**
 * A depot with less than this part of everything given is emptied at once: its fast rate then no longer holds up the steps. Above the
 * error allowed, under which a depot never sinks.
 */
const EMPTY_BELOW = 1e-11;
const MOST_STEPS = 1_000_000;
/** Step control, as usual for a method of this order. */
const SAFETY = 0.9;
const LEAST_CHANGE = 0.2;
const MOST_CHANGE = 2;
/**
 * The first step after an event moves the amounts by about this part of everything given. The error estimate of a step that is far
 * too long can be small by accident, so steps grow from below.
 */
const FIRST_MOVE = 1e-3;

/** A step on its way past: times h, from `at` over `h`; levels mg/L, slopes mg/L per h. */
export interface CrossCheckStep {
  readonly at: number;
  readonly h: number;
  readonly startLevel: number;
  readonly endLevel: number;
  readonly startSlope: number;
  readonly endSlope: number;
  /** u h into the step; each call is a step of its own from the start of this one. */
  levelAt(u: number): number;
  slopeAt(u: number): number;
}

/**
 * Plain numerical integration of a history: gut, body and area under the level as one system of differential equations, restarted
 * at every event. Nothing in it is shared with the closed forms but the arguments and the description of the model.
 */
export class CrossCheckRun {
  readonly #script: CrossCheckScript;
  readonly #kind: ModelKind<ModelDisposition>;
  readonly #solver: DormandPrince;
  readonly #trial: DormandPrince;
  readonly #ka: Float64Array;
  readonly #change: Float64Array;
  /** mg by depot, mg by compartment, mg·h/L. */
  readonly #y: Float64Array;
  /** Index of the first compartment, and of the area. */
  readonly #body: number;
  readonly #area: number;
  #disposition: ModelDisposition;
  #mgPerH = 0;
  #given = 0;
  #time: number;
  #nextBreak = 0;
  #h = Number.POSITIVE_INFINITY;
  #steps = 0;

  constructor(history: ModelHistory) {
    this.#kind = modelHistoryCheck(history);
    this.#script = crossCheckScriptOf(history);
    this.#body = this.#script.depots.length;
    this.#area = this.#body + this.#kind.compartments;
    const size = this.#area + 1;
    this.#y = new Float64Array(size);
    this.#change = new Float64Array(size);
    this.#ka = Float64Array.from(this.#script.depots, ({ ka }) => ka);
    const derivative = (y: Float64Array, change: Float64Array) => this.#derivative(y, change);
    this.#solver = new DormandPrince(size, derivative);
    this.#trial = new DormandPrince(size, derivative);
    this.#time = this.#script.breaks[0] ?? Number.NEGATIVE_INFINITY;
    this.#disposition = this.#script.dispositionAt(this.#time);
  }

  /** mg/L just before whatever happens now. */
  get level(): number {
    return this.#y[this.#body]! / this.#disposition.volume;
  }

  /** mg·h/L since `areaReset`. */
  get area(): number {
    return this.#y[this.#area]!;
  }

  areaReset(): void {
    this.#y[this.#area] = 0;
  }

  /** Goes on to the instant `to`, h, through all that happens before it. Before the first event there is nothing. */
  goTo(to: number, seen?: (step: CrossCheckStep) => void): void {
    const { breaks } = this.#script;
    for (;;) {
      const next = breaks[this.#nextBreak];
      if (next === undefined || next >= to) break;
      this.#integrate(next, seen);
      this.#happen(next);
      this.#nextBreak++;
    }
    if (this.#nextBreak > 0) this.#integrate(to, seen);
  }

  /** What happens at a break: doses into their depots, inputs that begin or end, another disposition. */
  #happen(time: number): void {
    const { depots, windows } = this.#script;
    for (const [i, { gives }] of depots.entries()) {
      for (const { at, mg } of gives) {
        if (at !== time) continue;
        this.#y[i] = this.#y[i]! + mg;
        this.#given += mg;
      }
    }
    this.#mgPerH = 0;
    for (const { from, to, mgPerH } of windows) {
      if (from <= time && time < to) this.#mgPerH += mgPerH;
      if (from === time) this.#given += mgPerH * (to - from);
    }
    this.#disposition = this.#script.dispositionAt(time);
    this.#h = this.#firstStep();
  }

  #firstStep(): number {
    this.#derivative(this.#y, this.#change);
    let speed = 0;
    for (let i = 0; i < this.#area; i++) speed = Math.max(speed, Math.abs(this.#change[i]!));
    return speed > 0 ? (FIRST_MOVE * this.#given) / speed : Number.POSITIVE_INFINITY;
  }

  #derivative(y: Float64Array, change: Float64Array): void {
    let input = this.#mgPerH;
    for (let i = 0; i < this.#body; i++) {
      const absorbed = this.#ka[i]! * y[i]!;
      change[i] = -absorbed;
      input += absorbed;
    }
    this.#kind.equations(this.#disposition, input, y, change, this.#body);
    change[this.#area] = y[this.#body]! / this.#disposition.volume;
  }

  #integrate(to: number, seen?: (step: CrossCheckStep) => void): void {
    if (this.#given === 0) {
      this.#time = to;
      return;
    }
    const longest = seen === undefined ? Number.POSITIVE_INFINITY : (to - this.#time) * LONGEST_STEP;
    while (this.#time < to) {
      this.#steps++;
      if (this.#steps > MOST_STEPS) throw new Error(`crossCheck: not done after ${MOST_STEPS} steps`);
      const remaining = to - this.#time;
      const h = Math.min(this.#h, longest, remaining);
      this.#solver.step(this.#y, h);
      const error = this.#errorOfStep();
      const factor = error > 0 ? SAFETY * error ** -0.2 : MOST_CHANGE;
      if (!(error <= 1)) {
        this.#h = h * Math.max(LEAST_CHANGE, Math.min(SAFETY, Number.isFinite(factor) ? factor : LEAST_CHANGE));
        continue;
      }
      if (seen !== undefined) this.#show(h, seen);
      this.#y.set(this.#solver.result);
      this.#time = h === remaining ? to : this.#time + h;
      // A step cut short by `to` says nothing against the longer one.
      const next = h * Math.min(MOST_CHANGE, Math.max(LEAST_CHANGE, factor));
      this.#h = h < this.#h ? Math.max(this.#h, next) : next;
      this.#empty();
    }
  }

  /** The largest error of the step as a part of what is allowed. */
  #errorOfStep(): number {
    const { result, error } = this.#solver;
    const floor = OF_ALL_GIVEN * this.#given;
    let worst = 0;
    for (let i = 0; i < this.#area; i++) {
      const part = Math.abs(error[i]!) / (RELATIVE * Math.abs(result[i]!) + floor);
      if (!(part <= worst)) worst = part;
    }
    return worst;
  }

  /** Empties depots that hold next to nothing. */
  #empty(): void {
    for (let i = 0; i < this.#body; i++) {
      if (Math.abs(this.#y[i]!) > EMPTY_BELOW * this.#given) continue;
      this.#y[this.#body] = this.#y[this.#body]! + this.#y[i]!;
      this.#y[i] = 0;
    }
  }

  #show(h: number, seen: (step: CrossCheckStep) => void): void {
    const { volume } = this.#disposition;
    const body = this.#body;
    const trial = this.#trial;
    const { result, startChange, endChange } = this.#solver;
    seen({
      at: this.#time,
      h,
      startLevel: this.#y[body]! / volume,
      endLevel: result[body]! / volume,
      startSlope: startChange[body]! / volume,
      endSlope: endChange[body]! / volume,
      levelAt: (u) => {
        trial.step(this.#y, u);
        return trial.result[body]! / volume;
      },
      slopeAt: (u) => {
        trial.step(this.#y, u);
        return trial.endChange[body]! / volume;
      },
    });
  }
}
