import { argumentRefuse } from "../argumentCheck.ts";
import type { ModelInput } from "./absorption.ts";
import { modelPositive } from "./modelArgument.ts";
import {
  type ModelEvent,
  type ModelPart,
  modelEventsSort,
  modelInstant,
  modelPartsOf,
  zeroOrderEnd,
} from "./modelEvents.ts";
import { type ModelDisposition, modelDispositionCheck, modelInputsCheck } from "./modelHistory.ts";
import type { ModelKind } from "./modelKind.ts";
import { ModelRun, type RunStretch } from "./modelRun.ts";

/** A pattern of doses that repeats for ever, checked. */
export interface SteadyPattern {
  readonly kind: ModelKind<ModelDisposition>;
  readonly disposition: ModelDisposition;
  readonly parts: readonly ModelPart[];
  readonly period: number;
  /** mg absorbed in one period. */
  readonly absorbed: number;
}

export function steadyPatternOf(
  disposition: ModelDisposition,
  inputs: readonly ModelInput[],
  period: number,
): SteadyPattern {
  const kind = modelDispositionCheck("disposition", disposition);
  modelPositive("period", period, "h");
  modelInputsCheck("inputs", inputs);
  for (const [index, { doses }] of inputs.entries()) {
    for (const [i, { time }] of doses.entries()) {
      if (!(time >= 0 && time < period)) {
        argumentRefuse(`inputs[${index}].doses[${i}].time`, time, "h", `0 to below the period, ${period} h`);
      }
    }
  }
  const parts = modelPartsOf(inputs);
  let absorbed = 0;
  for (const { share, doses } of parts) for (const { amount } of doses) absorbed += share * amount;
  return { kind, disposition, parts, period, absorbed };
}

/** The instant within the period at which something that happens at `instant`, and every period before and after, happens. */
function wrapped(instant: { at: number; rest: number }, period: number): { at: number; rest: number } {
  // `%` is exact. A rest that reaches back before the period belongs to its end.
  const at = instant.at % period;
  return modelInstant(at + instant.rest < 0 ? at + period : at, 0, instant.rest);
}

/**
 * One period at steady state: the amounts at its start and every stretch in it.
 *
 * Formula: with g what one period's doses leave in a depot that starts empty, the depot starts with g/(1 − e^(−ka·P)); a zero-order
 * input that outlasts the period runs more than once at a time; the body's start is found by its kind.
 * The pattern absorbs something, at less than the kind's capacity.
 */
export function steadyRun(pattern: SteadyPattern): { body: Float64Array; stretches: readonly RunStretch[] } {
  const { kind, disposition, parts, period, absorbed } = pattern;
  const events: ModelEvent[] = [];
  const before: { part: number; rate: number; count: number }[] = [];
  const gut = new Float64Array(parts.length);
  for (const [part, { release, share, lag, doses }] of parts.entries()) {
    for (const { time, amount } of doses) {
      if (amount === 0) continue;
      const begin = wrapped(modelInstant(time, lag, 0), period);
      const given = share * amount;
      if (release.kind === "first-order") {
        events.push({ ...begin, change: { kind: "give", part, amount: given } });
        const left = Math.exp(-release.ka * (period - begin.at - begin.rest));
        gut[part] = gut[part]! + (given * left) / -Math.expm1(-release.ka * period);
        continue;
      }
      const { end: finish, rate } = zeroOrderEnd(begin, release.duration, given);
      const end = wrapped(finish, period);
      // How many of its earlier repeats have begun and not ended when the period starts.
      before.push({ part, rate, count: Math.round((finish.at - end.at) / period) });
      events.push({ ...begin, change: { kind: "start", part, rate } });
      events.push({ ...end, change: { kind: "stop", part, rate } });
    }
  }
  modelEventsSort(events);

  const run = (body: Float64Array): RunStretch[] => {
    const period_ = new ModelRun(kind, parts, [disposition], events);
    period_.bodySet(body);
    period_.gut.set(gut);
    for (const { part, rate, count } of before) period_.startBefore(part, rate, count);
    const stretches: RunStretch[] = [];
    period_.go({ at: 0, rest: 0 }, { at: period, rest: 0 }, (seen) => {
      stretches.push(seen);
    });
    return stretches;
  };
  const body = kind.steadyBody(disposition, period, absorbed / period, run);
  return { body, stretches: run(body) };
}
