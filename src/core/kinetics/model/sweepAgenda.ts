import type { ModelPart } from "./modelEvents.ts";
import type { DispositionSpan } from "./modelHistory.ts";

export type SweepEventKind = "give" | "start" | "stop" | "disposition";

interface SweepEvent {
  readonly time: number;
  readonly kind: SweepEventKind;
  /** Of the part, or of the span. */
  readonly index: number;
  /** mg that reach the circulation. */
  readonly amount: number;
}

/**
 * What happens in a history, in order, walked through again and again. Only the ends of zero-order inputs differ from patient to
 * patient: within a part they come in the order of its starts, so each part has its queue and nothing is sorted twice.
 */
export class SweepAgenda {
  /** The present event: h (Infinity after the last), and what it is. */
  time = Number.POSITIVE_INFINITY;
  kind: SweepEventKind = "give";
  index = 0;
  amount = 0;
  /** h, of the zero-order input that starts or stops. */
  duration = 1;
  readonly #events: readonly SweepEvent[];
  /** Starts of each zero-order part, and how long each takes in the typical patient. */
  readonly #queues: readonly {
    readonly part: number;
    readonly typical: number;
    readonly starts: readonly SweepEvent[];
  }[];
  readonly #stopped: Int32Array;
  #next = 0;
  #faster = 1;
  #running = 0;

  constructor(parts: readonly ModelPart[], spans: readonly DispositionSpan[]) {
    const events: SweepEvent[] = [];
    for (const [index, { release, share, lag, doses }] of parts.entries()) {
      const kind = release.kind === "first-order" ? "give" : "start";
      for (const { time, amount } of doses) {
        if (amount > 0) events.push({ time: time + lag, kind, index, amount: share * amount });
      }
    }
    for (let index = 1; index < spans.length; index++) {
      events.push({ time: spans[index]!.from, kind: "disposition", index, amount: 0 });
    }
    events.sort((a, b) => a.time - b.time);
    this.#events = events;
    this.#queues = parts.flatMap(({ release }, part) =>
      release.kind === "zero-order"
        ? [
            {
              part,
              typical: release.duration,
              starts: events.filter(({ kind, index }) => kind === "start" && index === part),
            },
          ]
        : [],
    );
    this.#stopped = new Int32Array(this.#queues.length);
  }

  /** Whether any zero-order input runs after the present event. */
  get isAnyRunning(): boolean {
    return this.#running > 0;
  }

  /** To the first event, of a patient who absorbs this much faster. */
  start(faster: number): void {
    this.#next = 0;
    this.#faster = faster;
    this.#running = 0;
    this.#stopped.fill(0);
    this.next();
  }

  next(): void {
    const event = this.#events[this.#next];
    let time = event === undefined ? Number.POSITIVE_INFINITY : event.time;
    let queue = -1;
    for (let i = 0; i < this.#queues.length; i++) {
      const { typical, starts } = this.#queues[i]!;
      const start = starts[this.#stopped[i]!];
      if (start === undefined) continue;
      const end = start.time + typical / this.#faster;
      if (end <= time) {
        time = end;
        queue = i;
      }
    }
    this.time = time;
    if (queue >= 0) this.#stop(queue);
    else if (event !== undefined) this.#happen(event);
  }

  #stop(queue: number): void {
    const { part, typical, starts } = this.#queues[queue]!;
    this.kind = "stop";
    this.index = part;
    this.amount = starts[this.#stopped[queue]!]!.amount;
    this.duration = typical / this.#faster;
    this.#stopped[queue] = this.#stopped[queue]! + 1;
    this.#running--;
  }

  #happen({ kind, index, amount }: SweepEvent): void {
    this.#next++;
    this.kind = kind;
    this.index = index;
    this.amount = amount;
    if (kind !== "start") return;
    this.#running++;
    const typical = this.#queues.find(({ part }) => part === index)!.typical;
    this.duration = typical / this.#faster;
  }
}
