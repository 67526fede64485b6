import type { Case } from "../case/index.ts";
import { modelExposure, modelProfile, modelSteadyState, modelTimeToSteadyState } from "../kinetics/index.ts";
import type { DoseLine } from "../regimen/index.ts";
import { quantityConvert } from "../units/index.ts";
import type { Model, OptionReadings, SpanReadings, SteadyStateReadings } from "./analysisTypes.ts";
import { finalDisposition, modelHistory, modelInputs } from "./modelInputs.ts";
import { type RegimenPattern, regimenPattern } from "./regimenPattern.ts";
import { BEFORE_NEXT_DOSE, dueLevels, TOGETHER_H, timedLevels, type WindowDraw, windowDraw } from "./windowTiming.ts";

const HOUR_MS = 3_600_000;

export interface ReadingsClock {
  readonly originMs: number;
  readonly fromH: number;
  readonly toH: number;
}

/** Readings of one option for one reading of the model: over the stated span, and of the pattern it settles into. */
export function optionReadings(
  value: Case,
  lines: readonly DoseLine[],
  doses: ReadonlyMap<string, readonly { readonly time: number; readonly amount: number }[]>,
  model: Model,
  clock: ReadingsClock,
): OptionReadings {
  const isTroughToxic = value.medicine.toxicAt === "trough";
  const span = {
    ...spanReadings(model, doses, clock, concentrationWindow(value)),
    highestTrough: isTroughToxic ? spanTrough(model, doses, clock) : null,
  };
  const pattern = regimenPattern(value, lines);
  const settled = pattern.ok
    ? steadyStateReadings(model, pattern.pattern, clock.originMs, windowDraw(value), isTroughToxic)
    : null;
  const hasSteadyState = settled !== null && settled !== "dose-rate-at-or-above-vmax";
  return {
    span,
    steadyState: hasSteadyState ? settled : null,
    noSteadyState: pattern.ok ? (hasSteadyState ? null : "dose-rate-at-or-above-vmax") : pattern.reason,
    dailyDoseMg: pattern.ok ? (pattern.pattern.dosePerPeriodMg * 24) / pattern.pattern.periodH : null,
    activeDailyDoseMg: pattern.ok ? (activeMg(pattern.pattern) * 24) / pattern.pattern.periodH : null,
    halfLifeH: model.halfLife?.value ?? null,
    refersToFinalState: model.dispositions.some((each) => each.from > clock.fromH),
  };
}

/** The case's window in mg/L, by the record's molar mass where it is in a molar unit, or null when it has none or it is about the AUC. */
export function concentrationWindow(value: Case): { readonly low: number; readonly high: number } | null {
  const { window } = value;
  if (window === undefined || window.quantity === "auc24") return null;
  const mgPerL = (end: typeof window.low) => quantityConvert(end, "mg/L", value.medicine.molarMass.value);
  return { low: mgPerL(window.low), high: mgPerL(window.high) };
}

function spanReadings(
  model: Model,
  doses: ReadonlyMap<string, readonly { readonly time: number; readonly amount: number }[]>,
  clock: ReadingsClock,
  window: { readonly low: number; readonly high: number } | null,
): Omit<SpanReadings, "highestTrough"> {
  const found = modelExposure(modelHistory(model, doses), clock.fromH, clock.toH, window ?? undefined);
  return {
    fromH: clock.fromH,
    toH: clock.toH,
    peak: found.peak,
    timeOfPeakH: found.timeOfPeak,
    lowest: found.lowest,
    timeOfLowestH: found.timeOfLowest,
    average: found.average,
    auc: found.auc,
    auc24: found.average * 24,
    hoursBelow: window ? found.hoursBelow : null,
    hoursWithin: window ? found.hoursWithin : null,
    hoursAbove: window ? found.hoursAbove : null,
  };
}

/** The highest level over the span just before a dose; a dose with none before it has no trough. */
function spanTrough(
  model: Model,
  doses: ReadonlyMap<string, readonly { readonly time: number; readonly amount: number }[]>,
  { fromH, toH }: ReadingsClock,
): number | null {
  const all = [...new Set([...doses.values()].flat().map(({ time }) => time))].sort((a, b) => a - b);
  const times = all.filter((time, i) => time > fromH && time <= toH && i > 0 && time - all[i - 1]! > TOGETHER_H);
  return times.length === 0 ? null : Math.max(...modelProfile(modelHistory(model, doses), times));
}

function steadyStateReadings(
  model: Model,
  pattern: RegimenPattern,
  originMs: number,
  draw: WindowDraw | null,
  isTroughToxic: boolean,
): SteadyStateReadings | "dose-rate-at-or-above-vmax" {
  const disposition = finalDisposition(model);
  const inputs = modelInputs(model, pattern.courses);
  const settled = modelSteadyState(disposition, inputs, pattern.periodH);
  if (settled.status === "none") return settled.reason;
  const doseTimes = inputs.flatMap((input) => input.doses.map((dose) => dose.time));
  const slowest = modelTimeToSteadyState(disposition, inputs, pattern.periodH, 0.9);
  // A lead-in is itself forgotten at the same rate: one that outlasts the wait starts it anew at its last dose.
  const waitFromMs = Math.max(pattern.startMs, pattern.leadInEndMs ?? Number.NEGATIVE_INFINITY);
  return {
    periodH: pattern.periodH,
    dosePerPeriodMg: pattern.dosePerPeriodMg,
    peak: settled.peak,
    peakAfterDoseH: sinceDose(settled.timeOfPeak, doseTimes, pattern.periodH),
    lowest: settled.lowest,
    lowestAfterDoseH: sinceDose(settled.timeOfLowest, doseTimes, pattern.periodH),
    average: settled.average,
    auc24: settled.average * 24,
    swing: settled.swing,
    fluctuation: settled.fluctuation,
    accumulation: settled.accumulation,
    timeTo90H: slowest.hours,
    steady90AtH: (waitFromMs - originMs) / HOUR_MS + slowest.hours,
    slower: slowest.slower,
    timed: draw && timedLevels(disposition, inputs, pattern.periodH, draw),
    highestTrough: isTroughToxic
      ? dueLevels(disposition, inputs, pattern.periodH, draw?.afterDoseH ?? BEFORE_NEXT_DOSE).highest
      : null,
  };
}

/** A gap shorter than this (well under a second) is rounding: the time is the dose's own. h */
const SAME_INSTANT_H = 1e-9;

/** Hours from the latest dose strictly before `time` in a pattern that repeats every `period` hours. */
function sinceDose(time: number, doseTimes: readonly number[], period: number): number {
  return Math.min(
    ...doseTimes.map((dose) => {
      const gap = (((time - dose) % period) + period) % period;
      return gap < SAME_INSTANT_H ? period : gap;
    }),
  );
}

function activeMg(pattern: RegimenPattern): number {
  return [...pattern.courses.values()].flat().reduce((sum, dose) => sum + dose.amount, 0);
}
