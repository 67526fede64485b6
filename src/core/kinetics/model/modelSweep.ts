import type { KineticsParameter } from "./kineticsParameter.ts";
import { kineticsEtaCheck, kineticsParametersCheck } from "./kineticsParameterNames.ts";
import { modelPositive, modelTimes } from "./modelArgument.ts";
import type { ModelPart } from "./modelEvents.ts";
import type { ModelDisposition, ModelHistory } from "./modelHistory.ts";
import type { ModelKind } from "./modelKind.ts";
import { modelPlanOf } from "./modelPlan.ts";
import { SweepAgenda } from "./sweepAgenda.ts";
import { type SweepBody, SweepState } from "./sweepBody.ts";

/**
 * One history and one set of times, made ready once and swept for one patient after another: the levels, and if asked for their
 * derivatives by the logarithm of every named parameter.
 *
 * Formula: as modelProfile of modelScaled, the state and its derivatives carried from event to event; where the end of a zero-order
 * input moves with ka, the derivative of the amount takes the rate that stops × the shift.
 * Accuracy: levels and derivatives 1e-9 of the largest (tests/core/kinetics/model/modelSensitivity.test.ts).
 */
export class ModelSweep {
  /** mg/L at each time, of the last run. */
  readonly levels: Float64Array;
  /** One a name, of the last run; none where they were not asked for. */
  readonly derivatives: readonly Float64Array[];
  readonly #names: readonly KineticsParameter[];
  readonly #times: Float64Array;
  readonly #parts: readonly ModelPart[];
  readonly #spans: readonly { readonly from: number; readonly disposition: ModelDisposition }[];
  readonly #kind: ModelKind<ModelDisposition>;
  /** The patient's, by span: one object each, written anew in every run. */
  readonly #scaled: readonly ModelDisposition[];
  readonly #factors = new Map<string, number>();
  readonly #state: SweepState;
  readonly #body: SweepBody<ModelDisposition>;
  readonly #agenda: SweepAgenda;
  /** Depot of each part; −1 of a zero-order one. */
  readonly #depotOf: Int32Array;
  readonly #out: Float64Array;

  constructor(
    history: ModelHistory,
    names: readonly KineticsParameter[],
    times: ArrayLike<number>,
    withDerivatives: boolean,
  ) {
    kineticsParametersCheck(history, names);
    const { kind, parts, spans } = modelPlanOf(history);
    this.#names = names;
    this.#kind = kind;
    this.#times = modelTimes(times);
    this.#parts = parts;
    this.#spans = spans;
    this.#scaled = spans.map(({ disposition }) => ({ ...disposition }));
    this.#depotOf = new Int32Array(parts.length);
    let depots = 0;
    for (const [i, { release }] of parts.entries()) this.#depotOf[i] = release.kind === "first-order" ? depots++ : -1;
    this.#state = new SweepState(withDerivatives ? names : [], depots, depots < parts.length);
    this.#body = kind.sweepBody(this.#state);
    this.#agenda = new SweepAgenda(parts, spans);
    this.#out = new Float64Array(this.#state.rows);
    this.levels = new Float64Array(this.#times.length);
    this.derivatives = this.#state.names.map(() => new Float64Array(this.#times.length));
  }

  /** η in the order of the names. A figure scaled out of range throws a RangeError. */
  run(eta: ArrayLike<number>): void {
    kineticsEtaCheck(this.#names, eta);
    let faster = 1;
    let more = 1;
    for (let i = 0; i < this.#names.length; i++) {
      const name = this.#names[i]!;
      const factor = Math.exp(eta[i]!);
      if (name === "ka") faster = factor;
      else if (name === "bioavailability") more = factor;
      this.#factors.set(name, factor);
    }
    this.#sweep(faster, more);
  }

  #sweep(faster: number, more: number): void {
    const state = this.#state;
    const body = this.#body;
    const agenda = this.#agenda;
    const times = this.#times;
    state.empty();
    body.empty();
    for (let i = 0; i < this.#parts.length; i++) {
      const { release } = this.#parts[i]!;
      if (release.kind !== "first-order") modelPositive("duration", release.duration / faster, "h");
      else {
        modelPositive("ka", release.ka * faster, "/h");
        state.ka[this.#depotOf[i]!] = release.ka * faster;
      }
    }
    agenda.start(faster);
    this.levels.fill(0);
    for (const derivative of this.derivatives) derivative.fill(0);
    this.#dispositionSet(0);
    let i = 0;
    let at = agenda.time;
    while (i < times.length && !(times[i]! > at)) i++;
    while (i < times.length) {
      this.#happen(more);
      agenda.next();
      const until = agenda.time;
      for (; i < times.length && times[i]! <= until; i++) this.#write(i, times[i]! - at);
      if (i === times.length) return;
      if (until > at) body.advance(until - at);
      at = until;
    }
  }

  #write(i: number, u: number): void {
    const out = this.#out;
    this.#body.level(u, out);
    this.levels[i] = out[0]!;
    for (let q = 0; q < this.derivatives.length; q++) this.derivatives[q]![i] = out[q + 1]!;
  }

  #happen(more: number): void {
    const { kind, index, amount, duration } = this.#agenda;
    const state = this.#state;
    switch (kind) {
      case "disposition":
        this.#dispositionSet(index);
        return;
      case "give":
        state.give(this.#depotOf[index]!, amount * more);
        return;
      case "start":
        state.rate += (amount * more) / duration;
        return;
      case "stop":
        state.rate = this.#agenda.isAnyRunning ? state.rate - (amount * more) / duration : 0;
        // It stops earlier the faster the absorption: by its duration a unit of ln ka.
        if (state.kaRow > 0) this.#body.add(state.kaRow, -amount * more);
    }
  }

  #dispositionSet(span: number): void {
    const typical = this.#spans[span]!.disposition as unknown as Readonly<Record<string, number>>;
    const scaled = this.#scaled[span]! as unknown as Record<string, number>;
    for (const [name, factor] of this.#factors) if (name in typical) scaled[name] = typical[name]! * factor;
    const disposition = this.#scaled[span]!;
    this.#kind.check("disposition", disposition);
    this.#body.disposition(disposition);
  }
}
