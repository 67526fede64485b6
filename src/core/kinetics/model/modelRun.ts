import { CompensatedSum } from "../../numerics/index.ts";
import { decayCarried } from "./linearResponse.ts";
import type { ModelChange, ModelEvent, ModelPart } from "./modelEvents.ts";
import type { ModelDisposition } from "./modelHistory.ts";
import type { ModelKind } from "./modelKind.ts";
import type { Inflow, Stretch } from "./stretch.ts";

/** A stretch on its way past: what the body does in it, from which instant, to which. */
export interface RunStretch {
  readonly stretch: Stretch;
  readonly inflow: Inflow;
  /** h, each instant as an unrounded pair. */
  readonly at: number;
  readonly rest: number;
  readonly nextAt: number;
  readonly nextRest: number;
  /** h between the two instants, 0 or more. */
  readonly length: number;
}

/** Sees each stretch in turn, the run still at its start. */
export type RunVisit = (seen: RunStretch, run: ModelRun) => void;

/** h, as an unrounded pair. */
export interface Instant {
  readonly at: number;
  readonly rest: number;
}

/** Carries the exact state of gut and body from event to event. Amounts mg, times h. */
export class ModelRun {
  /** mg not yet absorbed, by part. */
  readonly gut: Float64Array;
  readonly #kind: ModelKind<ModelDisposition>;
  readonly #parts: readonly ModelPart[];
  /** Of zero-order inputs, by part: how many run, and their rates together. */
  readonly #running: Float64Array;
  readonly #rates: CompensatedSum[];
  readonly #eliminated = new CompensatedSum();
  readonly #isBalanced: boolean;
  readonly #events: readonly ModelEvent[];
  readonly #dispositions: readonly ModelDisposition[];
  #next = 0;
  #disposition: ModelDisposition;
  #body: Float64Array;

  /** `isBalanced`: keep account of what is eliminated, which costs an area a stretch. */
  constructor(
    kind: ModelKind<ModelDisposition>,
    parts: readonly ModelPart[],
    dispositions: readonly ModelDisposition[],
    events: readonly ModelEvent[],
    isBalanced = false,
  ) {
    this.#kind = kind;
    this.#parts = parts;
    this.#dispositions = dispositions;
    this.#disposition = dispositions[0]!;
    this.#events = events;
    this.#isBalanced = isBalanced;
    this.#body = new Float64Array(kind.compartments);
    this.gut = new Float64Array(parts.length);
    this.#running = new Float64Array(parts.length);
    this.#rates = parts.map(() => new CompensatedSum());
  }

  /** mg eliminated before the present stretch. */
  get eliminated(): number {
    return this.#eliminated.value;
  }

  /** mg that zero-order inputs have yet to bring, of those running now. */
  get zeroOrderLeft(): number {
    let amount = 0;
    for (const [i, { release }] of this.#parts.entries()) if (release.kind === "zero-order") amount += this.gut[i]!;
    return amount;
  }

  /** mg/L, just before whatever happens now. */
  get level(): number {
    return this.#kind.stretch(this.#disposition, this.#body, this.#inflow(), 0).levelAt(0);
  }

  /** Puts given amounts in place of the present ones. */
  bodySet(body: Float64Array): void {
    this.#body = body;
  }

  /** `count` zero-order inputs of mg/h run from before the start. */
  startBefore(part: number, rate: number, count: number): void {
    if (count === 0) return;
    this.#running[part] = this.#running[part]! + count;
    this.#rates[part]!.add(rate * count);
  }

  /** Goes on from one instant to another through the events between, showing every stretch on the way. */
  go(start: Instant, end: Instant, visit?: RunVisit): void {
    let { at, rest } = start;
    for (;;) {
      const event = this.#events[this.#next];
      const isEnd = event === undefined || event.at - end.at + (event.rest - end.rest) >= 0;
      const { at: nextAt, rest: nextRest } = isEnd ? end : event;
      const length = nextAt - at + (nextRest - rest);
      if (length > 0) {
        const inflow = this.#inflow();
        const stretch = this.#kind.stretch(this.#disposition, this.#body, inflow, length);
        visit?.({ stretch, inflow, at, rest, nextAt, nextRest, length }, this);
        this.#advance(stretch, length);
      }
      if (isEnd) return;
      this.#apply(event.change);
      this.#next++;
      at = nextAt;
      rest = nextRest;
    }
  }

  #inflow(): Inflow {
    const ka: number[] = [];
    const gut: number[] = [];
    let rate = 0;
    for (const [i, { release }] of this.#parts.entries()) {
      if (release.kind === "zero-order") rate += this.#rateOf(i);
      else if (this.gut[i]! > 0) {
        ka.push(release.ka);
        gut.push(this.gut[i]!);
      }
    }
    return { ka, gut, rate };
  }

  #rateOf(part: number): number {
    return this.#running[part] === 0 ? 0 : this.#rates[part]!.value;
  }

  #advance(stretch: Stretch, length: number): void {
    if (this.#isBalanced) this.#eliminated.add(stretch.eliminatedTo(length));
    this.#body = stretch.bodyAt(length);
    for (const [i, { release }] of this.#parts.entries()) {
      const amount = this.gut[i]!;
      this.gut[i] =
        release.kind === "first-order"
          ? decayCarried(release.ka, amount, length)
          : Math.max(0, amount - this.#rateOf(i) * length);
    }
  }

  #apply(change: ModelChange): void {
    if (change.kind === "disposition") {
      this.#disposition = this.#dispositions[change.span]!;
      return;
    }
    const { part } = change;
    if (change.kind === "give") {
      this.gut[part] = this.gut[part]! + change.amount;
      return;
    }
    const isStart = change.kind === "start";
    const running = this.#running[part]! + (isStart ? 1 : -1);
    this.#running[part] = running;
    this.#rates[part]!.add(isStart ? change.rate : -change.rate);
    if (isStart) {
      const { release } = this.#parts[part]!;
      this.gut[part] = this.gut[part]! + change.rate * (release.kind === "zero-order" ? release.duration : 0);
    } else if (running === 0) {
      this.gut[part] = 0;
      this.#rates[part] = new CompensatedSum();
    }
  }
}
