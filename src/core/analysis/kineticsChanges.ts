import type { Case, Factor, Observation } from "../case/index.ts";
import type { DispositionSpan } from "../kinetics/index.ts";
import { covariatesOf, formulaEvaluate, kineticsFormulas } from "../medicine/index.ts";
import { instantMs, MS_PER_HOUR } from "../time/index.ts";
import type { PatientFigures } from "./analysisTypes.ts";
import { type KineticsFactors, type KineticsValues, kineticsDisposition } from "./kineticsDisposition.ts";
import { patientCovariates } from "./patientCovariates.ts";
import { creatinineClearanceAt } from "./patientFigures.ts";

const DAY_H = 24;

/**
 * The kinetics in force on the case clock, from −Infinity on: a span begins wherever kidney function was measured again
 * (if the record's formulas use it) and at every step of an event's effect.
 * Before the first creatinine its value holds too. An onset over n days is n steps of one day, each a further n-th of the way on the
 * log scale, so that the product of the steps is the whole effect; it goes at once when the event ends.
 * Where a formula can't be worked out with an earlier creatinine, the one at the now line holds.
 */
export function kineticsChanges(value: Case, patient: PatientFigures, originMs: number): readonly DispositionSpan[] {
  const hours = (ms: number) => (ms - originMs) / MS_PER_HOUR;
  const usesKidney = covariatesOf(value.medicine).includes("creatinineClearance");
  const creatinines = usesKidney
    ? value.patient.observations
        .filter((each) => each.kind === "serumCreatinine" && instantMs(each.at) <= instantMs(value.now))
        .sort((a, b) => instantMs(a.at) - instantMs(b.at))
    : [];
  const effects = value.patient.factors.filter((factor) => factor.effect !== undefined);
  const changes = new Set<number>([Number.NEGATIVE_INFINITY]);
  for (const creatinine of creatinines.slice(1)) changes.add(hours(instantMs(creatinine.at)));
  for (const factor of effects) for (const at of effectSteps(factor)) changes.add(hours(at));

  return [...changes]
    .sort((a, b) => a - b)
    .map((from) => ({ from, disposition: dispositionAt(value, patient, creatinines, effects, from, originMs) }));
}

function dispositionAt(
  value: Case,
  patient: PatientFigures,
  creatinines: readonly Observation[],
  effects: readonly Factor[],
  from: number,
  originMs: number,
): DispositionSpan["disposition"] {
  const ms = from === Number.NEGATIVE_INFINITY ? from : originMs + from * MS_PER_HOUR;
  const latest = creatinines.filter((each) => instantMs(each.at) <= ms).at(-1) ?? creatinines[0];
  const clearance = latest
    ? creatinineClearanceAt(value, patient, latest)
    : (patient.creatinineClearance?.value ?? null);
  const covariates = patientCovariates(value, patient, clearance ?? patient.creatinineClearance?.value);
  const values: Record<string, number> = {};
  for (const { name, formula } of kineticsFormulas(value.medicine)) {
    const result = formulaEvaluate(formula, covariates);
    if (!result.ok)
      throw new RangeError(`formula: "${formula.formula}" has no value although it had one at the now line`);
    values[name] = result.value.value;
  }
  return kineticsDisposition(value.medicine, values as KineticsValues, effectAt(effects, ms));
}

/** Instants at which an event changes the kinetics. */
function effectSteps(factor: Factor): number[] {
  const from = instantMs(factor.from);
  const to = factor.to === undefined ? Number.POSITIVE_INFINITY : instantMs(factor.to);
  const days = onsetDays(factor);
  const steps = Array.from({ length: Math.max(1, days) }, (_, i) => from + i * DAY_H * MS_PER_HOUR).filter(
    (at) => at < to,
  );
  return Number.isFinite(to) ? [...steps, to] : steps;
}

function onsetDays(factor: Factor): number {
  return factor.effect?.onset ? Math.max(1, Math.round(factor.effect.onset.value)) : 0;
}

/** The factors of all events in force at an instant, multiplied. */
function effectAt(effects: readonly Factor[], ms: number): KineticsFactors {
  let clearance = 1;
  let volume = 1;
  for (const factor of effects) {
    const from = instantMs(factor.from);
    const isOver = factor.to !== undefined && ms >= instantMs(factor.to);
    if (ms < from || isOver || !factor.effect) continue;
    const days = onsetDays(factor);
    const stepsTaken = days === 0 ? 1 : Math.min(days, Math.floor((ms - from) / (DAY_H * MS_PER_HOUR)) + 1);
    clearance *= factor.effect.clearance ** (days === 0 ? 1 : stepsTaken / days);
    volume *= factor.effect.volume ?? 1;
  }
  return { clearance, volume };
}
