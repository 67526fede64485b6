import { sumError } from "../../numerics/index.ts";
import { argumentRefuse } from "../argumentCheck.ts";
import { type AbsorptionPart, absorptionParts, type ModelInput } from "./absorption.ts";
import type { DispositionSpan } from "./modelHistory.ts";

/** What changes at an instant. */
export type ModelChange =
  /** mg into a first-order depot. */
  | { readonly kind: "give"; readonly part: number; readonly amount: number }
  /** A zero-order input of mg/h begins or ends. */
  | { readonly kind: "start" | "stop"; readonly part: number; readonly rate: number }
  | { readonly kind: "disposition"; readonly span: number };

/**
 * An instant is kept as an unrounded pair `at` + `rest`, h: rounding dose time + lag would shift a dose by up to half a unit in
 * the last place of its time, which after hundreds of hours is far more than the accuracy stated for a level.
 */
export interface ModelEvent {
  readonly at: number;
  readonly rest: number;
  readonly change: ModelChange;
}

/** A part of a product with its doses. */
export interface ModelPart extends AbsorptionPart {
  readonly doses: ModelInput["doses"];
}

export function modelPartsOf(inputs: readonly ModelInput[]): ModelPart[] {
  return inputs.flatMap(({ absorption, bioavailability, lag, doses }) =>
    absorptionParts(absorption, bioavailability, lag).map((part) => ({ ...part, doses })),
  );
}

export function modelEventsSort(events: ModelEvent[]): ModelEvent[] {
  events.sort((a, b) => a.at - b.at || a.rest - b.rest);
  const first = events[0];
  const last = events[events.length - 1];
  if (first !== undefined && last !== undefined && !(last.at - first.at < Infinity)) {
    argumentRefuse(
      "the time from the first event to the last, lag and duration included",
      Infinity,
      "h",
      "a finite number",
    );
  }
  return events;
}

/** The instant a + b + rest, with its own remainder. */
export function modelInstant(a: number, b: number, rest: number): { at: number; rest: number } {
  const at = a + b;
  const over = sumError(a, b, at) + rest;
  // Normalised, so that two pairs of one instant compare equal.
  const sum = at + over;
  return { at: sum, rest: sumError(at, over, sum) };
}

/** A zero-order input must end this near to when it should, as a part of its duration. */
const NEAR = 1e-9;

/** When a zero-order input that begins at an instant ends, and its rate in mg/h. */
export function zeroOrderEnd(
  begin: { at: number; rest: number },
  duration: number,
  amount: number,
): { end: { at: number; rest: number }; rate: number } {
  const end = modelInstant(begin.at, duration, begin.rest);
  const length = end.at - begin.at + (end.rest - begin.rest);
  if (!(Math.abs(length / duration - 1) <= NEAR)) {
    argumentRefuse("absorption.duration", duration, "h", `long enough to be told from 0 at ${begin.at} h`);
  }
  return { end, rate: amount / duration };
}

/** Every event of a history, in order; O(n log n) in their number. */
export function modelEventsOf(parts: readonly ModelPart[], dispositions: readonly DispositionSpan[]): ModelEvent[] {
  const events: ModelEvent[] = [];
  for (const [part, { release, share, lag, doses }] of parts.entries()) {
    for (const { time, amount } of doses) {
      if (amount === 0) continue;
      const begin = modelInstant(time, lag, 0);
      if (release.kind === "first-order") {
        events.push({ ...begin, change: { kind: "give", part, amount: share * amount } });
        continue;
      }
      const { end, rate } = zeroOrderEnd(begin, release.duration, share * amount);
      events.push({ ...begin, change: { kind: "start", part, rate } });
      events.push({ ...end, change: { kind: "stop", part, rate } });
    }
  }
  for (let span = 1; span < dispositions.length; span++) {
    events.push({ at: dispositions[span]!.from, rest: 0, change: { kind: "disposition", span } });
  }
  return modelEventsSort(events);
}
