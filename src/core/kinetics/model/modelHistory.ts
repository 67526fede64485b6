import { argumentFraction, argumentRefuse } from "../argumentCheck.ts";
import { absorptionCheck, type ModelInput } from "./absorption.ts";
import * as kinds from "./kinds.ts";
import { isModelAmount, isModelTime, modelAmount, modelDelay, modelTime } from "./modelArgument.ts";
import type { ModelKind } from "./modelKind.ts";

type Kinds = (typeof kinds)[keyof typeof kinds];
type DispositionOf<K> = K extends { check: (name: string, disposition: infer D) => void } ? D : never;

/** What the body does with the medicine, whichever product it came from. */
export type ModelDisposition = DispositionOf<Kinds>;

/** The kinds under which the levels of several doses add up. What relies on that takes no other. */
export type LinearDisposition = DispositionOf<Extract<Kinds, { superposes: true }>>;

/** A disposition in force from an instant on, until the next. */
export interface DispositionSpan {
  /** h; the first may be -Infinity. */
  readonly from: number;
  readonly disposition: ModelDisposition;
}

export interface ModelHistory {
  /** At least one, in ascending order, all of one kind. Where they meet the amounts carry over. */
  readonly dispositions: readonly DispositionSpan[];
  /** One a product. */
  readonly inputs: readonly ModelInput[];
}

const BY_NAME = new Map<string, ModelKind<ModelDisposition>>(
  // One map for all kinds: each is looked up by the kind of the disposition it is then given.
  Object.values(kinds).map((kind) => [kind.kind, kind as unknown as ModelKind<ModelDisposition>]),
);

/** The kind of a disposition; an unknown one throws a RangeError. */
export function modelKindOf(name: string, disposition: ModelDisposition): ModelKind<ModelDisposition> {
  const kind = BY_NAME.get(disposition.kind);
  if (kind === undefined) argumentRefuse(`${name}.kind`, disposition.kind, "", [...BY_NAME.keys()].join(", "));
  return kind;
}

/** Checks a disposition and gives its kind. */
export function modelDispositionCheck(name: string, disposition: ModelDisposition): ModelKind<ModelDisposition> {
  const kind = modelKindOf(name, disposition);
  kind.check(name, disposition);
  return kind;
}

export function modelInputsCheck(name: string, inputs: readonly ModelInput[]): void {
  for (const [index, { absorption, bioavailability, lag, doses }] of inputs.entries()) {
    const input = `${name}[${index}]`;
    absorptionCheck(`${input}.absorption`, absorption);
    argumentFraction(`${input}.bioavailability`, bioavailability);
    modelDelay(`${input}.lag`, lag);
    let before = -Infinity;
    for (let i = 0; i < doses.length; i++) {
      const { time, amount } = doses[i]!;
      // Names are put together only for what is refused: there may be very many doses.
      if (!isModelTime(time)) modelTime(`${input}.doses[${i}].time`, time);
      if (time < before) {
        argumentRefuse(`${input}.doses[${i}].time`, time, "h", `not before that of the dose before it, ${before} h`);
      }
      if (!isModelAmount(amount)) modelAmount(`${input}.doses[${i}].amount`, amount);
      before = time;
    }
  }
}

/** Throws a RangeError for a history outside the ranges above; gives the kind of its dispositions. */
export function modelHistoryCheck({ dispositions, inputs }: ModelHistory): ModelKind<ModelDisposition> {
  const first = dispositions[0];
  if (first === undefined) argumentRefuse("history.dispositions.length", 0, "", "1 or more");
  const kind = modelKindOf("history.dispositions[0].disposition", first.disposition);
  let before = -Infinity;
  for (const [i, { from, disposition }] of dispositions.entries()) {
    const name = `history.dispositions[${i}]`;
    if (disposition.kind !== kind.kind) {
      argumentRefuse(`${name}.disposition.kind`, disposition.kind, "", `the kind of the first, ${kind.kind}`);
    }
    kind.check(`${name}.disposition`, disposition);
    if (!(i === 0 && from === -Infinity)) modelTime(`${name}.from`, from);
    if (i > 0 && !(from > before))
      argumentRefuse(`${name}.from`, from, "h", `after that of the span before it, ${before} h`);
    before = from;
  }
  modelInputsCheck("history.inputs", inputs);
  for (const [i, { doses }] of inputs.entries()) {
    const dose = doses[0];
    if (dose !== undefined && dose.time < first.from) {
      argumentRefuse(
        `history.inputs[${i}].doses[0].time`,
        dose.time,
        "h",
        `not before the first span, ${first.from} h`,
      );
    }
  }
  return kind;
}
